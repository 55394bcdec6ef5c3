#include "harness/flow/characterize.h"

#include <algorithm>
#include <cmath>
#include <iterator>
#include <map>
#include <numbers>
#include <span>
#include <utility>

#include <fmt/format.h>

#include "harness/compare/compare.h"
#include "harness/flow/accuracy_sample.h"
#include "harness/flow/arc_measurement.h"
#include "harness/flow/calibrate.h"
#include "harness/flow/cell_circuit.h"

namespace gatedyno {
namespace {

CellSummary SummaryOf(const Cell& cell, const CellEstimate& estimate) {
  CellSummary summary{.name = estimate.cell,
                      .functions = {},
                      .stages = estimate.stages,
                      .tallest_pull_down = 0,
                      .tallest_pull_up = 0,
                      .circuit = CircuitOf(cell)};
  for (const OutputEstimate& output : estimate.outputs) {
    summary.functions.push_back(
        fmt::format("{} = {}", output.output, output.function));
    summary.tallest_pull_down =
        std::max(summary.tallest_pull_down, output.tallest_pull_down);
    summary.tallest_pull_up =
        std::max(summary.tallest_pull_up, output.tallest_pull_up);
  }
  return summary;
}

Tolerance AllowedFor(const Plan& plan,
                     const Arc& arc,
                     const std::string& corner) {
  return ToleranceFor(arc, corner, plan.tolerance, plan.tolerance_rules);
}

RunResult StartResult(const PreparedRun& run, const std::string& simulator) {
  RunResult result;
  result.facts = {.title = run.plan.title,
                  .node = run.node.name,
                  .node_title = run.node.title,
                  .drive = run.plan.drive,
                  .fanouts = run.plan.fanouts,
                  .accuracy = run.plan.accuracy,
                  .tolerance = run.plan.tolerance,
                  .tolerance_rules = run.plan.tolerance_rules,
                  .exemptions = run.plan.exemptions,
                  .program = {},
                  .simulator = simulator,
                  .started = {}};
  for (size_t i = 0; i < run.cells.size(); ++i) {
    result.cells.push_back(SummaryOf(run.cells[i], run.estimates[i]));
  }
  result.warnings = run.warnings;
  return result;
}

// The arcs of a corner that could not be calibrated.
void AddUnmeasured(const PreparedRun& run,
                   const Corner& corner,
                   const std::string& reason,
                   RunResult* result) {
  for (const CellEstimate& estimate : run.estimates) {
    for (const ArcEstimate& arc : estimate.arcs) {
      Comparison row;
      row.arc = arc.arc;
      row.corner = corner.name;
      row.estimate = arc.estimate;
      row.tolerance = AllowedFor(run.plan, arc.arc, corner.name);
      row.reason = reason;
      result->comparisons.push_back(row);
    }
  }
}

// Hands out the arcs of a run one cell after the other, so that the decks of a
// hundred thousand jobs never are there together, and keeps what they gave.
class ArcSweep {
 public:
  // Begins at the cell of arc number `first_arc`, and comes round.
  ArcSweep(const PreparedRun& run,
           const Benches& benches,
           const CalibrationSet& calibrated,
           const ArcContext& context,
           size_t first_arc)
      : run_(run),
        benches_(benches),
        calibrated_(calibrated),
        context_(context) {
    size_t arcs = 0;
    for (const auto& [name, calibration] : calibrated.by_corner) {
      for (size_t cell = 0; cell < run.cells.size(); ++cell) {
        if (arcs <= first_arc) {
          next_ = places_.size();
        }
        places_.push_back({&calibration, cell, arcs});
        arcs += run.estimates[cell].arcs.size();
      }
    }
    measured_.resize(arcs);
    progress().arcs = static_cast<int>(arcs);
  }

  // Asks for the arcs of one more cell; false when there is none.
  bool AskNext() {
    if (places_asked_ == places_.size()) {
      return false;
    }
    ++places_asked_;
    const Place& place = places_[next_];
    next_ = (next_ + 1) % places_.size();
    context_.bench = &benches_.at(place.calibration->corner.name);
    context_.calibration = place.calibration;
    size_t arc = place.first_arc;
    for (const StageTest& test :
         ArcTests(run_, place.cell, *place.calibration)) {
      MeasuredArc& measured = measured_[arc++];
      ++arcs_asked_;
      context_.tolerance =
          AllowedFor(run_.plan, test.arc, place.calibration->corner.name);
      MeasureArc(context_, test, [this, &measured](MeasuredArc ended) {
        measured = std::move(ended);
        ++progress().arcs_ended;
        Expect();
      });
    }
    return true;
  }

