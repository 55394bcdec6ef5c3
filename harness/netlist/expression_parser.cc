// ParseExpression: recursive descent, one function per rule of the grammar in
// expression.h.

#include <array>
#include <string>
#include <utility>

#include <fmt/format.h>

#include "harness/base/text.h"
#include "harness/netlist/expression.h"
#include "harness/netlist/expression_scanner.h"
#include "harness/netlist/strict_number.h"

namespace gatedyno {
namespace {

// Far above what people write, far below what the stack holds.
constexpr int kDeepestNesting = 64;

struct Function {
  std::string_view name;
  Operation operation;
  bool takes_several;
};
constexpr std::array<Function, 4> kFunctions = {
    {{"abs", Operation::kAbs, false},
     {"max", Operation::kMax, true},
     {"min", Operation::kMin, true},
     {"sqrt", Operation::kSqrt, false}}};

const Function* FindFunction(std::string_view name) {
  for (const Function& function : kFunctions) {
    if (function.name == name) {
      return &function;
    }
  }
  return nullptr;
}

class ExpressionParser {
 public:
  explicit ExpressionParser(ExpressionScanner scanner) : scanner_(scanner) {}

  Parsed<Expression> Run() {
    if (const ParseStatus sum = Sum(); !sum.ok()) {
      return Forward(sum);
    }
    if (!scanner_.AtEnd()) {
      return Complain(
          scanner_.Position(),
          fmt::format("expected an operator, got {}", Quote(scanner_.Peek())));
    }
    return std::move(expression_);
  }

 private:
  ParseStatus Sum() {
    ParseStatus done = Product();
    while (done.ok()) {
      const SourcePosition position = scanner_.Position();
      if (scanner_.Take("+")) {
        done = Then(Product(), Operation::kAdd, position);
      } else if (scanner_.Take("-")) {
        done = Then(Product(), Operation::kSubtract, position);
      } else {
        break;
      }
    }
    return done;
  }

  ParseStatus Product() {
    ParseStatus done = Unary();
    while (done.ok()) {
      const SourcePosition position = scanner_.Position();
      if (scanner_.At("**")) {
        return Complain(position,
                        "dialects read a**b**c in two ways: put parentheses");
      }
      if (scanner_.Take("*")) {
        done = Then(Unary(), Operation::kMultiply, position);
      } else if (scanner_.Take("/")) {
        done = Then(Unary(), Operation::kDivide, position);
      } else {
        break;
      }
    }
    return done;
  }

  // Every way round the grammar comes through here: the depth is counted here.
  ParseStatus Unary() {
    const SourcePosition position = scanner_.Position();
    if (depth_ == kDeepestNesting) {
      return Complain(position,
                      fmt::format("an expression more than {} levels deep",
                                  kDeepestNesting));
    }
    ++depth_;
    ParseStatus done = std::monostate{};
    if (scanner_.Take("-")) {
      done = Then(Unary(), Operation::kNegate, position);
    } else if (scanner_.Take("+")) {
      done = Unary();
    } else {
      done = Power();
    }
    --depth_;
    return done;
  }

  ParseStatus Power() {
    ParseStatus done = Primary();
    const SourcePosition position = scanner_.Position();
    if (done.ok() && scanner_.Take("**")) {
      done = Then(Exponent(), Operation::kPower, position);
    }
    return done;
  }

  ParseStatus Exponent() {
    const SourcePosition position = scanner_.Position();
    if (scanner_.Take("-")) {
      return Then(Primary(), Operation::kNegate, position);
    }
    scanner_.Take("+");
    return Primary();
  }

  ParseStatus Primary() {
    const SourcePosition position = scanner_.Position();
    if (scanner_.AtNumber()) {
      return Number();
    }
    if (scanner_.AtName()) {
      return NameOrCall();
    }
    if (!scanner_.Take("(")) {
      return Complain(
          position,
          fmt::format(
              "expected a number, a parameter or '('{}",
              scanner_.AtEnd() ? "" : ", got " + Quote(scanner_.Peek())));
    }
    if (ParseStatus sum = Sum(); !sum.ok()) {
      return sum;
    }
    if (!scanner_.Take(")")) {
      return Complain(position, "no ')' for this '('");
    }
    return std::monostate{};
  }

  ParseStatus Number() {
    const SourcePosition position = scanner_.Position();
    const std::string_view word = scanner_.TakeNumber();
    const auto number = ReadStrictNumber(word);
    if (!number) {
      return Complain(
          position,
          fmt::format(
              "expected a number, got {}{}", Quote(word), number.error()));
    }
    expression_.steps.push_back(
        {Operation::kNumber, *number, std::string(), position});
    return std::monostate{};
  }

  ParseStatus NameOrCall() {
    const SourcePosition position = scanner_.Position();
    std::string name = ToLower(scanner_.TakeName());
    if (!scanner_.Take("(")) {
      expression_.steps.push_back(
          {Operation::kName, 0.0, std::move(name), position});
      return std::monostate{};
    }
    const Function* function = FindFunction(name);
    if (function == nullptr) {
      return Complain(position,
                      fmt::format("unknown function {}: known are abs, max, "
                                  "min, sqrt",
                                  Quote(name)));
    }
    return Arguments(*function, position);
  }

  ParseStatus Arguments(const Function& function, SourcePosition position) {
    int count = 0;
    do {
      if (ParseStatus argument = Sum(); !argument.ok()) {
        return argument;
      }
      ++count;
      if (count > 1 || !function.takes_several) {
        Push(function.operation, position);
      }
    } while (function.takes_several && scanner_.Take(","));
    if (!scanner_.Take(")")) {
      return Complain(
          scanner_.Position(),
          fmt::format("expected ')' after the argument of {}", function.name));
    }
    if (function.takes_several && count < 2) {
      return Complain(
          position,
          fmt::format("{} takes two arguments or more", function.name));
    }
    return std::monostate{};
  }

  void Push(Operation operation, SourcePosition position) {
    expression_.steps.push_back({operation, 0.0, std::string(), position});
  }

  ParseStatus Then(ParseStatus operand,
                   Operation operation,
                   SourcePosition position) {
    if (operand.ok()) {
      Push(operation, position);
    }
    return operand;
  }

  ExpressionScanner scanner_;
  int depth_ = 0;
  Expression expression_;
};

}  // namespace

Parsed<Expression> ParseExpression(const LogicalLine& line,
                                   size_t begin,
                                   std::string_view text) {
  return ExpressionParser(ExpressionScanner(line, begin, text)).Run();
}

}  // namespace gatedyno
