#include "harness/netlist/source_text.h"

#include <algorithm>
#include <cstddef>
#include <utility>

namespace gatedyno {

SourceText::SourceText(std::string_view text, std::string file_name)
    : file_name_(std::move(file_name)) {
  constexpr std::string_view kByteOrderMark = "\xEF\xBB\xBF";
  if (text.starts_with(kByteOrderMark)) {
    text.remove_prefix(kByteOrderMark.size());
  }
  while (!text.empty()) {
    const size_t end = std::min(text.find('\n'), text.size());
    std::string_view line = text.substr(0, end);
    if (line.ends_with('\r')) {
      line.remove_suffix(1);
    }
    lines_.push_back(line);
    text.remove_prefix(std::min(end + 1, text.size()));
  }
}

std::string_view SourceText::Line(int number) const {
  if (number < 1 || number > line_count()) {
    return {};
  }
  return lines_[static_cast<size_t>(number - 1)];
}

}  // namespace gatedyno