  // In the order of cells and their arcs.
  std::span<const MeasuredArc> At(const std::string& corner) const {
    const size_t per_corner = measured_.size() / calibrated_.by_corner.size();
    const auto place = std::distance(calibrated_.by_corner.begin(),
                                     calibrated_.by_corner.find(corner));
    return std::span(measured_).subspan(static_cast<size_t>(place) * per_corner,
                                        per_corner);
  }

 private:
  // A cell at a corner.
  struct Place {
    const Calibration* calibration;
    size_t cell;
    size_t first_arc;
  };

  RunProgress& progress() { return context_.desk->progress(); }

  // The arcs still to come will take as many jobs as those before.
  void Expect() {
    const double jobs_per_arc = static_cast<double>(progress().jobs.wanted) /
                                static_cast<double>(arcs_asked_);
    progress().expected_jobs = static_cast<int>(
        std::lround(jobs_per_arc * static_cast<double>(measured_.size())));
  }

  const PreparedRun& run_;
  const Benches& benches_;
  const CalibrationSet& calibrated_;
  ArcContext context_;
  std::vector<Place> places_;  // By corner, then cell.
  size_t next_ = 0;
  size_t places_asked_ = 0;
  size_t arcs_asked_ = 0;
  std::vector<MeasuredArc> measured_;
};

void AddCorner(const PreparedRun& run,
               const Calibration& calibration,
               std::span<const MeasuredArc> arcs,
               double delay_u_relative,
               RunResult* result) {
  result->calibrations.push_back(calibration);
  for (const MeasuredArc& arc : arcs) {
    result->comparisons.push_back(
        Compare(arc,
                calibration,
                AllowedFor(run.plan, arc.arc, calibration.corner.name),
                delay_u_relative));
  }
}

void AddAccuracy(const AccuracySample& sample, RunResult* result) {
  result->accuracy = sample.Check();
  if (!result->accuracy.met()) {
    result->warnings.push_back(fmt::format(
        "the accuracy of {:g} % of each delay was not met: {}",
        100.0 * result->accuracy.promised,
        result->accuracy.delays == 0
            ? "no delay could be checked"
            : fmt::format("settings one rung tighter move {} by {:.2f} %",
                          result->accuracy.worst,
                          100.0 * result->accuracy.largest)));
  }
}

}  // namespace

FanoutRule FanoutRuleOf(const Plan& plan) {
  return {.fixed = plan.fanouts,
          .delay_u_relative = plan.accuracy / std::numbers::sqrt3};
}

std::vector<StageTest> ArcTests(const PreparedRun& run,
                                size_t cell,
                                const Calibration& calibration) {
  std::vector<StageTest> tests;
  for (const ArcEstimate& arc : run.estimates[cell].arcs) {
    tests.push_back({.cell = &run.cells[cell],
                     .arc = arc.arc,
                     .estimate = arc.estimate,
                     .fanout = 1.0,
                     .drive = run.plan.drive,
                     .time_unit_s = std::max(calibration.tau_rise_s.value,
                                             calibration.tau_fall_s.value)});
  }
  return tests;
}

Result<RunResult> Characterize(const PreparedRun& run,
                               const std::string& simulator,
                               WorkDesk* desk,
                               size_t arcs_before) {
  const Result<Benches> benches = BenchesOf(run, simulator);
  if (!benches.ok()) {
    return Forward(benches);
  }
  const FanoutRule fanouts = FanoutRuleOf(run.plan);
  AccuracySample sample(run.plan.accuracy);
  const ArcContext context{
      .fanouts = &fanouts, .sample = &sample, .desk = desk};
  const auto references = MeasureReferences(run, *benches, context);
  if (!references.ok()) {
    return Forward(references);
  }
  const CalibrationSet preliminary =
      CalibrateCorners(run, *references, fanouts.delay_u_relative);
  ArcSweep sweep(run, *benches, preliminary, context, arcs_before);
  const Status done = desk->Work([&] { return sweep.AskNext(); });
  if (!done.ok()) {
    return Forward(done);
  }
  RunResult result = StartResult(run, simulator);
  const double delay_u_relative = sample.DelayUncertainty();
  const CalibrationSet calibrated =
      CalibrateCorners(run, *references, delay_u_relative);
  for (const Corner& corner : run.corners) {
    const auto calibration = calibrated.by_corner.find(corner.name);
    if (calibration == calibrated.by_corner.end()) {
      const std::string& reason = calibrated.failures.at(corner.name);
      AddUnmeasured(run, corner, reason, &result);
    } else {
      AddCorner(run,
                calibration->second,
                sweep.At(corner.name),
                delay_u_relative,
                &result);
    }
  }
  AddAccuracy(sample, &result);
  result.jobs = desk->progress().jobs;
  result.failed_jobs = desk->failed();
  return result;
}

}  // namespace gatedyno
