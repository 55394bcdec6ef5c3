#include "harness/worker/waveform.h"

#include <algorithm>
#include <cassert>
#include <cmath>

#include <fmt/format.h>

namespace gatedyno {
namespace {

// True when the voltage passes the level between points i - 1 and i.
bool Passes(const Waveform& waveform, size_t i, const Crossing& crossing) {
  const double before_v = waveform.voltage_v[i - 1];
  const double after_v = waveform.voltage_v[i];
  return crossing.edge == Edge::kRise
             ? before_v < crossing.level_v && after_v >= crossing.level_v
             : before_v > crossing.level_v && after_v <= crossing.level_v;
}

double Chord(const Waveform& waveform, size_t i) {
  return (waveform.voltage_v[i] - waveform.voltage_v[i - 1]) /
         (waveform.time_s[i] - waveform.time_s[i - 1]);
}

// dv/dt at point i, of the parabola through it and both neighbours; at either
// end of the waveform, of the straight line to the only one.
double SlopeAt(const Waveform& waveform, size_t i) {
  if (i == 0) {
    return Chord(waveform, 1);
  }
  if (i + 1 == waveform.time_s.size()) {
    return Chord(waveform, i);
  }
  const double before_s = waveform.time_s[i] - waveform.time_s[i - 1];
  const double after_s = waveform.time_s[i + 1] - waveform.time_s[i];
  return (Chord(waveform, i) * after_s + Chord(waveform, i + 1) * before_s) /
         (before_s + after_s);
}

// The time in [t(i-1), t(i)] at which the cubic is at the level.
double Interpolate(const Waveform& waveform, size_t i, double level_v) {
  const double step_s = waveform.time_s[i] - waveform.time_s[i - 1];
  const double v0_v = waveform.voltage_v[i - 1];
  const double rise_v = waveform.voltage_v[i] - v0_v;
  const double bend0_v = SlopeAt(waveform, i - 1) * step_s - rise_v;
  const double bend1_v = rise_v - SlopeAt(waveform, i) * step_s;
  const auto voltage = [&](double share) {
    const double rest = 1.0 - share;
    return v0_v + share * rise_v +
           share * rest * (rest * bend0_v + share * bend1_v);
  };
  // The ends lie on either side of the level, so halving cannot fail.
  double low = 0.0;
  double high = 1.0;
  const bool rises = rise_v > 0.0;
  constexpr int kHalvings = 53;  // As many as a double has binary digits.
  for (int k = 0; k < kHalvings; ++k) {
    const double middle = (low + high) / 2.0;
    const bool before = (voltage(middle) < level_v) == rises;
    (before ? low : high) = middle;
  }
  return waveform.time_s[i - 1] + high * step_s;
}

// To hundredths, and without the sign of a rounded-off zero.
double Hundredths(double voltage_v) {
  constexpr double kSteps = 100.0;
  return std::round(voltage_v * kSteps) / kSteps + 0.0;
}

std::string Range(const Waveform& waveform) {
  const auto [low, high] =
      std::minmax_element(waveform.voltage_v.begin(), waveform.voltage_v.end());
  return fmt::format("it stays between {:.2f} and {:.2f} V",
                     Hundredths(*low),
                     Hundredths(*high));
}

std::string Missing(const Waveform& waveform,
                    const Crossing& crossing,
                    int found) {
  const std::string_view verb =
      crossing.edge == Edge::kRise ? "rises" : "falls";
  const double stop_s = waveform.time_s.back();
  if (found == 0) {
    return fmt::format("v({}) never {} through {:g} V within {:g} s ({})",
                       waveform.net,
                       verb,
                       crossing.level_v,
                       stop_s,
                       Range(waveform));
  }
  return fmt::format(
      "v({}) {} through {:g} V only {} of {} times within {:g} s",
      waveform.net,
      verb,
      crossing.level_v,
      found,
      crossing.occurrence,
      stop_s);
}

}  // namespace

Result<double> CrossingTime(const Waveform& waveform,
                            const Crossing& crossing) {
  assert(waveform.net == crossing.net);
  assert(waveform.time_s.size() == waveform.voltage_v.size());
  assert(!waveform.time_s.empty() && crossing.occurrence >= 1);
  int found = 0;
  for (size_t i = 1; i < waveform.time_s.size(); ++i) {
    if (Passes(waveform, i, crossing) && ++found == crossing.occurrence) {
      return Interpolate(waveform, i, crossing.level_v);
    }
  }
  return BadInput(Missing(waveform, crossing, found));
}

Status CheckSwing(const Waveform& waveform, const SwingCheck& swing) {
  assert(waveform.net == swing.net);
  assert(!waveform.voltage_v.empty());
  const auto [low, high] =
      std::minmax_element(waveform.voltage_v.begin(), waveform.voltage_v.end());
  if (*low<swing.low_v&& * high> swing.high_v) {
    return Ok();
  }
  return BadInput(fmt::format(
      "v({}) does not swing from below {:g} V to above {:g} V ({}): look for "
      "a floating net or supply, or a contention",
      waveform.net,
      swing.low_v,
      swing.high_v,
      Range(waveform)));
}

}  // namespace gatedyno
