#include "harness/record/arc.h"

#include <fmt/format.h>

namespace gatedyno {

std::string DescribeArc(const Arc& arc) {
  std::string text =
      fmt::format("{}->{} {}", arc.pin, arc.output, EdgeName(arc.edge));
  for (const SideInput& side : arc.side) {
    const bool first = &side == &arc.side.front();
    text +=
        fmt::format("{} {}={}", first ? "," : "", side.pin, side.high ? 1 : 0);
  }
  return text;
}

}  // namespace gatedyno
