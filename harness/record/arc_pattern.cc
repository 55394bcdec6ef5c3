#include "harness/record/arc_pattern.h"

#include <vector>

#include <fmt/format.h>
#include <fmt/ranges.h>
#include <fnmatch.h>

namespace gatedyno {
namespace {

constexpr const char* kAll = "*";

bool Fits(const std::string& pattern, const std::string& name) {
  return ::fnmatch(pattern.c_str(), name.c_str(), 0) == 0;
}

}  // namespace

bool Covers(const ArcPattern& pattern,
            const Arc& arc,
            const std::string& corner) {
  return Fits(pattern.cells, arc.cell) && Fits(pattern.pins, arc.pin) &&
         Fits(pattern.outputs, arc.output) && Fits(pattern.corners, corner) &&
         (!pattern.edge || *pattern.edge == arc.edge);
}

std::string DescribePattern(const ArcPattern& pattern) {
  std::vector<std::string> parts;
  const auto add = [&parts](const char* what, const std::string& name) {
    if (name != kAll) {
      parts.push_back(fmt::format("{}{}", what, name));
    }
  };
  add("", pattern.cells);
  add("pin ", pattern.pins);
  add("output ", pattern.outputs);
  if (pattern.edge) {
    parts.emplace_back(EdgeName(*pattern.edge));
  }
  add("corner ", pattern.corners);
  return parts.empty() ? "every arc"
                       : fmt::format("{}", fmt::join(parts, ", "));
}

}  // namespace gatedyno
