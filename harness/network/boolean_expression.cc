#include "harness/network/boolean_expression.h"

#include <algorithm>
#include <cassert>
#include <string_view>

#include <fmt/format.h>

namespace gatedyno {
namespace {

using Operator = BooleanExpression::Operator;

std::string_view Sign(Operator op) {
  switch (op) {
    case Operator::kAnd:
      return " & ";
    case Operator::kXor:
      return " ^ ";
    case Operator::kOr:
      return " | ";
    case Operator::kName:
    case Operator::kNot:
      break;
  }
  return "";
}

// Larger binds weaker.
int Looseness(Operator op) {
  return static_cast<int>(op);
}

// Positions in `order` of the names, from left to right.
// NOLINTNEXTLINE(misc-no-recursion): as deep as the expression.
std::vector<std::ptrdiff_t> Positions(const BooleanExpression& expression,
                                      const std::vector<std::string>& order) {
  std::vector<std::ptrdiff_t> positions;
  if (expression.op == Operator::kName) {
    positions.push_back(std::find(order.begin(), order.end(), expression.name) -
                        order.begin());
  }
  for (const BooleanExpression& term : expression.terms) {
    const std::vector<std::ptrdiff_t> inner = Positions(term, order);
    positions.insert(positions.end(), inner.begin(), inner.end());
  }
  return positions;
}

}  // namespace

BooleanExpression Name(std::string name) {
  return {Operator::kName, std::move(name), {}};
}

BooleanExpression Not(BooleanExpression term) {
  if (term.op == Operator::kNot) {
    BooleanExpression inner = std::move(term.terms.front());
    return inner;
  }
  BooleanExpression negated = {Operator::kNot, "", {}};
  negated.terms.push_back(std::move(term));
  return negated;
}

BooleanExpression Combine(Operator op, std::vector<BooleanExpression> terms) {
  assert(!terms.empty());
  if (terms.size() == 1) {
    return std::move(terms.front());
  }
  BooleanExpression combined = {op, "", {}};
  for (BooleanExpression& term : terms) {
    if (term.op == op) {
      combined.terms.insert(
          combined.terms.end(), term.terms.begin(), term.terms.end());
    } else {
      combined.terms.push_back(std::move(term));
    }
  }
  return combined;
}

// NOLINTNEXTLINE(misc-no-recursion): as deep as the expression.
void SortTerms(BooleanExpression& expression,
               const std::vector<std::string>& order) {
  for (BooleanExpression& term : expression.terms) {
    SortTerms(term, order);
  }
  std::stable_sort(expression.terms.begin(),
                   expression.terms.end(),
                   [&](const BooleanExpression& a, const BooleanExpression& b) {
                     return Positions(a, order) < Positions(b, order);
                   });
}

// NOLINTNEXTLINE(misc-no-recursion): as deep as the expression.
int CountNames(const BooleanExpression& expression) {
  int count = expression.op == Operator::kName ? 1 : 0;
  for (const BooleanExpression& term : expression.terms) {
    count += CountNames(term);
  }
  return count;
}

// NOLINTNEXTLINE(misc-no-recursion): as deep as the expression.
int CountNots(const BooleanExpression& expression) {
  int count = expression.op == Operator::kNot ? 1 : 0;
  for (const BooleanExpression& term : expression.terms) {
    count += CountNots(term);
  }
  return count;
}

// NOLINTNEXTLINE(misc-no-recursion): as deep as the expression.
std::string ToText(const BooleanExpression& expression) {
  if (expression.op == Operator::kName) {
    return expression.name;
  }
  std::vector<std::string> parts;
  for (const BooleanExpression& term : expression.terms) {
    const bool looser = Looseness(term.op) > Looseness(expression.op);
    parts.push_back(looser ? fmt::format("({})", ToText(term)) : ToText(term));
  }
  return expression.op == Operator::kNot
             ? fmt::format("!{}", parts.front())
             : fmt::format("{}", fmt::join(parts, Sign(expression.op)));
}

}  // namespace gatedyno
