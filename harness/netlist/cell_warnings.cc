#include "harness/netlist/cell_warnings.h"

#include <fmt/format.h>
#include <fmt/ranges.h>

namespace gatedyno {
namespace {

bool IsTransistorSize(double size_m) {
  return size_m >= 1e-9 && size_m < 1e-3;
}

}  // namespace

void AddWarnings(const std::set<std::string>& unused_remarks, Cell& cell) {
  if (!unused_remarks.empty()) {
    cell.warnings.push_back(
        fmt::format("parameters {} are remarks on the layout and not used",
                    fmt::join(unused_remarks, ", ")));
  }
  for (const Mosfet& mosfet : cell.mosfets) {
    if (!IsTransistorSize(mosfet.width_m) ||
        !IsTransistorSize(mosfet.length_m)) {
      cell.warnings.push_back(
          fmt::format("{} is {:g} m wide and {:g} m long, no transistor's "
                      "size: is a unit missing, or is M (milli) meant as MEG?",
                      mosfet.name,
                      mosfet.width_m,
                      mosfet.length_m));
      return;
    }
  }
}

}  // namespace gatedyno
