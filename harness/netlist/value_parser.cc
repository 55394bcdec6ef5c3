#include "harness/netlist/value_parser.h"

#include <cstddef>
#include <string>
#include <utility>

#include <fmt/format.h>

#include "harness/netlist/name.h"
#include "harness/netlist/strict_number.h"

namespace gatedyno {
namespace {

bool LooksLikeNumber(std::string_view text) {
  if (text.starts_with('-') || text.starts_with('+')) {
    text.remove_prefix(1);
  }
  if (text.empty() ||
      std::string_view(".0123456789").find(text[0]) == std::string_view::npos) {
    return false;
  }
  for (size_t i = 0; i < text.size(); ++i) {
    const bool exponent_sign = (text[i] == '-' || text[i] == '+') && i > 0 &&
                               (text[i - 1] == 'e' || text[i - 1] == 'E');
    if (!exponent_sign && text[i] != '.' &&
        kLettersAndDigits.find(text[i]) == std::string_view::npos) {
      return false;
    }
  }
  return true;
}

Expression Literal(double number, SourcePosition position) {
  return {{{Operation::kNumber, number, std::string(), position}}};
}

}  // namespace

Parsed<Value> ParseValue(const LogicalLine& line,
                         const Assignment& assignment,
                         std::string_view role) {
  std::string_view text = assignment.value.text;
  size_t begin = assignment.value.offset;
  if (assignment.value.kind == TokenKind::kBraced) {
    text = text.substr(1, text.size() - 2);
    ++begin;
  }
  if (LooksLikeNumber(text)) {
    const bool negative = text.starts_with('-');
    const bool has_sign = negative || text.starts_with('+');
    const auto number = ReadStrictNumber(text.substr(has_sign ? 1 : 0));
    if (!number) {
      return Complain(assignment.position,
                      fmt::format("expected {}, got {}{}",
                                  role,
                                  Quote(assignment.spelling),
                                  number.error()));
    }
    return Value{Literal(negative ? -*number : *number, assignment.position),
                 assignment.spelling,
                 assignment.position};
  }
  Parsed<Expression> expression = ParseExpression(line, begin, text);
  if (!expression.ok()) {
    return Forward(expression);
  }
  return Value{
      *std::move(expression), assignment.spelling, assignment.position};
}

Parsed<Value> ParseValue(const LogicalLine& line,
                         const Token& token,
                         std::string_view role) {
  return ParseValue(
      line,
      Assignment{"", token, std::string(token.text), token.position},
      role);
}

Parsed<std::vector<ParameterDefinition>> ParseParameters(
    const LogicalLine& line, const std::vector<Assignment>& assignments) {
  std::vector<ParameterDefinition> parameters;
  for (const Assignment& assignment : assignments) {
    Parsed<Value> value = ParseValue(line, assignment, "a value");
    if (!value.ok()) {
      return Forward(value);
    }
    parameters.push_back({assignment.name, *std::move(value)});
  }
  return parameters;
}

}  // namespace gatedyno
