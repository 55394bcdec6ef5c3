#include "harness/netlist/parse_error.h"

#include <algorithm>
#include <cstddef>

#include <fmt/format.h>

namespace gatedyno {
namespace {

// Fits an 80-column terminal with room for the dots.
constexpr size_t kLongestLine = 76;
constexpr size_t kBeforeCaret = 50;
constexpr size_t kLongestQuote = 60;

std::string Printable(std::string_view text) {
  std::string shown(text);
  for (char& c : shown) {
    if (c == '\t') {
      c = ' ';
    } else if (c < ' ' || c > '~') {
      c = '?';
    }
  }
  return shown;
}

}  // namespace

std::string Quote(std::string_view text) {
  if (text.size() > kLongestQuote) {
    return fmt::format("'{}...'", Printable(text.substr(0, kLongestQuote)));
  }
  return fmt::format("'{}'", Printable(text));
}

std::string WordParseError(const ParseError& error, const SourceText& source) {
  std::string_view line = source.Line(error.position.line);
  size_t caret = static_cast<size_t>(error.position.column - 1);
  std::string_view before;
  std::string_view after;
  if (line.size() > kLongestLine) {
    if (caret > kBeforeCaret) {
      before = "...";
      line.remove_prefix(std::min(caret - kBeforeCaret, line.size()));
      caret = kBeforeCaret + before.size();
    }
    if (line.size() > kLongestLine) {
      after = "...";
      line = line.substr(0, kLongestLine);
    }
  }
  const std::string instance =
      error.instance.empty() ? "" : fmt::format(" (in {})", error.instance);
  return fmt::format("{}:{}:{}: {}{}\n{}{}{}\n{}^",
                     source.file_name(),
                     error.position.line,
                     error.position.column,
                     error.message,
                     instance,
                     before,
                     Printable(line),
                     after,
                     std::string(caret, ' '));
}

}  // namespace gatedyno
