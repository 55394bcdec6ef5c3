#include "harness/network/boolean_expression.h"

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

using Operator = BooleanExpression::Operator;

BooleanExpression And(std::vector<BooleanExpression> terms) {
  return Combine(Operator::kAnd, std::move(terms));
}
BooleanExpression Or(std::vector<BooleanExpression> terms) {
  return Combine(Operator::kOr, std::move(terms));
}
BooleanExpression Xor(std::vector<BooleanExpression> terms) {
  return Combine(Operator::kXor, std::move(terms));
}

struct TextRow {
  BooleanExpression expression;
  std::string text;
  int names;
  int nots;
};

TEST(BooleanExpressionTest, Text) {
  const std::vector<TextRow> table = {
      {Name("a"), "a", 1, 0},
      {Not(Name("a")), "!a", 1, 1},
      {Not(Not(Name("a"))), "a", 1, 0},
      {And({Name("a")}), "a", 1, 0},
      {Not(And({Name("a"), Name("b")})), "!(a & b)", 2, 1},
      {Or({And({Name("a"), Name("b")}), Name("c")}), "a & b | c", 3, 0},
      {And({Or({Name("a"), Name("b")}), Name("c")}), "(a | b) & c", 3, 0},
      {And({And({Name("a"), Name("b")}), Name("c")}), "a & b & c", 3, 0},
      {Xor({Name("a"), And({Name("b"), Not(Name("c"))})}), "a ^ b & !c", 3, 1},
      {And({Xor({Name("a"), Name("b")}), Name("c")}), "(a ^ b) & c", 3, 0},
      {Or({Xor({Name("a"), Name("b")}), Name("c")}), "a ^ b | c", 3, 0},
  };
  for (const TextRow& row : table) {
    EXPECT_EQ(ToText(row.expression), row.text);
    EXPECT_EQ(CountNames(row.expression), row.names) << row.text;
    EXPECT_EQ(CountNots(row.expression), row.nots) << row.text;
  }
}

TEST(BooleanExpressionTest, SortsTermsByTheNamesTheyBeginWith) {
  const std::vector<std::string> order = {"s", "a", "b", "c"};
  BooleanExpression expression =
      Not(Or({And({Name("c"), Or({Name("b"), Name("a")})}),
              And({Name("b"), Not(Name("s"))})}));
  SortTerms(expression, order);
  EXPECT_EQ(ToText(expression), "!(!s & b | (a | b) & c)");
}

}  // namespace
}  // namespace gatedyno
