#include "harness/record/job_json.h"

#include <stdexcept>
#include <string>

#include <fmt/format.h>

namespace gatedyno {

namespace {

// The library's own enum macro reads an unknown word as the first value: a
// reply of another build would end as measured.
template <class Enum, size_t kCount, class Name>
Enum Named(const nlohmann::json& json,
           const Enum (&values)[kCount],
           const Name& name) {
  const auto& word = json.get_ref<const std::string&>();
  for (const Enum value : values) {
    if (name(value) == word) {
      return value;
    }
  }
  throw std::invalid_argument(fmt::format("'{}' is none of its words", word));
}

}  // namespace

static void to_json(nlohmann::json& json, Edge edge) {
  json = EdgeName(edge);
}
static void from_json(const nlohmann::json& json, Edge& edge) {
  edge = Named(json, {Edge::kRise, Edge::kFall}, EdgeName);
}
static void to_json(nlohmann::json& json, Ending ending) {
  json = EndingName(ending);
}
static void from_json(const nlohmann::json& json, Ending& ending) {
  ending = Named(
      json,
      {Ending::kMeasured, Ending::kFailed, Ending::kTimedOut, Ending::kCrashed},
      EndingName);
}
NLOHMANN_DEFINE_TYPE_NON_INTRUSIVE(Crossing, net, level_v, edge, occurrence)
NLOHMANN_DEFINE_TYPE_NON_INTRUSIVE(Interval, name, from, to)
NLOHMANN_DEFINE_TYPE_NON_INTRUSIVE(SwingCheck, net, low_v, high_v)
NLOHMANN_DEFINE_TYPE_NON_INTRUSIVE(
    Job, key, label, deck, settings, intervals, swings, stop_s, time_limit_s)
NLOHMANN_DEFINE_TYPE_NON_INTRUSIVE(
    Outcome, ending, values_s, message, simulator_s, rung)

namespace {

// A missing, mistyped or unknown field is reported by exception only.
template <class T>
Result<T> Read(const nlohmann::json& json, const char* what) {
  try {
    return json.get<T>();
  } catch (const std::exception& thrown) {
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
