// How much a text may expand to.

#ifndef GATEDYNO_NETLIST_EXPANSION_BUDGET_H_
#define GATEDYNO_NETLIST_EXPANSION_BUDGET_H_

#include <cstddef>

#include <fmt/format.h>

#include "harness/netlist/definition.h"
#include "harness/netlist/parse_error.h"

namespace gatedyno {

// A dozen nested .subckt can ask for billions of devices; cells extracted with
// their parasitics stay far below this.
inline constexpr size_t kMostExpandedLines = 500'000;

// Lines and parameters of all the instances of one text.
class ExpansionBudget {
 public:
  ParseStatus Spend(const Subckt& subckt) {
    const size_t cost =
        1 + subckt.lines.size() + subckt.header.size() + subckt.locals.size();
    if (cost > left_) {
      return Complain(subckt.name_position,
                      fmt::format("the instances of this file come to more "
                                  "than {} lines",
                                  kMostExpandedLines));
    }
    left_ -= cost;
    return std::monostate{};
  }

 private:
  size_t left_ = kMostExpandedLines;
};

}  // namespace gatedyno

#endif  // GATEDYNO_NETLIST_EXPANSION_BUDGET_H_
