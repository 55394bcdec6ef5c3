// Arithmetic expressions over parameters.
//
//     sum     := product (("+" | "-") product)*
//     product := unary (("*" | "/") unary)*
//     unary   := ("-" | "+") unary | power
//     power   := primary ["**" ["-" | "+"] primary]
//     primary := number | name | function "(" sum ("," sum)* ")" | "(" sum ")"
//
// Functions: abs, sqrt (one argument), min, max (two or more).  "a**b**c" is
// refused: ngspice takes it from the left (tried), other dialects from the
// right.  "-a**b" is -(a**b) everywhere.  Names compare without case; a name
// is a function only when "(" follows.

#ifndef GATEDYNO_NETLIST_EXPRESSION_H_
#define GATEDYNO_NETLIST_EXPRESSION_H_

#include <cstddef>
#include <string>
#include <string_view>
#include <vector>

#include "harness/netlist/logical_line.h"
#include "harness/netlist/parse_error.h"

namespace gatedyno {

enum class Operation {
  kNumber,
  kName,
  kNegate,
  kAdd,
  kSubtract,
  kMultiply,
  kDivide,
  kPower,
  kAbs,
  kSqrt,
  kMin,  // Of the top two.
  kMax,
};

struct Step {
  Operation operation = Operation::kNumber;
  double number = 0.0;
  std::string name;  // Lower case.
  SourcePosition position;
};

// In postfix order, so that evaluating needs no recursion.
struct Expression {
  std::vector<Step> steps;
};

// What an expression's names stand for.
class ParameterSource {
 public:
  virtual ~ParameterSource() = default;
  // `name` in lower case; `position` is where it is used.
  virtual Parsed<double> Find(const std::string& name,
                              SourcePosition position) = 0;

 protected:
  ParameterSource() = default;
  ParameterSource(const ParameterSource&) = default;
  ParameterSource& operator=(const ParameterSource&) = default;
};

// Reads line.text[begin, begin + text.size()), without delimiters.
Parsed<Expression> ParseExpression(const LogicalLine& line,
                                   size_t begin,
                                   std::string_view text);

// A finite number, or what went wrong and where.
Parsed<double> Evaluate(const Expression& expression,
                        ParameterSource& parameters);

}  // namespace gatedyno

#endif  // GATEDYNO_NETLIST_EXPRESSION_H_
