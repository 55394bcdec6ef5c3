#include "harness/store/job_text.h"

#include <nlohmann/json.hpp>

#include "harness/record/job_json.h"
#include "harness/record/run_progress_json.h"

namespace gatedyno {
namespace {

using nlohmann::json;

constexpr const char* kColumns[] = {"key", "label", "deck"};

std::string ToText(const json& value) {
  return value.dump(-1, ' ', false, json::error_handler_t::replace);
}

json FromText(const std::string& text) {
  return json::parse(text, nullptr, /*allow_exceptions=*/false);
}

}  // namespace

std::string MeasuresToText(const Job& job) {
  json value = JobToJson(job);
  for (const char* column : kColumns) {
    value.erase(column);
  }
  return ToText(value);
}

Result<Job> JobFromText(const Job& named, const std::string& measures) {
  json value = FromText(measures);
  const json names = JobToJson(named);
  for (const char* column : kColumns) {
    if (value.is_object()) {
      value[column] = names.at(column);
    }
  }
  return JobFromJson(value);
}

std::string OutcomeToText(const Outcome& outcome) {
  return ToText(OutcomeToJson(outcome));
}

Result<Outcome> OutcomeFromText(const std::string& text) {
  return OutcomeFromJson(FromText(text));
}

std::string ProgressToText(const RunProgress& progress) {
  return ToText(RunProgressToJson(progress));
}

Result<RunProgress> ProgressFromText(const std::string& text) {
  return RunProgressFromJson(FromText(text));
}

}  // namespace gatedyno
