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
NLOHMANN_DEFINE_TYPE_NON_INTRUSIVE(Waveform, net, time_s, voltage_v)
NLOHMANN_DEFINE_TYPE_NON_INTRUSIVE(TimedInterval, name, from_s, to_s)
NLOHMANN_DEFINE_TYPE_NON_INTRUSIVE(Waves, waveforms, intervals)
NLOHMANN_DEFINE_TYPE_NON_INTRUSIVE(
    Job, key, label, deck, settings, intervals, swings, stop_s, time_limit_s)
NLOHMANN_DEFINE_TYPE_NON_INTRUSIVE(
    Outcome, ending, values_s, message, simulator_s, rung)

namespace {

// Fields that are there only for who asks for waves.
constexpr const char* kWantsWaves = "wants_waves";
constexpr const char* kWaves = "waves";

// A missing, mistyped or unknown field is reported by exception only.
template <class T, class Rest>
Result<T> Read(const nlohmann::json& json, const char* what, const Rest& rest) {
  try {
    T read = json.get<T>();
    rest(read);
    return read;
  } catch (const std::exception& thrown) {
    return Internal(fmt::format("not a {}: {}", what, thrown.what()));
  }
}

}  // namespace

nlohmann::json JobToJson(const Job& job) {
  nlohmann::json json = job;
  if (job.wants_waves) {
    json[kWantsWaves] = true;
  }
  return json;
}

Result<Job> JobFromJson(const nlohmann::json& json) {
  return Read<Job>(json, "job", [&json](Job& job) {
    job.wants_waves = json.value(kWantsWaves, false);
  });
}

nlohmann::json OutcomeToJson(const Outcome& outcome) {
  nlohmann::json json = outcome;
  if (outcome.waves) {
    json[kWaves] = *outcome.waves;
  }
  return json;
}

Result<Outcome> OutcomeFromJson(const nlohmann::json& json) {
  return Read<Outcome>(json, "job's outcome", [&json](Outcome& outcome) {
    if (json.contains(kWaves)) {
      outcome.waves = json.at(kWaves).get<Waves>();
    }
  });
}

}  // namespace gatedyno
