#include "harness/record/job_json.h"

#include <fmt/format.h>

namespace gatedyno {

NLOHMANN_JSON_SERIALIZE_ENUM(Edge,
                             {{Edge::kRise, "rise"}, {Edge::kFall, "fall"}})
NLOHMANN_JSON_SERIALIZE_ENUM(Ending,
                             {{Ending::kMeasured, "measured"},
                              {Ending::kFailed, "failed"},
                              {Ending::kTimedOut, "timed out"},
                              {Ending::kCrashed, "crashed"}})
NLOHMANN_DEFINE_TYPE_NON_INTRUSIVE(Crossing, net, level_v, edge, occurrence)
NLOHMANN_DEFINE_TYPE_NON_INTRUSIVE(Interval, name, from, to)
NLOHMANN_DEFINE_TYPE_NON_INTRUSIVE(SwingCheck, net, low_v, high_v)
NLOHMANN_DEFINE_TYPE_NON_INTRUSIVE(
    Job, key, label, deck, intervals, swings, stop_s, time_limit_s)
NLOHMANN_DEFINE_TYPE_NON_INTRUSIVE(
    Outcome, ending, values_s, message, simulator_s)

namespace {

// nlohmann_json reports a missing or mistyped field by exception only.
template <class T>
Result<T> Read(const nlohmann::json& json, const char* what) {
  try {
    return json.get<T>();
  } catch (const nlohmann::json::exception& thrown) {
    return Internal(fmt::format("not a {}: {}", what, thrown.what()));
  }
}

}  // namespace

nlohmann::json JobToJson(const Job& job) {
  return job;
}

Result<Job> JobFromJson(const nlohmann::json& json) {
  return Read<Job>(json, "job");
}

nlohmann::json OutcomeToJson(const Outcome& outcome) {
  return outcome;
}

Result<Outcome> OutcomeFromJson(const nlohmann::json& json) {
  return Read<Outcome>(json, "job's outcome");
}

}  // namespace gatedyno
