// Every delay and every g of a spread of arcs against golden, and how often the
// true error of g lies within what is stated of it.
//
// Each built-in cell is taken at one of two nodes in turn, with one of its
// inputs, both output edges.  Golden is measured at the fanouts the run chose
// for the arc, and for every fourth cell at all fanouts it may choose from: the
// first tells the error of the simulation, the second adds that of the choice.

#include <algorithm>
#include <iterator>
#include <map>
#include <string>
#include <utility>
#include <vector>

#include <fmt/format.h>

#include "harness/deck/stage_measures.h"
#include "harness/fit/line_fit.h"
#include "harness/flow/fanout_choice.h"
#include "harness/sim/job_list.h"
#include "tests/bench/golden.h"
#include "tests/bench/parts.h"
#include "tests/bench/scene.h"
#include "tests/bench/tally.h"

namespace gatedyno {
namespace {

constexpr const char* kNodes[] = {"p45", "p180"};
constexpr size_t kEveryCellInFull = 4;
// Twice the step of the speed's golden at 45 nm, which would take twice as
// long; a few decks with half of it tell what that costs.
constexpr double kStepInTau = 1.0 / 20.0;

struct ChosenArc {
  StageTest test;
  const Comparison* comparison = nullptr;
  bool in_full = false;
};

// Cells number `turn`, `turn` + 2, ...
std::vector<ChosenArc> ChooseArcs(const Scene& scene, size_t turn) {
  std::map<std::string, size_t> numbers;  // Of cells.
  for (const CellEstimate& cell : scene.run->estimates) {
    numbers.emplace(cell.cell, numbers.size());
  }
  std::vector<ChosenArc> chosen;
  const std::vector<StageTest> tests = scene.Tests();
  for (size_t i = 0; i < tests.size(); ++i) {
    const size_t number = numbers.at(tests[i].arc.cell);
    const std::vector<std::string>& inputs =
        scene.run->estimates[number].inputs;
    const size_t round = number / std::size(kNodes);
    if (number % std::size(kNodes) == turn &&
        tests[i].arc.pin == inputs[round % inputs.size()]) {
      chosen.push_back({tests[i],
                        &scene.result.comparisons[i],
                        round % kEveryCellInFull == 0});
    }
  }
  return chosen;
}

std::vector<double> OwnFanouts(const std::vector<Point>& points) {
  std::vector<double> fanouts;
  for (const Point& point : points) {
    fanouts.push_back(point.fanout);
  }
  return fanouts;
}

Job JobAt(const Scene& scene, StageTest test, double fanout) {
  test.fanout = fanout;
  return StageJob(scene.bench, test);
}

// By the job's key.
using Outcomes = std::map<std::string, Outcome>;

Result<Outcomes> Simulate(const std::map<std::string, Job>& jobs,
                          SimRunner* runner) {
  std::vector<Job> list;
  for (const auto& [key, job] : jobs) {
    list.push_back(job);
  }
  Outcomes outcomes;
  JobList source(std::move(list));
  const Status done =
      runner->Run(source, [&](const Job& job, const Outcome& outcome) {
        if (outcome.measured()) {
          outcomes[job.key] = outcome;
        } else {
          fmt::print("  {}: {}\n", job.label, outcome.message);
        }
        return Ok();
      });
  if (!done.ok()) {
    return Forward(done);
  }
  return outcomes;
}

std::map<std::string, Job> JobsOf(const Scene& scene,
                                  const std::vector<ChosenArc>& arcs) {
  std::map<std::string, Job> jobs;
  for (const ChosenArc& arc : arcs) {
    for (const double fanout :
         arc.in_full ? AllFanouts({}) : OwnFanouts(arc.comparison->points)) {
      Job job = JobAt(scene, arc.test, fanout);
      std::string key = job.key;
      jobs.emplace(std::move(key), std::move(job));
    }
  }
  return jobs;
}

// What golden says of one node.
class Golden {
 public:
  Golden(const Scene& scene, Outcomes outcomes, ReferenceArcs references)
      : scene_(scene),
        outcomes_(std::move(outcomes)),
        references_(std::move(references)) {}

  // None where a deck could not be measured.
  std::vector<Point> Points(const StageTest& test,
                            const std::vector<double>& fanouts) const {
    std::vector<Point> points;
    for (const double fanout : fanouts) {
      const auto found = outcomes_.find(JobAt(scene_, test, fanout).key);
      if (found == outcomes_.end()) {
        return {};
      }
      points.push_back(PointOf(found->second, test.arc, fanout));
    }
    return points;
  }

  // g of the arc, over the reference inverter at its own fanouts or at all.
  Result<double> Effort(const std::vector<Point>& points,
                        Edge edge,
                        bool in_full) const {
    const MeasuredArc& own =
        edge == Edge::kRise ? scene_.references.rise : scene_.references.fall;
    const MeasuredArc& golden =
        edge == Edge::kRise ? references_.rise : references_.fall;
    const std::vector<double> wanted =
        in_full ? AllFanouts({}) : OwnFanouts(own.points);
    std::vector<Point> reference;
    for (const Point& point : golden.points) {
      if (std::find(wanted.begin(), wanted.end(), point.fanout) !=
          wanted.end()) {
        reference.push_back(point);
      }
    }
    const Result<Line> line = FitLine(points);
    const Result<Line> tau = FitLine(reference);
    if (!line.ok() || !tau.ok()) {
      return line.ok() ? Forward(tau) : Forward(line);
    }
    return line->slope_s / tau->slope_s;
  }

