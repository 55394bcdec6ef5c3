#include "harness/sim/table_runner.h"

#include <utility>

#include <fmt/format.h>

namespace gatedyno {
namespace {

TableRunner::Answer FromTable(std::map<std::string, Outcome> by_label) {
  return [by_label = std::move(by_label)](const Job& job) {
    const auto found = by_label.find(job.label);
    if (found != by_label.end()) {
      return found->second;
    }
    Outcome missing;
    missing.message = fmt::format("{}: not in the table", job.label);
    return missing;
  };
}

}  // namespace

TableRunner::TableRunner(Answer answer) : answer_(std::move(answer)) {}

TableRunner::TableRunner(std::map<std::string, Outcome> by_label)
    : answer_(FromTable(std::move(by_label))) {}

Status TableRunner::Run(JobSource& jobs, const OnOutcome& on_outcome) {
  while (const std::optional<Job> job = jobs.Next()) {
    asked_.push_back(*job);
    Status kept = on_outcome(*job, answer_(*job));
    if (!kept.ok()) {
      return kept;
    }
  }
  return Ok();
}

Outcome MeasuredOutcome(std::map<std::string, double> values_s) {
  Outcome outcome;
  outcome.ending = Ending::kMeasured;
  outcome.values_s = std::move(values_s);
  return outcome;
}

}  // namespace gatedyno
