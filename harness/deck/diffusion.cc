#include "harness/deck/diffusion.h"

#include <algorithm>
#include <cmath>

namespace gatedyno {
namespace {

bool IsPin(const Cell& cell, NetId net) {
  return std::find(cell.pins.begin(), cell.pins.end(), net) != cell.pins.end();
}

// Joined to exactly one other source or drain, of a device of the same kind,
// width, fingers and copies, and to nothing else.
bool IsSharedStrip(const Cell& cell, const Mosfet& mosfet, NetId net) {
  if (IsPin(cell, net)) {
    return false;
  }
  int terminals = 0;
  for (const Mosfet& other : cell.mosfets) {
    const int here = (other.drain == net ? 1 : 0) + (other.source == net);
    const bool alike =
        other.polarity == mosfet.polarity && other.fingers == mosfet.fingers &&
        other.multiplicity == mosfet.multiplicity &&
        std::abs(other.width_m - mosfet.width_m) < 1e-3 * mosfet.width_m;
    if (other.gate == net || (here > 0 && !alike)) {
      return false;
    }
    terminals += here;
  }
  return terminals == 2;
}

struct Strip {
  double area_m2 = 0.0;
  double perimeter_m = 0.0;
};

Strip StripOf(double finger_m, bool shared, const DiffusionRules& rules) {
  if (shared) {
    return {finger_m * rules.shared_m / 2, finger_m + rules.shared_m};
  }
  return {finger_m * rules.contacted_m, 2 * (finger_m + rules.contacted_m)};
}

}  // namespace

Diffusion DiffusionOf(const Cell& cell,
                      const Mosfet& mosfet,
                      const DiffusionRules& rules) {
  const DiffusionGeometry& given = mosfet.diffusion;
  if (given.drain_area_m2 && given.source_area_m2 && given.drain_perimeter_m &&
      given.source_perimeter_m) {
    return {*given.drain_area_m2,
            *given.source_area_m2,
            *given.drain_perimeter_m,
            *given.source_perimeter_m,
            true};
  }
  const double fingers = std::max(1.0, std::round(mosfet.fingers));
  const double finger_m = mosfet.width_m / fingers;
  const double drain_strips = std::ceil(fingers / 2);
  const double source_strips = std::floor(fingers / 2) + 1;
  const bool single = fingers == 1.0;
  const Strip drain = StripOf(
      finger_m, single && IsSharedStrip(cell, mosfet, mosfet.drain), rules);
  const Strip source = StripOf(
      finger_m, single && IsSharedStrip(cell, mosfet, mosfet.source), rules);
  return {drain_strips * drain.area_m2,
          source_strips * source.area_m2,
          drain_strips * drain.perimeter_m,
          source_strips * source.perimeter_m,
          false};
}

}  // namespace gatedyno