 private:
  const Scene& scene_;
  Outcomes outcomes_;
  ReferenceArcs references_;
};

Status TallyEffort(const Comparison& comparison,
                   const Result<double>& golden,
                   RelativeErrors* errors,
                   Coverage* coverage) {
  if (!golden.ok()) {
    return Forward(golden);
  }
  errors->Add(comparison.arc.cell + " " + DescribeArc(comparison.arc),
              comparison.effort.value,
              *golden);
  coverage->Add(comparison.effort.value - *golden,
                comparison.effort.u.value_or(0.0),
                comparison.line->points);
  return Ok();
}

Status TallyArc(const ChosenArc& arc, const Golden& golden, Tally* tally) {
  const Comparison& row = *arc.comparison;
  const std::vector<Point> points =
      golden.Points(arc.test, OwnFanouts(row.points));
  if (!row.line || points.empty()) {
    ++tally->not_measured;
    return Ok();
  }
  for (size_t i = 0; i < points.size(); ++i) {
    tally->delays.Add(
        fmt::format(
            "{} {} h={}", row.arc.cell, DescribeArc(row.arc), points[i].fanout),
        row.points[i].delay_s,
        points[i].delay_s);
  }
  ++tally->arcs_by_points[row.line->points];
  if (row.effort.u == 0.0) {
    ++tally->exact;
    return Ok();
  }
  const Status own = TallyEffort(row,
                                 golden.Effort(points, row.arc.edge, false),
                                 &tally->effort,
                                 &tally->coverage);
  if (!own.ok() || !arc.in_full) {
    return own;
  }
  return TallyEffort(
      row,
      golden.Effort(
          golden.Points(arc.test, AllFanouts({})), row.arc.edge, true),
      &tally->effort_full,
      &tally->coverage_full);
}

// What golden itself may be wrong by, on a few of its decks.
Status TallyHalfStep(const std::map<std::string, Job>& jobs,
                     const Outcomes& outcomes,
                     GoldenRunner* half,
                     Tally* tally) {
  constexpr size_t kFew = 6;
  std::map<std::string, Job> few;  // Keys are as good as random.
  for (auto job = jobs.begin(); few.size() < kFew && job != jobs.end(); ++job) {
    few.insert(*job);
  }
  const Result<Outcomes> again = Simulate(few, half);
  if (!again.ok()) {
    return Forward(again);
  }
  for (const auto& [key, outcome] : *again) {
    for (const Edge edge : {Edge::kRise, Edge::kFall}) {
      if (outcomes.contains(key)) {
        tally->half_step.Add(few.at(key).label,
                             DelayOf(outcomes.at(key), edge),
                             DelayOf(outcome, edge));
      }
    }
  }
  return Ok();
}

Status TallyNode(size_t turn, Tally* tally) {
  Plan plan;
  plan.node = kNodes[turn];
  plan.cells = {"*"};
  Result<WorkerPool> pool = WorkerPool::Make({});
  if (!pool.ok()) {
    return Forward(pool);
  }
  const Result<Scene> scene = MeasureScene(plan, &*pool, &*pool);
  if (!scene.ok()) {
    return Forward(scene);
  }
  const double step_s = kStepInTau * scene->calibration().tau_s.value;
  GoldenRunner golden_runner(&*pool, step_s);
  const std::vector<ChosenArc> arcs = ChooseArcs(*scene, turn);
  const std::map<std::string, Job> jobs = JobsOf(*scene, arcs);
  Result<Outcomes> outcomes = Simulate(jobs, &golden_runner);
  Result<ReferenceArcs> references =
      MeasureReference(*scene, AllFanouts({}), &golden_runner);
  if (!outcomes.ok() || !references.ok()) {
    return outcomes.ok() ? Forward(references) : Forward(outcomes);
  }
  tally->golden_decks += golden_runner.simulated();
  tally->loosened += golden_runner.loosened();
  GoldenRunner half(&*pool, step_s / 2);
  if (Status done = TallyHalfStep(jobs, *outcomes, &half, tally); !done.ok()) {
    return done;
  }
  const Golden golden(*scene, *std::move(outcomes), *std::move(references));
  for (const ChosenArc& arc : arcs) {
    if (Status done = TallyArc(arc, golden, tally); !done.ok()) {
      return done;
    }
  }
  return Ok();
}

}  // namespace

Result<bool> BenchAccuracy() {
  Tally tally;
  for (size_t turn = 0; turn < std::size(kNodes); ++turn) {
    if (const Status done = TallyNode(turn, &tally); !done.ok()) {
      return Forward(done);
    }
  }
  return PrintTally(tally);
}

}  // namespace gatedyno
