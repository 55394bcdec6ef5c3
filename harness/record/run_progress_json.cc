#include "harness/record/run_progress_json.h"

#include <fmt/format.h>

namespace gatedyno {

NLOHMANN_DEFINE_TYPE_NON_INTRUSIVE(JobCounts, wanted, reused, simulated, failed)
NLOHMANN_DEFINE_TYPE_NON_INTRUSIVE(
    RunProgress, jobs, expected_jobs, arcs_ended, arcs, current)

nlohmann::json RunProgressToJson(const RunProgress& progress) {
  return progress;
}

Result<RunProgress> RunProgressFromJson(const nlohmann::json& json) {
  try {
    return json.get<RunProgress>();
  } catch (const nlohmann::json::exception& thrown) {
    return Internal(fmt::format("not a run's progress: {}", thrown.what()));
  }
}

}  // namespace gatedyno
