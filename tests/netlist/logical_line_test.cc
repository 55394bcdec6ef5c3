#include "harness/netlist/logical_line.h"

#include <string>
#include <vector>

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

std::vector<LogicalLine> LinesOf(std::string_view text) {
  const SourceText source(text, "t.sp");
  LogicalLineReader reader(source);
  std::vector<LogicalLine> lines;
  while (true) {
    Parsed<std::optional<LogicalLine>> line = reader.Next();
    if (!line.ok()) {
      ADD_FAILURE() << line.error().message;
      return lines;
    }
    if (!line->has_value()) {
      return lines;
    }
    lines.push_back(**std::move(line));
  }
}

std::vector<std::string> TextsOf(std::string_view text) {
  std::vector<std::string> texts;
  for (const LogicalLine& line : LinesOf(text)) {
    texts.push_back(line.text);
  }
  return texts;
}

using Texts = std::vector<std::string>;

// Comments and continuations as ngspice 39.3 reads them, tried.
TEST(LogicalLine, DropsCommentsAndJoinsContinuations) {
  const struct {
    std::string text;
    Texts lines;
  } table[] = {
      {"", {}},
      {"\n \n\t\n", {}},
      {"* all\n  * indented\n; all\n$ all\n// all\n", {}},
      {"*.PININFO a:I\n", {}},
      {"r1 a b 1", {"r1 a b 1"}},
      {"r1 a b 1 ; k\n", {"r1 a b 1"}},
      {"r1 a b 1; k\n", {"r1 a b 1"}},
      {"r1 a b 1 // k\n", {"r1 a b 1"}},
      {"r1 a b 1// k\n", {"r1 a b 1"}},
      {"r1 a b 1 $X=1 $Y=2\n", {"r1 a b 1"}},
      {"r1 a b 1 $[nch]\n", {"r1 a b 1"}},
      {"r1 a,$ k\n", {"r1 a,"}},
      {"r1 a$1 b 1\n", {"r1 a$1 b 1"}},
      {"r1 a/1 b 1\n", {"r1 a/1 b 1"}},
      {"r1 a * b\n", {"r1 a * b"}},
      {"r1 a\n+ b 1\n", {"r1 a  b 1"}},
      {"r1 a\n+b 1\n", {"r1 a b 1"}},
      {"r1 a\n   + b 1\n", {"r1 a     b 1"}},
      {"r1 a\n* note\n\n+ b 1\n", {"r1 a  b 1"}},
      {"r1 a ; why\n+ b 1\nr2 c d 1\n", {"r1 a  b 1", "r2 c d 1"}},
      {"r1 a\n+\n+ b 1\n", {"r1 a   b 1"}},
      {"r1 a b 1\r\nr2 a b 1\r\n", {"r1 a b 1", "r2 a b 1"}},
      {"\xEF\xBB\xBFr1 a b 1\n", {"r1 a b 1"}},
  };
  for (const auto& row : table) {
    EXPECT_EQ(TextsOf(row.text), row.lines) << row.text;
  }
}

TEST(LogicalLine, KnowsWhereEachPartStands) {
  const std::vector<LogicalLine> lines =
      LinesOf("* head\nr1 a\n* note\n  + b 100\n");
  ASSERT_EQ(lines.size(), 1U);
  const struct {
    std::string part;
    int line;
    int column;
  } table[] = {{"r1", 2, 1}, {"a", 2, 4}, {"b", 4, 5}, {"100", 4, 7}};
  for (const auto& row : table) {
    const SourcePosition position =
        lines[0].PositionOf(lines[0].text.find(row.part));
    EXPECT_EQ(position.line, row.line) << row.part;
    EXPECT_EQ(position.column, row.column) << row.part;
  }
}

TEST(LogicalLine, RefusesAContinuationOfNothing) {
  const SourceText source("* head\n  + w=1u\n", "t.sp");
  LogicalLineReader reader(source);
  const Parsed<std::optional<LogicalLine>> line = reader.Next();
  ASSERT_FALSE(line.ok());
  EXPECT_EQ(line.error().message,
            "a continuation line with nothing above it to continue");
  EXPECT_EQ(line.error().position.line, 2);
  EXPECT_EQ(line.error().position.column, 3);
}

}  // namespace
}  // namespace gatedyno
