#include "harness/report/wrap.h"

#include <string>

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

std::string Times(size_t count, const std::string& text) {
  std::string all;
  for (size_t i = 0; i < count; ++i) {
    all += text;
  }
  return all;
}

struct Case {
  std::string text;
  std::string wrapped;
};

TEST(WrapTest, BreaksAtBlanks) {
  const std::string ten = "ten chars ";  // Ten of them fill a line.
  const std::string full = Times(9, ten) + "ten chars.";
  const Case cases[] = {
      {"", ""},
      {"short", "short"},
      {"two  blanks stay", "two  blanks stay"},
      {"    indented", "    indented"},
      {"no blanks at the end  ", "no blanks at the end"},
      {full, full},
      {full + " more", full + "\n  more"},
      {full + "more", Times(9, ten) + "ten\n  chars.more"},
      {full + "    more", full + "\n  more"},
      {full + "  ", full},
      {Times(9, ten) + "allowed 35 % of it",
       Times(9, ten) + "allowed\n  35 % of it"},
      {Times(9, ten) + "tens: 5 %", Times(9, ten) + "tens: 5 %"},
      {Times(97, "x") + " 5 % y", Times(97, "x") + "\n  5 % y"},
      {Times(9, ten) + "longer 5 %)", Times(9, ten) + "longer\n  5 %)"},
      // Nowhere to break.
      {Times(130, "x"), Times(100, "x") + "\n  " + Times(30, "x")},
      {"   " + Times(100, "x"),
       "   " + Times(97, "x") + "\n  " + Times(3, "x")},
      {Times(300, "x"),
       Times(100, "x") + "\n  " + Times(98, "x") + "\n  " + Times(98, "x") +
           "\n  " + Times(4, "x")},
      // A column a code point.
      {Times(100, "\xc2\xb1"), Times(100, "\xc2\xb1")},
      {Times(101, "\xc2\xb1"), Times(100, "\xc2\xb1") + "\n  \xc2\xb1"},
      // What a terminal would obey.
      {"a\x1b[2Jb\nc\td\x7f", "a?[2Jb?c?d?"},
  };
  for (const Case& tried : cases) {
    EXPECT_EQ(Wrap(tried.text), tried.wrapped) << tried.text;
  }
}

TEST(WrapTest, IndentsAsToldAndNeverExceeds) {
  const std::string text = Times(60, "word and longer words ");
  for (const size_t indent : {0U, 2U, 21U, 59U, 99U}) {
    const std::string wrapped = Wrap(text, indent);
    size_t begin = 0;
    while (begin < wrapped.size()) {
      const size_t end = std::min(wrapped.find('\n', begin), wrapped.size());
      const std::string line = wrapped.substr(begin, end - begin);
      EXPECT_LE(ColumnsOf(line), kColumns);
      EXPECT_TRUE(begin == 0 || line.find_first_not_of(' ') == indent) << line;
      begin = end + 1;
    }
  }
}

TEST(WrapTest, SurvivesBytesThatAreNoText) {
  const std::string bytes = Times(150, "\x80") + Times(150, "\xff");
  EXPECT_FALSE(Wrap(bytes).empty());
}

TEST(WrapTest, OneLineIsCut) {
  struct Cut {
    const char* text;
    size_t columns;
    const char* line;
  };
  constexpr Cut kCuts[] = {
      {"12 of 80 jobs", 100, "12 of 80 jobs"},
      {"12 of 80 jobs", 13, "12 of 80 jobs"},
      {"12 of 80 jobs", 5, "12 of"},
      {"12 of 80 jobs", 0, ""},
      {"", 5, ""},
      {"a\nb\x1b[K", 10, "a?b?[K"},
      {"±±±±", 3, "±±±"},
  };
  for (const Cut& tried : kCuts) {
    EXPECT_EQ(OneLine(tried.text, tried.columns), tried.line);
  }
}

}  // namespace
}  // namespace gatedyno
