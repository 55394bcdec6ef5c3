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

double Interpolate(const Waveform& waveform, size_t i, double level_v) {
  const double t0_s = waveform.time_s[i - 1];
  const double v0_v = waveform.voltage_v[i - 1];
  const double share = (level_v - v0_v) / (waveform.voltage_v[i] - v0_v);
  return t0_s + share * (waveform.time_s[i] - t0_s);
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
