#include "harness/record/run_result_json.h"

#include <cstddef>
#include <exception>
#include <stdexcept>
#include <utility>
#include <vector>

#include <fmt/format.h>

#include "harness/record/agreement_json.h"
#include "harness/record/circuit_json.h"
#include "harness/record/comparison_json.h"

namespace gatedyno {
namespace {

using nlohmann::json;

constexpr const char* kFormat = "gatedyno-result/1";

json FactsToJson(const RunFacts& facts) {
  return {{"title", facts.title},
          {"node", facts.node},
          {"node_title", facts.node_title},
          {"drive", DriveName(facts.drive)},
          {"fanouts", facts.fanouts},
          {"accuracy", facts.accuracy},
          {"tolerances",
           {{"effort", facts.tolerance.effort},
            {"parasitic", facts.tolerance.parasitic},
            {"rules", ToleranceRulesToJson(facts.tolerance_rules)}}},
          {"exemptions", ExemptionsToJson(facts.exemptions)},
          {"program", facts.program},
          {"simulator", facts.simulator},
          {"started", facts.started}};
}

json CellToJson(const CellSummary& cell) {
  return {{"name", cell.name},
          {"functions", cell.functions},
          {"stages", cell.stages},
          {"tallest_pull_down", cell.tallest_pull_down},
          {"tallest_pull_up", cell.tallest_pull_up},
          {"circuit", CircuitToJson(cell.circuit)}};
}

json FailedJobToJson(const FailedJob& job) {
  return {{"key", job.key}, {"label", job.label}, {"message", job.message}};
}

json AccuracyToJson(const AccuracyCheck& check) {
  return {{"promised", check.promised},
          {"delays", check.delays},
          {"rms", check.rms},
          {"largest", check.largest},
          {"worst", check.worst},
          {"met", check.met()}};
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

// Every Read... below throws what nlohmann_json throws, or std::runtime_error.

Drive ReadDrive(const json& from) {
  const std::string name = from.get<std::string>();
  for (const Drive drive : {Drive::kMatched, Drive::kSelf}) {
    if (name == DriveName(drive)) {
      return drive;
    }
  }
  throw std::runtime_error(fmt::format("unknown drive '{}'", name));
}

RunFacts ReadFacts(const json& from) {
  RunFacts facts;
  from.at("title").get_to(facts.title);
  from.at("node").get_to(facts.node);
  from.at("node_title").get_to(facts.node_title);
  facts.drive = ReadDrive(from.at("drive"));
  from.at("fanouts").get_to(facts.fanouts);
  from.at("accuracy").get_to(facts.accuracy);
  from.at("tolerances").at("effort").get_to(facts.tolerance.effort);
  from.at("tolerances").at("parasitic").get_to(facts.tolerance.parasitic);
  // Not there in a result of gatedyno 0.1.
  if (const json& allowed = from.at("tolerances"); allowed.contains("rules")) {
    facts.tolerance_rules = ReadToleranceRules(allowed.at("rules"));
  }
  if (from.contains("exemptions")) {
    facts.exemptions = ReadExemptions(from.at("exemptions"));
  }
  from.at("program").get_to(facts.program);
  from.at("simulator").get_to(facts.simulator);
  from.at("started").get_to(facts.started);
  return facts;
}

CellSummary ReadCell(const json& from) {
  CellSummary cell;
  from.at("name").get_to(cell.name);
  from.at("functions").get_to(cell.functions);
  from.at("stages").get_to(cell.stages);
  from.at("tallest_pull_down").get_to(cell.tallest_pull_down);
  from.at("tallest_pull_up").get_to(cell.tallest_pull_up);
  if (from.contains("circuit")) {
    cell.circuit = ReadCircuit(from.at("circuit"));
  }
  return cell;
}

FailedJob ReadFailedJob(const json& from) {
  FailedJob job;
  from.at("key").get_to(job.key);
  from.at("label").get_to(job.label);
  from.at("message").get_to(job.message);
  return job;
}

AccuracyCheck ReadAccuracy(const json& from) {
  AccuracyCheck check;
  from.at("promised").get_to(check.promised);
  from.at("delays").get_to(check.delays);
  from.at("rms").get_to(check.rms);
  from.at("largest").get_to(check.largest);
  from.at("worst").get_to(check.worst);
  return check;
}

JobCounts ReadCounts(const json& from) {
  JobCounts jobs;
  from.at("wanted").get_to(jobs.wanted);
  from.at("reused").get_to(jobs.reused);
  from.at("simulated").get_to(jobs.simulated);
  from.at("failed").get_to(jobs.failed);
  return jobs;
}

template <class T>
T Taken(Result<T> result) {
  if (!result.ok()) {
    throw std::runtime_error(result.error().message);
  }
  return *std::move(result);
}

// All but the comparisons.
RunResult ReadHead(const json& from) {
  RunResult result;
  result.facts = ReadFacts(from.at("facts"));
  for (const json& cell : from.at("cells")) {
    result.cells.push_back(ReadCell(cell));
  }
  for (const json& calibration : from.at("calibrations")) {
    result.calibrations.push_back(Taken(CalibrationFromJson(calibration)));
  }
  for (const json& job : from.at("failed_jobs")) {
    result.failed_jobs.push_back(ReadFailedJob(job));
  }
  from.at("warnings").get_to(result.warnings);
  result.accuracy = ReadAccuracy(from.at("accuracy"));
  result.jobs = ReadCounts(from.at("jobs"));
  return result;
}

Status CheckFormat(const json& from) {
  const json* format = from.is_object() && from.contains("format")
                           ? &from.at("format")
                           : nullptr;
  if (format == nullptr || *format != kFormat) {
    return BadInput(fmt::format(
        "not a run's result: its format is {}, and has to be \"{}\"",
        format == nullptr
            ? "not said"
            : format->dump(-1, ' ', false, json::error_handler_t::replace),
        kFormat));
  }
  return Ok();
}

void ReadComparisons(const json& list, RunResult* result) {
  for (size_t i = 0; i < list.size(); ++i) {
    Result<Comparison> row = ComparisonFromJson(list.at(i));
    if (!row.ok()) {
      throw std::runtime_error(
          fmt::format("row {}: {}", i + 1, row.error().message));
    }
    result->comparisons.push_back(*std::move(row));
  }
}

template <class Read>
Result<RunResult> Caught(const Read& read) {
  try {
    return read();
  } catch (const std::exception& thrown) {
    return Internal(fmt::format("not a run's result: {}", thrown.what()));
  }
}

}  // namespace

json RunResultToJson(const RunResult& result) {
  json out = RunHeadToJson(result);
  out["comparisons"] = ListToJson(result.comparisons, &ComparisonToJson);
  return out;
}

json RunHeadToJson(const RunResult& result) {
  return {{"format", kFormat},
          {"facts", FactsToJson(result.facts)},
          {"cells", ListToJson(result.cells, &CellToJson)},
          {"calibrations", ListToJson(result.calibrations, &CalibrationToJson)},
          {"failed_jobs", ListToJson(result.failed_jobs, &FailedJobToJson)},
          {"warnings", result.warnings},
          {"accuracy", AccuracyToJson(result.accuracy)},
          {"jobs", CountsToJson(result.jobs)}};
}

Result<RunResult> RunResultFromJson(const json& json) {
  const Status known = CheckFormat(json);
  if (!known.ok()) {
    return Forward(known);
  }
  return Caught([&] {
    RunResult result = ReadHead(json);
    ReadComparisons(json.at("comparisons"), &result);
    return result;
  });
}

Result<RunResult> RunResultFromTexts(const std::string& head,
                                     std::span<const std::string> rows) {
  return Caught([&]() -> Result<RunResult> {
    json whole = json::parse(head);
    if (whole.is_object()) {
      json& list = whole["comparisons"];
      for (const std::string& row : rows) {
        list.push_back(json::parse(row));
      }
      if (list.is_null()) {
        list = json::array();
      }
    }
    return RunResultFromJson(whole);
  });
}

}  // namespace gatedyno
