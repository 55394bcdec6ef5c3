#include "harness/netlist/fields.h"

#include <cstddef>
#include <set>
#include <utility>

#include <fmt/format.h>

#include "harness/base/text.h"
#include "harness/netlist/name.h"

namespace gatedyno {
namespace {

constexpr std::string_view kParamsKeyword = "params:";

// Takes a leading "params:" off; what is left may be empty.
void DropParamsKeyword(Token& token, Fields& fields) {
  if (token.kind != TokenKind::kWord ||
      !EqualsIgnoringCase(token.text.substr(0, kParamsKeyword.size()),
                          kParamsKeyword)) {
    return;
  }
  fields.params_keyword = token.position;
  token.text.remove_prefix(kParamsKeyword.size());
  token.offset += kParamsKeyword.size();
  token.position.column += static_cast<int>(kParamsKeyword.size());
}

Parsed<Assignment> MakeAssignment(const Token& name, const Token* value) {
  if (name.kind != TokenKind::kWord || !IsParameterName(name.text)) {
    return Complain(name.position,
                    fmt::format("expected a parameter name before '=', got {}",
                                Quote(name.text)));
  }
  if (value == nullptr || value->kind == TokenKind::kEquals) {
    return Complain(name.position,
                    fmt::format("no value after '{}='", name.text));
  }
  return Assignment{ToLower(name.text),
                    *value,
                    fmt::format("{}={}", name.text, value->text),
                    name.position};
}

tl::unexpected<ParseError> NotAnAssignment(const Token& token) {
  return Complain(token.position,
                  fmt::format("expected name=value, got {}: an expression with "
                              "blanks goes in braces",
                              Quote(token.text)));
}

}  // namespace

Parsed<Fields> SplitFields(const LogicalLine& line) {
  Parsed<std::vector<Token>> tokens = Tokenize(line);
  if (!tokens.ok()) {
    return Forward(tokens);
  }
  Fields fields;
  std::set<std::string> names;
  const auto at = [&tokens](size_t i) {
    return i < tokens->size() ? &(*tokens)[i] : nullptr;
  };
  for (size_t i = 0; i < tokens->size(); ++i) {
    Token& token = *at(i);
    DropParamsKeyword(token, fields);
    if (token.text.empty()) {
      continue;
    }
    if (token.kind == TokenKind::kEquals) {
      return Complain(token.position, "expected a parameter name before '='");
    }
    const Token* next = at(i + 1);
    if (next == nullptr || next->kind != TokenKind::kEquals) {
      if (!fields.assignments.empty() || fields.params_keyword) {
        return NotAnAssignment(token);
      }
      fields.words.push_back(token);
      continue;
    }
    Parsed<Assignment> assignment = MakeAssignment(token, at(i + 2));
    if (!assignment.ok()) {
      return Forward(assignment);
    }
    if (!names.insert(assignment->name).second) {
      return Complain(token.position,
                      fmt::format("{} is given twice", Quote(token.text)));
    }
    fields.assignments.push_back(*std::move(assignment));
    i += 2;
  }
  return fields;
}

}  // namespace gatedyno
