// Boolean expressions over pin names, as people write them: "!(a & b | c)".

#ifndef GATEDYNO_NETWORK_BOOLEAN_EXPRESSION_H_
#define GATEDYNO_NETWORK_BOOLEAN_EXPRESSION_H_

#include <string>
#include <vector>

namespace gatedyno {

struct BooleanExpression {
  enum class Operator { kName, kNot, kAnd, kXor, kOr };

  Operator op = Operator::kName;
  std::string name;  // For kName.
  std::vector<BooleanExpression> terms;
};

BooleanExpression Name(std::string name);
// !!x is x.
BooleanExpression Not(BooleanExpression term);
// One term stands for itself; nested terms of the same operator are joined.
BooleanExpression Combine(BooleanExpression::Operator op,
                          std::vector<BooleanExpression> terms);

// Terms in the order of the names they begin with, all the way down; `order`
// lists every name.
void SortTerms(BooleanExpression& expression,
               const std::vector<std::string>& order);

// Names in it, repeats counted.
int CountNames(const BooleanExpression& expression);
int CountNots(const BooleanExpression& expression);

// `!` binds before `&`, `&` before `^`, `^` before `|`.
std::string ToText(const BooleanExpression& expression);

}  // namespace gatedyno

#endif  // GATEDYNO_NETWORK_BOOLEAN_EXPRESSION_H_
