#include "harness/worker/measure.h"

#include <algorithm>
#include <cassert>

#include <fmt/format.h>

namespace gatedyno {
namespace {

Outcome Failed(std::string message) {
  Outcome outcome;
  outcome.ending = Ending::kFailed;
  outcome.message = std::move(message);
  return outcome;
}

const Waveform& WaveformOf(const std::vector<Waveform>& waveforms,
                           const std::string& net) {
  const auto found = std::find_if(
      waveforms.begin(), waveforms.end(), [&](const Waveform& waveform) {
        return waveform.net == net;
      });
  assert(found != waveforms.end());
  return *found;
}

Result<TimedInterval> TimeInterval(const Interval& interval,
                                   const std::vector<Waveform>& waveforms) {
  double time_s[2] = {};
  const Crossing* ends[] = {&interval.from, &interval.to};
  for (size_t i = 0; i < std::size(ends); ++i) {
    const Result<double> crossing_s =
        CrossingTime(WaveformOf(waveforms, ends[i]->net), *ends[i]);
    if (!crossing_s.ok()) {
      return BadInput(
          fmt::format("{}: {}", interval.name, crossing_s.error().message));
    }
    time_s[i] = *crossing_s;
  }
  return TimedInterval{interval.name, time_s[0], time_s[1]};
}

}  // namespace

std::set<std::string> NetsOf(const Job& job) {
  std::set<std::string> nets;
  for (const Interval& interval : job.intervals) {
    nets.insert({interval.from.net, interval.to.net});
  }
  for (const SwingCheck& swing : job.swings) {
    nets.insert(swing.net);
  }
  return nets;
}

Outcome Measure(const Job& job, const std::vector<Waveform>& waveforms) {
  for (const SwingCheck& swing : job.swings) {
    const Status swings = CheckSwing(WaveformOf(waveforms, swing.net), swing);
    if (!swings.ok()) {
      return Failed(swings.error().message);
    }
  }
  Outcome outcome;
  std::vector<TimedInterval> timed;
  for (const Interval& interval : job.intervals) {
    Result<TimedInterval> ends = TimeInterval(interval, waveforms);
    if (!ends.ok()) {
      return Failed(ends.error().message);
    }
    outcome.values_s[interval.name] = ends->to_s - ends->from_s;
    timed.push_back(*std::move(ends));
  }
  if (job.wants_waves) {
    outcome.waves = {waveforms, std::move(timed)};
  }
  outcome.ending = Ending::kMeasured;
  return outcome;
}

Outcome RunJob(const Job& job, Session* session) {
  const Result<std::vector<Waveform>> waveforms =
      session->Run(DeckText(job, 0), NetsOf(job), job.stop_s);
  Outcome outcome = waveforms.ok() ? Measure(job, *waveforms)
                                   : Failed(waveforms.error().message);
  outcome.simulator_s = session->last_run_s();
  return outcome;
}

}  // namespace gatedyno
