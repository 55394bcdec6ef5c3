#include "harness/flow/characterize.h"

#include <algorithm>
#include <map>

#include <fmt/format.h>

#include "harness/flow/calibrate.h"

namespace gatedyno {
namespace {

CellSummary SummaryOf(const CellEstimate& estimate) {
  CellSummary summary{.name = estimate.cell,
                      .functions = {},
                      .stages = estimate.stages,
                      .tallest_pull_down = 0,
                      .tallest_pull_up = 0};
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

RunResult StartResult(const PreparedRun& run, const std::string& simulator) {
  RunResult result;
  result.facts = {.title = run.plan.title,
                  .node = run.node.name,
                  .node_title = run.node.title,
                  .drive = run.plan.drive,
                  .fanouts = run.plan.fanouts,
                  .tolerance = run.plan.tolerance,
                  .program = {},
                  .simulator = simulator,
                  .started = {}};
  for (const CellEstimate& estimate : run.estimates) {
    result.cells.push_back(SummaryOf(estimate));
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
      row.tolerance = run.plan.tolerance;
      row.reason = reason;
      result->comparisons.push_back(row);
    }
  }
}

// By corner; corners without calibration are left out.
using CornerSweeps = std::map<std::string, std::vector<ArcSweep>>;

Result<CornerSweeps> PlanCorners(const PreparedRun& run,
                                 const CalibrationSet& calibrated,
                                 const std::string& simulator) {
  CornerSweeps sweeps;
  for (const auto& [name, calibration] : calibrated.by_corner) {
    Result<std::vector<ArcSweep>> planned =
        PlanArcs(run, calibration.corner, calibration, simulator);
    if (!planned.ok()) {
      return Forward(planned);
    }
    sweeps.emplace(name, *std::move(planned));
  }
  return sweeps;
}

std::vector<Job> JobsOf(const CornerSweeps& corners) {
  std::vector<Job> jobs;
  for (const auto& [name, sweeps] : corners) {
    for (const ArcSweep& sweep : sweeps) {
      jobs.insert(jobs.end(), sweep.jobs.begin(), sweep.jobs.end());
    }
  }
  return jobs;
}

}  // namespace

Result<std::vector<ArcSweep>> PlanArcs(const PreparedRun& run,
                                       const Corner& corner,
                                       const Calibration& calibration,
                                       const std::string& simulator) {
  const Result<Bench> bench = BenchAt(run, corner, simulator);
  if (!bench.ok()) {
    return Forward(bench);
  }
  std::vector<ArcSweep> sweeps;
  for (size_t i = 0; i < run.cells.size(); ++i) {
    for (const ArcEstimate& arc : run.estimates[i].arcs) {
      const StageTest test{
          .cell = &run.cells[i],
          .arc = arc.arc,
          .estimate = arc.estimate,
          .fanout = 1.0,
          .drive = run.plan.drive,
          .time_unit_s = std::max(calibration.tau_rise_s.value,
                                  calibration.tau_fall_s.value)};
      sweeps.push_back(PlanSweep(*bench, test, run.plan.fanouts));
    }
  }
  return sweeps;
}

Result<RunResult> Characterize(const PreparedRun& run,
                               const std::string& simulator,
                               OutcomeBook* book) {
  const Result<CalibrationSet> calibrated =
      CalibrateCorners(run, simulator, book);
  if (!calibrated.ok()) {
    return Forward(calibrated);
  }
  const Result<CornerSweeps> sweeps = PlanCorners(run, *calibrated, simulator);
  if (!sweeps.ok()) {
    return Forward(sweeps);
  }
  const Status finished = book->Finish(JobsOf(*sweeps));
  if (!finished.ok()) {
    return Forward(finished);
  }
  RunResult result = StartResult(run, simulator);
  for (const Corner& corner : run.corners) {
    const auto calibration = calibrated->by_corner.find(corner.name);
    if (calibration == calibrated->by_corner.end()) {
      const std::string& reason = calibrated->failures.at(corner.name);
      AddUnmeasured(run, corner, reason, &result);
      continue;
    }
    result.calibrations.push_back(calibration->second);
    for (const ArcSweep& sweep : sweeps->at(corner.name)) {
      result.comparisons.push_back(Compare(
          CollectSweep(sweep, *book), calibration->second, run.plan.tolerance));
    }
  }
  result.jobs = book->counts();
  result.failed_jobs = book->failed();
  return result;
}

}  // namespace gatedyno
