#include "harness/sim/frame.h"

#include <string>
#include <vector>

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

using std::string_literals::operator""s;

struct EncodeRow {
  std::string text;
  std::string frame;
};

TEST(FrameTest, IsLengthLittleEndianThenText) {
  const EncodeRow rows[] = {
      {"", "\0\0\0\0"s},
      {"{}", "\2\0\0\0{}"s},
      {std::string(258, 'x'), "\2\1\0\0"s + std::string(258, 'x')},
      {"a\0b"s, "\3\0\0\0a\0b"s},
  };
  for (const EncodeRow& row : rows) {
    EXPECT_EQ(EncodeFrame(row.text), row.frame);
  }
}

std::vector<std::string> ReadAll(FrameReader* reader) {
  std::vector<std::string> texts;
  for (auto next = reader->Next(); next.ok() && next->has_value();
       next = reader->Next()) {
    texts.push_back(**next);
  }
  return texts;
}

TEST(FrameTest, ComesBackHoweverTheStreamIsCut) {
  const std::vector<std::string> texts = {"one", "", std::string(300, 'z')};
  std::string stream;
  for (const std::string& text : texts) {
    stream += EncodeFrame(text);
  }
  for (size_t chunk = 1; chunk <= stream.size(); ++chunk) {
    FrameReader reader;
    std::vector<std::string> got;
    for (size_t at = 0; at < stream.size(); at += chunk) {
      reader.Append(std::string_view(stream).substr(at, chunk));
      for (std::string& text : ReadAll(&reader)) {
        got.push_back(std::move(text));
      }
    }
    EXPECT_EQ(got, texts) << "in chunks of " << chunk;
    EXPECT_TRUE(reader.CheckEnd().ok());
  }
}

TEST(FrameTest, RefusesAStreamThatHoldsNoFrames) {
  FrameReader reader;
  reader.Append("Note: something printed\n");
  const auto next = reader.Next();
  ASSERT_FALSE(next.ok());
  EXPECT_EQ(next.error().message,
            "a frame of 1702129486 bytes is over the limit of 67108864");
  EXPECT_FALSE(reader.Next().ok());
}

TEST(FrameTest, TakesTheLargestFrameAllowed) {
  FrameReader reader;
  reader.Append(EncodeFrame(std::string(kMaxFrameBytes, 'x')));
  const auto next = reader.Next();
  ASSERT_TRUE(next.ok() && next->has_value());
  EXPECT_EQ((*next)->size(), kMaxFrameBytes);
  reader.Append("\1\0\0\4"s);  // One byte more.
  EXPECT_FALSE(reader.Next().ok());
}

struct TruncatedRow {
  std::string stream;
  std::string message;
};

TEST(FrameTest, SaysWhereAStreamWasCutShort) {
  const TruncatedRow rows[] = {
      {"\3\0"s, "the stream ended after 2 of a frame's 4 length bytes"},
      {"\3\0\0\0"s, "the stream ended after 0 of a frame's 3 bytes"},
      {"\1\0\0\0a\3\0\0\0ab"s, "the stream ended after 2 of a frame's 3 bytes"},
  };
  for (const TruncatedRow& row : rows) {
    FrameReader reader;
    reader.Append(row.stream);
    ReadAll(&reader);
    const Status end = reader.CheckEnd();
    ASSERT_FALSE(end.ok());
    EXPECT_EQ(end.error().message, row.message);
  }
}

}  // namespace
}  // namespace gatedyno
