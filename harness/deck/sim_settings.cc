#include "harness/deck/sim_settings.h"

#include <algorithm>
#include <array>
#include <cassert>
#include <string_view>

#include <fmt/format.h>

namespace gatedyno {
namespace {

struct Rung {
  double promise;  // Largest error of a delay, relative.
  double reltol;
  double chgtol_c;
  double trtol;
};

constexpr std::array<Rung, 5> kRungs = {{
    {1e-2, 1e-3, 1e-17, 1.0},
    {2e-3, 1e-3, 1e-17, 0.3},
    {1e-3, 1e-3, 1e-18, 0.1},
    {1e-4, 1e-4, 1e-18, 0.1},
    {0.0, 1e-5, 1e-19, 0.1},  // Only to check the one before.
}};

// Gear damps what makes the trapezoidal rule ring, at twice the error; more
// iterations where a step or the operating point needs them.
constexpr std::string_view kStubborn = " method=gear itl1=1000 itl4=200";

std::string SettingsLine(const Rung& rung, std::string_view more) {
  return fmt::format(".options reltol={} chgtol={} trtol={} num_threads=1{}\n",
                     rung.reltol,
                     rung.chgtol_c,
                     rung.trtol,
                     more);
}

}  // namespace

size_t RungFor(double accuracy) {
  assert(accuracy >= kFinestAccuracy);
  const auto found =
      std::find_if(kRungs.begin(), kRungs.end(), [&](const Rung& rung) {
        return rung.promise <= accuracy;
      });
  return static_cast<size_t>(found - kRungs.begin());
}

std::vector<std::string> SettingsLadder(size_t rung) {
  assert(rung < kRungs.size());
  const Rung& tighter = kRungs[std::min(rung + 1, kRungs.size() - 1)];
  return {SettingsLine(kRungs[rung], ""),
          SettingsLine(tighter, ""),
          SettingsLine(tighter, kStubborn)};
}

}  // namespace gatedyno
