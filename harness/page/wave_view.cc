#include "harness/page/wave_view.h"

#include <algorithm>
#include <cassert>

#include "harness/page/hand_line.h"

namespace gatedyno {

WaveView ViewOf(const ArcWaves& waves, const RunResult& result) {
  assert(waves.trouble.empty() && !waves.intervals.empty());
  constexpr double kMargin = 0.5;
  const SeenInterval& delay = waves.intervals.front();
  WaveView view;
  view.zero_s = view.from_s = view.to_s = delay.from_s;
  view.delay_s = delay.to_s - delay.from_s;
  for (const SeenInterval& seen : waves.intervals) {
    view.from_s = std::min({view.from_s, seen.from_s, seen.to_s});
    view.to_s = std::max({view.to_s, seen.from_s, seen.to_s});
  }
  const double margin_s = kMargin * (view.to_s - view.from_s);
  view.from_s -= margin_s;
  view.to_s += margin_s;
  const Comparison& row = result.comparisons[waves.place];
  if (const Calibration* calibration = CalibrationOf(row, result)) {
    view.supply_v = calibration->corner.supply_v;
    const HandLine hand = HandLineOf(row, *calibration);
    view.hand_delay_s = hand.slope_s * waves.fanout + hand.intercept_s;
    constexpr double kRoom = 1.05;
    view.to_s = std::max(view.to_s, view.zero_s + kRoom * *view.hand_delay_s);
  }
  for (const Waveform& waveform : waves.waveforms) {
    view.from_s = std::max(view.from_s, waveform.time_s.front());
    view.to_s = std::min(view.to_s, waveform.time_s.back());
  }
  return view;
}

std::string NetName(const std::string& net,
                    const ArcWaves& waves,
                    const Arc& arc) {
  const Interval& delay = waves.intervals.front().interval;
  return net == delay.from.net ? arc.pin
         : net == delay.to.net ? arc.output
                               : net;
}

std::string IntervalTitle(const SeenInterval& seen,
                          const ArcWaves& waves,
                          const Arc& arc) {
  const Interval& interval = seen.interval;
  return interval.from.net == interval.to.net
             ? "transition of " + NetName(interval.from.net, waves, arc)
             : "delay";
}

}  // namespace gatedyno
