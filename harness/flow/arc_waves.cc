#include "harness/flow/arc_waves.h"

#include <algorithm>
#include <cassert>
#include <cmath>
#include <map>
#include <optional>
#include <string>
#include <utility>

#include <fmt/format.h>

#include "harness/compare/summary.h"
#include "harness/deck/stage_measures.h"
#include "harness/sim/replay.h"

namespace gatedyno {
namespace {

// Where the four-fanout delay, the trade's yardstick, is read.
constexpr double kFanout = 4.0;

// The point to look at; none where the arc has none that names its job.
const Point* NearestPoint(const Comparison& row) {
  const Point* nearest = nullptr;
  for (const Point& point : row.points) {
    if (!point.job_key.empty() &&
        (nearest == nullptr || std::abs(point.fanout - kFanout) <
                                   std::abs(nearest->fanout - kFanout))) {
      nearest = &point;
    }
  }
  return nearest;
}

// What of the arc is known before anything is simulated.
ArcWaves Begin(const RunResult& result, std::size_t place) {
  ArcWaves waves;
  waves.place = place;
  const Point* point = NearestPoint(result.comparisons[place]);
  if (point == nullptr) {
    waves.trouble = "the run keeps no point of it";
    return waves;
  }
  waves.fanout = point->fanout;
  waves.job_key = point->job_key;
  waves.stored_delay_s = point->delay_s;
  return waves;
}

// The jobs to run, each once: two arcs may share one.
class Replays {
 public:
  Status Add(const std::string& key, Store* store) {
    if (places_.contains(key)) {
      return Ok();
    }
    Result<std::optional<StoredJob>> stored = store->FindJob(key);
    if (!stored.ok()) {
      return Forward(stored);
    }
    std::optional<size_t>& place = places_[key];
    if (*stored) {
      place = jobs_.size();
      jobs_.push_back(AsItEnded(**stored));
    }
    return Ok();
  }

  Status Run(SimRunner* runner) {
    Result<std::vector<Outcome>> outcomes = SimulateAgain(jobs_, runner);
    if (!outcomes.ok()) {
      return Forward(outcomes);
    }
    outcomes_ = *std::move(outcomes);
    return Ok();
  }

  // Null where the store has no such job.
  const Job* JobOf(const std::string& key) const {
    const std::optional<size_t> place = places_.at(key);
    return place ? &jobs_[*place] : nullptr;
  }
  // REQUIRES: JobOf(key).
  const Outcome& OutcomeOf(const std::string& key) const {
    return outcomes_[*places_.at(key)];
  }

 private:
  static Job AsItEnded(const StoredJob& stored) {
    const int rung = stored.outcome ? stored.outcome->rung : 0;
    const int last = static_cast<int>(RungCount(stored.job)) - 1;
    Job job =
        OnlyRung(stored.job, static_cast<size_t>(std::clamp(rung, 0, last)));
    job.wants_waves = true;
    return job;
  }

  std::map<std::string, std::optional<size_t>> places_;
  std::vector<Job> jobs_;
  std::vector<Outcome> outcomes_;
};

std::optional<SeenInterval> See(const std::string& name,
                                const Job& job,
                                const Waves& waves) {
  const auto timed = std::find_if(
      waves.intervals.begin(), waves.intervals.end(), [&](const auto& one) {
        return one.name == name;
      });
  const auto asked = std::find_if(
      job.intervals.begin(), job.intervals.end(), [&](const auto& one) {
        return one.name == name;
      });
  if (timed == waves.intervals.end() || asked == job.intervals.end()) {
    return std::nullopt;
  }
  return SeenInterval{*asked, timed->from_s, timed->to_s};
}

void Complete(const Arc& arc, const Replays& replays, ArcWaves* waves) {
  const Job* job = replays.JobOf(waves->job_key);
  if (job == nullptr) {
    waves->trouble = fmt::format("the store has no job {}", waves->job_key);
    return;
  }
  const Outcome& again = replays.OutcomeOf(waves->job_key);
  if (!again.waves) {
    waves->trouble = again.measured() ? "the worker gave no waveforms"
                                      : fmt::format("{} again: {}",
                                                    EndingName(again.ending),
                                                    again.message);
    return;
  }
  for (const std::string& name : IntervalNames(arc)) {
    std::optional<SeenInterval> seen = See(name, *job, *again.waves);
    if (!seen) {
      waves->trouble = fmt::format("its job measures no '{}'", name);
      waves->intervals.clear();
      return;
    }
    waves->intervals.push_back(*std::move(seen));
  }
  waves->waveforms = again.waves->waveforms;
}

}  // namespace

Result<std::vector<ArcWaves>> WorstWaves(const RunResult& result,
                                         std::size_t count,
                                         Store* store,
                                         SimRunner* runner) {
  std::vector<ArcWaves> all;
  Replays replays;
  for (const std::size_t place :
       Summarise(result.comparisons, count).worst_by_effort) {
    all.push_back(Begin(result, place));
    if (all.back().trouble.empty()) {
      const Status added = replays.Add(all.back().job_key, store);
      if (!added.ok()) {
        return Forward(added);
      }
    }
  }
  const Status ran = replays.Run(runner);
  if (!ran.ok()) {
    return Forward(ran);
  }
  for (ArcWaves& waves : all) {
    if (waves.trouble.empty()) {
      Complete(result.comparisons[waves.place].arc, replays, &waves);
    }
  }
  return all;
}

}  // namespace gatedyno
