#include "harness/page/thin_out.h"

#include <algorithm>
#include <cassert>
#include <cmath>
#include <cstddef>
#include <utility>
#include <vector>

namespace gatedyno {
namespace {

// The first and last point of a stretch.
using Stretch = std::pair<size_t, size_t>;

// What is within the times, and one more on either side.
Stretch Within(const std::vector<double>& time_s, double from_s, double to_s) {
  const auto first =
      std::upper_bound(time_s.begin(), time_s.end(), from_s) - time_s.begin();
  const auto last =
      std::lower_bound(time_s.begin(), time_s.end(), to_s) - time_s.begin();
  const auto count = static_cast<std::ptrdiff_t>(time_s.size());
  return {
      static_cast<size_t>(std::clamp<std::ptrdiff_t>(first - 1, 0, count - 1)),
      static_cast<size_t>(std::min(last, count - 1))};
}

double Departure(const Waveform& waveform, const Stretch& chord, size_t i) {
  const auto [first, last] = chord;
  const double share = (waveform.time_s[i] - waveform.time_s[first]) /
                       (waveform.time_s[last] - waveform.time_s[first]);
  return std::abs(waveform.voltage_v[i] - std::lerp(waveform.voltage_v[first],
                                                    waveform.voltage_v[last],
                                                    share));
}

// The point between the ends that is furthest from their chord; the first of
// the stretch where none departs.
size_t Furthest(const Waveform& waveform,
                const Stretch& stretch,
                double tolerance_v) {
  size_t furthest = stretch.first;
  double most_v = tolerance_v;
  for (size_t i = stretch.first + 1; i < stretch.second; ++i) {
    const double departure_v = Departure(waveform, stretch, i);
    if (departure_v > most_v) {
      most_v = departure_v;
      furthest = i;
    }
  }
  return furthest;
}

}  // namespace

Waveform ThinOut(const Waveform& waveform,
                 double from_s,
                 double to_s,
                 double tolerance_v) {
  assert(from_s < to_s && !waveform.time_s.empty());
  const Stretch whole = Within(waveform.time_s, from_s, to_s);
  std::vector<size_t> kept = {whole.first, whole.second};
  std::vector<Stretch> open = {whole};
  while (!open.empty()) {
    const Stretch stretch = open.back();
    open.pop_back();
    const size_t furthest = Furthest(waveform, stretch, tolerance_v);
    if (furthest != stretch.first) {
      kept.push_back(furthest);
      open.push_back({stretch.first, furthest});
      open.push_back({furthest, stretch.second});
    }
  }
  std::sort(kept.begin(), kept.end());
  kept.erase(std::unique(kept.begin(), kept.end()), kept.end());
  Waveform thin = {waveform.net, {}, {}};
  for (const size_t i : kept) {
    thin.time_s.push_back(waveform.time_s[i]);
    thin.voltage_v.push_back(waveform.voltage_v[i]);
  }
  return thin;
}

}  // namespace gatedyno
