#include "harness/netlist/parse_error.h"

#include <string>

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

std::string Word(const std::string& line,
                 int column,
                 const std::string& instance = "") {
  const SourceText source(line, "t.sp");
  return WordParseError({{1, column}, "wrong", instance}, source);
}

TEST(ParseError, ShowsTheLineAndACaret) {
  EXPECT_EQ(Word("r1 a b", 4), "t.sp:1:4: wrong\nr1 a b\n   ^");
  EXPECT_EQ(Word("r1 a b\r\n", 1), "t.sp:1:1: wrong\nr1 a b\n^");
  EXPECT_EQ(Word("", 1), "t.sp:1:1: wrong\n\n^");
}

TEST(ParseError, NamesTheInstance) {
  EXPECT_EQ(Word("r1 a b", 4, "x1.x2"),
            "t.sp:1:4: wrong (in x1.x2)\nr1 a b\n   ^");
}

// One column a byte, so that the caret stands where the column says.
TEST(ParseError, ShowsTabsAndForeignBytesInOneColumn) {
  EXPECT_EQ(Word("\tr1 \xC3\xA9 b", 8), "t.sp:1:8: wrong\n r1 ?? b\n       ^");
  EXPECT_EQ(Word(std::string("a\x1b[31m b"), 8),
            "t.sp:1:8: wrong\na?[31m b\n       ^");
}

TEST(ParseError, CutsALongLineAroundTheCaret) {
  const std::string line = std::string(500, 'a') + "!" + std::string(500, 'b');
  EXPECT_EQ(Word(line, 501),
            "t.sp:1:501: wrong\n..." + std::string(50, 'a') + "!" +
                std::string(25, 'b') + "...\n" + std::string(53, ' ') + "^");
  EXPECT_EQ(Word(line, 1),
            "t.sp:1:1: wrong\n" + std::string(76, 'a') + "...\n^");
  EXPECT_EQ(Word(line, 1001),
            "t.sp:1:1001: wrong\n..." + std::string(51, 'b') + "\n" +
                std::string(53, ' ') + "^");
}

TEST(ParseError, QuotesWhatFitsAMessage) {
  EXPECT_EQ(Quote("w=2x"), "'w=2x'");
  EXPECT_EQ(Quote("a\nb\x7f"), "'a?b?'");
  EXPECT_EQ(Quote(std::string(61, 'a')), "'" + std::string(60, 'a') + "...'");
}

}  // namespace
}  // namespace gatedyno
