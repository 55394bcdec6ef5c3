#include "harness/netlist/lexer.h"

#include <string>
#include <vector>

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

using Texts = std::vector<std::string>;

TEST(Lexer, SplitsWords) {
  const struct {
    std::string text;
    Texts tokens;
  } table[] = {
      {"m1 y a", {"m1", "y", "a"}},
      {"\tm1\t y ", {"m1", "y"}},
      {"w=1u l =2u m= 3", {"w", "=", "1u", "l", "=", "2u", "m", "=", "3"}},
      {"w={a + b} l='c * d'", {"w", "=", "{a + b}", "l", "=", "'c * d'"}},
      {"w=2*wn", {"w", "=", "2*wn"}},
      {"w=max(wn, 2) l=1", {"w", "=", "max(wn, 2)", "l", "=", "1"}},
      {"w=(1 + (2 + 3)) l=1", {"w", "=", "(1 + (2 + 3))", "l", "=", "1"}},
      {"q<0> n[1] x1/n2 a.b $3", {"q<0>", "n[1]", "x1/n2", "a.b", "$3"}},
      {"a{b}", {"a", "{b}"}},
  };
  for (const auto& row : table) {
    const LogicalLine line{row.text, {{0, 1}}};
    const Parsed<std::vector<Token>> tokens = Tokenize(line);
    ASSERT_TRUE(tokens.ok()) << tokens.error().message;
    Texts texts;
    for (const Token& token : *tokens) {
      texts.emplace_back(token.text);
      EXPECT_EQ(line.text.substr(token.offset, token.text.size()), token.text);
    }
    EXPECT_EQ(texts, row.tokens) << row.text;
  }
}

TEST(Lexer, NamesBytesThatAreNoText) {
  const LogicalLine line{"m1 \xC3\xA9", {{0, 1}}};
  const Parsed<std::vector<Token>> tokens = Tokenize(line);
  ASSERT_FALSE(tokens.ok());
  EXPECT_EQ(tokens.error().message, "unexpected byte 0xc3");
  EXPECT_EQ(tokens.error().position.column, 4);
}

}  // namespace
}  // namespace gatedyno
