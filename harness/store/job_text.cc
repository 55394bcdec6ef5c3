#include "harness/store/job_text.h"

#include <nlohmann/json.hpp>

#include "harness/record/job_json.h"
#include "harness/record/run_progress_json.h"

namespace gatedyno {
namespace {

using nlohmann::json;

constexpr const char* kColumns[] = {"key", "label", "deck"};
// Of who asks, for that once: never kept.
constexpr const char* kWantsWaves = "wants_waves";
constexpr const char* kWaves = "waves";

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
  value.erase(kWantsWaves);
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
  json value = OutcomeToJson(outcome);
  value.erase(kWaves);
  return ToText(value);
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
