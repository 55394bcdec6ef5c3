#include "harness/report/wrap.h"

#include <algorithm>
#include <cassert>

namespace gatedyno {
namespace {

// All but the first byte of a code point.
bool IsContinuation(char c) {
  return (static_cast<unsigned char>(c) & 0xc0U) == 0x80U;
}

bool IsControl(char c) {
  constexpr unsigned char kDelete = 0x7f;
  const auto byte = static_cast<unsigned char>(c);
  return byte < ' ' || byte == kDelete;
}

// Bytes of the first `columns` code points.
size_t BytesOf(std::string_view text, size_t columns) {
  size_t at = 0;
  while (at < text.size() && (columns > 0 || IsContinuation(text[at]))) {
    columns -= IsContinuation(text[at]) ? 0U : 1U;
    ++at;
  }
  return at;
}

// Where to break a text that is wider than `columns`: after the last word that
// fits, or, where the first does not, wherever the line ends.
size_t BreakOf(std::string_view text, size_t columns) {
  const size_t limit = BytesOf(text, columns);
  size_t blank = text.find_last_of(' ', limit);
  if (blank != std::string_view::npos && blank > 0 &&
      text.substr(blank + 1).starts_with('%')) {
    blank = text.find_last_of(' ', blank - 1);  // Stays with its number.
  }
  const bool has_word =
      blank != std::string_view::npos && text.find_first_not_of(' ') < blank;
  return has_word ? blank : limit;
}

}  // namespace

size_t ColumnsOf(std::string_view text) {
  return text.size() - static_cast<size_t>(std::count_if(
                           text.begin(), text.end(), &IsContinuation));
}

std::string Wrap(std::string_view paragraph, size_t indent) {
  assert(indent < kColumns);
  std::string text(paragraph);
  std::replace_if(text.begin(), text.end(), &IsControl, '?');
  std::string_view rest = text;
  rest = rest.substr(0, rest.find_last_not_of(' ') + 1);
  std::string wrapped;
  size_t columns = kColumns;
  while (ColumnsOf(rest) > columns) {
    const size_t end = BreakOf(rest, columns);
    const std::string_view line = rest.substr(0, end);
    wrapped += line.substr(0, line.find_last_not_of(' ') + 1);
    wrapped += '\n' + std::string(indent, ' ');
    const size_t next = rest.find_first_not_of(' ', end);
    rest = next == std::string_view::npos ? "" : rest.substr(next);
    columns = kColumns - indent;
  }
  return wrapped += rest;
}

std::string OneLine(std::string_view text, size_t columns) {
  std::string line(text.substr(0, BytesOf(text, columns)));
  std::replace_if(line.begin(), line.end(), &IsControl, '?');
  return line;
}

}  // namespace gatedyno
