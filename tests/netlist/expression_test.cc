#include "harness/netlist/expression.h"

#include <map>
#include <string>
#include <vector>

#include <fmt/format.h>
#include <gtest/gtest.h>

namespace gatedyno {
namespace {

// wn is 3, wp is 6; nothing else is known.
class TwoParameters : public ParameterSource {
 public:
  Parsed<double> Find(const std::string& name,
                      SourcePosition position) override {
    if (name == "wn") {
      return 3.0;
    }
    if (name == "wp") {
      return 6.0;
    }
    return Complain(position, "unknown " + name);
  }
};

// The text stands in line 1 from column 1 on.
Parsed<double> ValueOf(const std::string& text) {
  const LogicalLine line{text, {{0, 1}}};
  const Parsed<Expression> expression = ParseExpression(line, 0, line.text);
  if (!expression.ok()) {
    return Forward(expression);
  }
  TwoParameters parameters;
  return Evaluate(*expression, parameters);
}

TEST(Expression, Evaluates) {
  const struct {
    std::string text;
    double value;
  } table[] = {
      {"2", 2},
      {"1.5k", 1500},
      {".5", 0.5},
      {"5.", 5},
      {"1e-9", 1e-9},
      {"1E+3", 1000},
      {"2e3", 2000},
      {"10um", 10e-6},
      {"1MEG", 1e6},
      {"1M", 1e-3},
      {"1mil", 25.4e-6},
      {"wn", 3},
      {"WP", 6},
      {" 2 * wn ", 6},
      {"wn+wp*2", 15},
      {"(wn+wp)*2", 18},
      {"wp/wn/2", 1},
      {"2-3-4", -5},
      {"-wn", -3},
      {"--wn", 3},
      {"+wn", 3},
      {"2*-wn", -6},
      {"2--3", 5},
      {"2**3", 8},
      // Both from ngspice 39.3, tried: the sign is applied last.
      {"-2**2", -4},
      {"2**-1", 0.5},
      {"2** +2", 4},
      {"(-2)**2", 4},
      {"(2**3)**2", 64},
      {"min(wn,wp)", 3},
      {"max(wn, wp)", 6},
      {"MIN(4, 2, 3)", 2},
      {"max(1,2,3,4)", 4},
      {"abs(wn-wp)", 3},
      {"sqrt(wn*3)", 3},
      {"max(min(wn,2), 1) + sqrt(abs(-16))", 6},
      {"((((wn))))", 3},
  };
  for (const auto& row : table) {
    const Parsed<double> value = ValueOf(row.text);
    ASSERT_TRUE(value.ok()) << row.text << ": " << value.error().message;
    EXPECT_DOUBLE_EQ(*value, row.value) << row.text;
  }
}

TEST(Expression, Complains) {
  const struct {
    std::string text;
    int column;
    std::string message;
  } table[] = {
      {"", 1, "expected a number, a parameter or '('"},
      {"2*", 3, "expected a number, a parameter or '('"},
      {"2*)", 3, "expected a number, a parameter or '(', got ')'"},
      {"2 3", 3, "expected an operator, got '3'"},
      {"wn%2", 3, "expected an operator, got '%'"},
      {"2^3", 2, "expected an operator, got '^'"},
      {"(2", 1, "no ')' for this '('"},
      {"2)", 2, "expected an operator, got ')'"},
      {"2x", 1, "expected a number, got '2x'"},
      {"3*2.5e", 3, "expected a number, got '2.5e'"},
      {"1.2.3", 1, "expected a number, got '1.2.3'"},
      {".", 1, "expected a number, got '.'"},
      {"1e400", 1, "expected a number, got '1e400': too large or too small"},
      {"2*wx", 3, "unknown wx"},
      {"ln(2)", 1, "unknown function 'ln': known are abs, max, min, sqrt"},
      {"min(2)", 1, "min takes two arguments or more"},
      {"sqrt(2,3)", 7, "expected ')' after the argument of sqrt"},
      {"abs()", 5, "expected a number, a parameter or '(', got ')'"},
      {"max(1,2", 8, "expected ')' after the argument of max"},
      {"2**3**2", 5, "dialects read a**b**c in two ways: put parentheses"},
      {"wn/(wp-6)", 3, "division by zero"},
      {"sqrt(wn-wp)", 1, "the square root of -3"},
      {"1e300*1e300", 6, "the result is not a finite number"},
      {"(0-8)**0.5", 6, "the result is not a finite number"},
      {"1.5{", 4, "expected an operator, got '{'"},
  };
  for (const auto& row : table) {
    const Parsed<double> value = ValueOf(row.text);
    ASSERT_FALSE(value.ok()) << row.text << " = " << *value;
    EXPECT_EQ(value.error().message, row.message) << row.text;
    EXPECT_EQ(value.error().position.line, 1) << row.text;
    EXPECT_EQ(value.error().position.column, row.column) << row.text;
  }
}

TEST(Expression, LimitsItsDepth) {
  const std::string open(40, '(');
  const std::string close(40, ')');
  EXPECT_TRUE(ValueOf(open + "1" + close).ok());
  for (const std::string& hostile : {std::string(100'000, '('),
                                     std::string(100'000, '-') + "1",
                                     "2" + fmt::format("{:*>100000}", "2")}) {
    EXPECT_FALSE(ValueOf(hostile).ok());
  }
  const Parsed<double> deep = ValueOf(std::string(100, '(') + "1");
  ASSERT_FALSE(deep.ok());
  EXPECT_EQ(deep.error().message, "an expression more than 64 levels deep");
}

TEST(Expression, TakesLongChainsWithoutRecursion) {
  std::string sum = "1";
  for (int i = 1; i < 100'000; ++i) {
    sum += "+1";
  }
  const Parsed<double> value = ValueOf(sum);
  ASSERT_TRUE(value.ok());
  EXPECT_EQ(*value, 100'000.0);
}

}  // namespace
}  // namespace gatedyno
