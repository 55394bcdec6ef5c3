#include "harness/record/run_result_json.h"

#include "harness/record/comparison_json.h"

namespace gatedyno {
namespace {

using nlohmann::json;

json FactsToJson(const RunFacts& facts) {
  return {{"title", facts.title},
          {"node", facts.node},
          {"node_title", facts.node_title},
          {"drive", DriveName(facts.drive)},
          {"fanouts", facts.fanouts},
          {"tolerances",
           {{"effort", facts.tolerance.effort},
            {"parasitic", facts.tolerance.parasitic}}},
          {"program", facts.program},
          {"simulator", facts.simulator},
          {"started", facts.started}};
}

json CellToJson(const CellSummary& cell) {
  return {{"name", cell.name},
          {"functions", cell.functions},
          {"stages", cell.stages},
          {"tallest_pull_down", cell.tallest_pull_down},
          {"tallest_pull_up", cell.tallest_pull_up}};
}

json FailedJobToJson(const FailedJob& job) {
  return {{"key", job.key}, {"label", job.label}, {"message", job.message}};
}

json CountsToJson(const JobCounts& jobs) {
  return {{"wanted", jobs.wanted},
          {"reused", jobs.reused},
          {"simulated", jobs.simulated},
          {"failed", jobs.failed}};
}

template <class T>
json ListToJson(const std::vector<T>& items, json (*to_json)(const T&)) {
  json list = json::array();
  for (const T& item : items) {
    list.push_back(to_json(item));
  }
  return list;
}

}  // namespace

json RunResultToJson(const RunResult& result) {
  return {{"format", "gatedyno-result/1"},
          {"facts", FactsToJson(result.facts)},
          {"cells", ListToJson(result.cells, &CellToJson)},
          {"calibrations", ListToJson(result.calibrations, &CalibrationToJson)},
          {"comparisons", ListToJson(result.comparisons, &ComparisonToJson)},
          {"failed_jobs", ListToJson(result.failed_jobs, &FailedJobToJson)},
          {"warnings", result.warnings},
          {"jobs", CountsToJson(result.jobs)}};
}

}  // namespace gatedyno
