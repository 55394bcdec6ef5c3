// The ladder of simulator settings: how exact, at what cost.
//
// The simulator's defaults are wrong for femtofarad circuits: its charge
// tolerance, 1e-14 C, exceeds the charge on a gate, so that local error control
// never bites.  Time steps follow trtol * reltol (and chgtol where a charge is
// small); reltol alone also decides when an iteration has converged, which
// costs more than it gives below 1e-3.  Tried on 82 delays, of all built-in
// cells at 45 and 180 nm, against reltol 1e-6, chgtol 1e-20 and a step of 0.02
// tau, crossings by cubic interpolation:
//
//   rung  reltol  chgtol  trtol   largest error   root mean square   time
//   0     1e-3    1e-17   1       0.51 %          0.19 %             0.8
//   1     1e-3    1e-17   0.3     0.15 %          0.05 %             1
//   2     1e-3    1e-18   0.1     0.06 %          0.02 %             1.6
//   3     1e-4    1e-18   0.1     0.008 %         0.004 %            3.1
//   4     1e-5    1e-19   0.1     0.002 %         0.0007 %           6.8
//
// What a rung promises is a bound on the error of any delay; each run checks it
// on a sample of its own, one rung tighter.

#ifndef GATEDYNO_DECK_SIM_SETTINGS_H_
#define GATEDYNO_DECK_SIM_SETTINGS_H_

#include <cstddef>
#include <string>
#include <vector>

namespace gatedyno {

// What can be asked for, relative to each delay.
inline constexpr double kFinestAccuracy = 1e-4;
inline constexpr double kCoarsestAccuracy = 0.05;
inline constexpr double kDefaultAccuracy = 0.002;

// The cheapest rung that promises `accuracy`.
// REQUIRES: accuracy >= kFinestAccuracy.
size_t RungFor(double accuracy);

// The lines for Job::settings: `rung`, the next tighter one, and the tighter
// one once more with all that helps a simulation to converge.
// REQUIRES: rung is RungFor(...) or one above it.
std::vector<std::string> SettingsLadder(size_t rung);

}  // namespace gatedyno

#endif  // GATEDYNO_DECK_SIM_SETTINGS_H_
