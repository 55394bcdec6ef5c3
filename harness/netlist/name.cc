#include "harness/netlist/name.h"

#include <fmt/format.h>

namespace gatedyno {
namespace {

constexpr std::string_view kPunctuation = "_.!#$<>[]:/-+%&@~^?|";

bool IsOnly(std::string_view text,
            std::string_view allowed,
            std::string_view also_allowed) {
  for (const char c : text) {
    if (allowed.find(c) == std::string_view::npos &&
        also_allowed.find(c) == std::string_view::npos) {
      return false;
    }
  }
  return true;
}

}  // namespace

bool IsParameterName(std::string_view text) {
  return !text.empty() && (text[0] < '0' || text[0] > '9') &&
         IsOnly(text, kLettersAndDigits, "_");
}

Parsed<std::string> ParseName(const Token& token, std::string_view kind) {
  if (token.kind != TokenKind::kWord ||
      !IsOnly(token.text, kLettersAndDigits, kPunctuation)) {
    return Complain(
        token.position,
        fmt::format("expected {}, got {}", kind, Quote(token.text)));
  }
  return std::string(token.text);
}

}  // namespace gatedyno
