#include "harness/record/arc.h"

#include <fmt/format.h>
#include <fmt/ranges.h>

namespace gatedyno {

std::string DescribeArc(const Arc& arc) {
  return fmt::format("{}->{} {}", arc.pin, arc.output, EdgeName(arc.edge));
}

std::string DescribeSide(const Arc& arc) {
  std::vector<std::string> parts;
  for (const SideInput& side : arc.side) {
    parts.push_back(fmt::format("{}={}", side.pin, side.high ? 1 : 0));
  }
  return fmt::format("{}", fmt::join(parts, " "));
}

}  // namespace gatedyno
