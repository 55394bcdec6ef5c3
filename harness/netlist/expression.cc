#include "harness/netlist/expression.h"

#include <algorithm>
#include <cassert>
#include <cmath>

#include <fmt/format.h>

namespace gatedyno {
namespace {

bool IsUnary(Operation operation) {
  return operation == Operation::kNegate || operation == Operation::kAbs ||
         operation == Operation::kSqrt;
}

double ApplyUnary(Operation operation, double x) {
  switch (operation) {
    case Operation::kNegate:
      return -x;
    case Operation::kAbs:
      return std::fabs(x);
    default:
      return std::sqrt(x);
  }
}

double ApplyBinary(Operation operation, double x, double y) {
  switch (operation) {
    case Operation::kAdd:
      return x + y;
    case Operation::kSubtract:
      return x - y;
    case Operation::kMultiply:
      return x * y;
    case Operation::kDivide:
      return x / y;
    case Operation::kPower:
      return std::pow(x, y);
    case Operation::kMin:
      return std::min(x, y);
    default:
      return std::max(x, y);
  }
}

// Takes the operands off `stack` and puts the result on it.
ParseStatus Apply(const Step& step, std::vector<double>& stack) {
  const double last = stack.back();
  if (step.operation == Operation::kDivide && last == 0.0) {
    return Complain(step.position, "division by zero");
  }
  if (step.operation == Operation::kSqrt && last < 0.0) {
    return Complain(step.position,
                    fmt::format("the square root of {:g}", last));
  }
  double value = 0.0;
  if (IsUnary(step.operation)) {
    value = ApplyUnary(step.operation, last);
  } else {
    stack.pop_back();
    value = ApplyBinary(step.operation, stack.back(), last);
  }
  if (!std::isfinite(value)) {
    return Complain(step.position, "the result is not a finite number");
  }
  stack.back() = value;
  return std::monostate{};
}

}  // namespace

Parsed<double> Evaluate(const Expression& expression,
                        ParameterSource& parameters) {
  std::vector<double> stack;
  for (const Step& step : expression.steps) {
    if (step.operation == Operation::kNumber) {
      stack.push_back(step.number);
    } else if (step.operation == Operation::kName) {
      const Parsed<double> value = parameters.Find(step.name, step.position);
      if (!value.ok()) {
        return Forward(value);
      }
      stack.push_back(*value);
    } else if (const ParseStatus applied = Apply(step, stack); !applied.ok()) {
      return Forward(applied);
    }
  }
  assert(stack.size() == 1);
  return stack.back();
}

}  // namespace gatedyno
