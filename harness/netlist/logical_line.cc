#include "harness/netlist/logical_line.h"

#include <algorithm>
#include <string_view>

namespace gatedyno {
namespace {

constexpr std::string_view kBlanks = " \t";

bool StartsDollarComment(std::string_view line, size_t dollar) {
  return dollar == 0 || line[dollar - 1] == ' ' || line[dollar - 1] == '\t' ||
         line[dollar - 1] == ',';
}

std::string_view WithoutComment(std::string_view line) {
  const size_t first = line.find_first_not_of(kBlanks);
  if (first == std::string_view::npos || line[first] == '*') {
    return {};
  }
  for (size_t i = first; i < line.size(); ++i) {
    const bool starts = line[i] == ';' || line.substr(i).starts_with("//") ||
                        (line[i] == '$' && StartsDollarComment(line, i));
    if (starts) {
      line = line.substr(0, i);
      break;
    }
  }
  const size_t last = line.find_last_not_of(kBlanks);
  return last == std::string_view::npos ? std::string_view()
                                        : line.substr(0, last + 1);
}

size_t ContinuationMark(std::string_view line) {
  const size_t first = line.find_first_not_of(kBlanks);
  return first != std::string_view::npos && line[first] == '+'
             ? first
             : std::string_view::npos;
}

}  // namespace

SourcePosition LogicalLine::PositionOf(size_t offset) const {
  const auto after = std::upper_bound(
      pieces.begin(), pieces.end(), offset, [](size_t value, const Piece& p) {
        return value < p.begin;
      });
  const Piece& piece = *std::prev(after);
  return {piece.line, static_cast<int>(offset - piece.begin) + 1};
}

Parsed<std::optional<LogicalLine>> LogicalLineReader::Next() {
  LogicalLine joined;
  for (; next_line_ <= source_.line_count(); ++next_line_) {
    const std::string_view line = WithoutComment(source_.Line(next_line_));
    if (line.empty()) {
      continue;
    }
    const size_t mark = ContinuationMark(line);
    if (mark == std::string_view::npos && !joined.pieces.empty()) {
      return joined;
    }
    if (mark != std::string_view::npos && joined.pieces.empty()) {
      return Complain({next_line_, static_cast<int>(mark) + 1},
                      "a continuation line with nothing above it to continue");
    }
    joined.pieces.push_back({joined.text.size(), next_line_});
    joined.text += line;
    if (mark != std::string_view::npos) {
      joined.text[joined.pieces.back().begin + mark] = ' ';
    }
  }
  if (joined.pieces.empty()) {
    return std::optional<LogicalLine>();
  }
  return joined;
}

}  // namespace gatedyno
