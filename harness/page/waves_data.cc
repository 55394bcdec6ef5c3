#include "harness/page/waves_data.h"

#include <algorithm>
#include <cmath>
#include <cstddef>
#include <optional>
#include <utility>

#include <nlohmann/json.hpp>

#include "harness/page/data_json.h"
#include "harness/page/thin_out.h"
#include "harness/page/wave_view.h"
#include "harness/report/number_text.h"

namespace gatedyno {
namespace {

using nlohmann::json;

json Rounded(double number, double steps_a_unit) {
  return ShortNumber(std::round(number * steps_a_unit) / steps_a_unit);
}

json Picoseconds(double seconds) {
  constexpr double kPicosecondsPerSecond = 1e12;
  constexpr double kSteps = 1e3;
  return Rounded(seconds * kPicosecondsPerSecond, kSteps);
}

json Volts(double volts) {
  constexpr double kSteps = 1e4;
  return Rounded(volts, kSteps);
}

json LineData(const Waveform& waveform, const WaveView& view) {
  const Waveform thin = ThinOut(waveform, view.from_s, view.to_s);
  json line = json::array();
  for (size_t i = 0; i < thin.time_s.size(); ++i) {
    line.push_back(
        {Picoseconds(thin.time_s[i] - view.zero_s), Volts(thin.voltage_v[i])});
  }
  return line;
}

json CrossingData(const Crossing& crossing,
                  double time_s,
                  const ArcWaves& waves) {
  const auto net = std::find_if(
      waves.waveforms.begin(), waves.waveforms.end(), [&](const auto& one) {
        return one.net == crossing.net;
      });
  return {net - waves.waveforms.begin(),
          Picoseconds(time_s),
          Volts(crossing.level_v),
          EdgeName(crossing.edge)};
}

json MarksData(const ArcWaves& waves, const WaveView& view, const Arc& arc) {
  json marks = json::array();
  for (const SeenInterval& seen : waves.intervals) {
    const auto& [interval, from_s, to_s] = seen;
    marks.push_back(
        {{"name", IntervalTitle(seen, waves, arc)},
         {"text", gatedyno::Picoseconds(to_s - from_s)},
         {"from", CrossingData(interval.from, from_s - view.zero_s, waves)},
         {"to", CrossingData(interval.to, to_s - view.zero_s, waves)}});
  }
  return marks;
}

json HandData(const WaveView& view) {
  return view.hand_delay_s ? json{Picoseconds(*view.hand_delay_s),
                                  gatedyno::Picoseconds(*view.hand_delay_s)}
                           : json(nullptr);
}

json ArcData(const ArcWaves& waves, const RunResult& result) {
  const Arc& arc = result.comparisons[waves.place].arc;
  const WaveView view = ViewOf(waves, result);
  json nets = json::array();
  for (const Waveform& waveform : waves.waveforms) {
    nets.push_back({{"name", NetName(waveform.net, waves, arc)},
                    {"line", LineData(waveform, view)}});
  }
  return {{"place", waves.place},
          {"view",
           {Picoseconds(view.from_s - view.zero_s),
            Picoseconds(view.to_s - view.zero_s)}},
          {"supply", ShortNumber(view.supply_v)},
          {"hand", HandData(view)},
          {"nets", std::move(nets)},
          {"marks", MarksData(waves, view, arc)}};
}

}  // namespace

std::string WavesData(std::span<const ArcWaves> waves,
                      const RunResult& result) {
  json data = json::array();
  for (const ArcWaves& one : waves) {
    if (one.trouble.empty()) {
      data.push_back(ArcData(one, result));
    }
  }
  return data.dump(-1, ' ', false, json::error_handler_t::replace);
}

}  // namespace gatedyno
