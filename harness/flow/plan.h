// A plan: node, cells, corners, fanouts, drive and tolerances.

#ifndef GATEDYNO_FLOW_PLAN_H_
#define GATEDYNO_FLOW_PLAN_H_

#include <filesystem>
#include <optional>
#include <string>
#include <vector>

#include <nlohmann/json.hpp>

#include "harness/base/result.h"
#include "harness/deck/sim_settings.h"
#include "harness/record/comparison.h"
#include "harness/record/exemption.h"

namespace gatedyno {

struct Plan {
  std::string title;
  std::string node;                    // Name, or path from `folder`.
  std::vector<std::string> cells;      // Names with * and ?, or paths.
  std::vector<std::string> corners;    // Empty: the node's first.
  std::vector<double> fanouts;         // Empty: as few as each arc needs.
  double accuracy = kDefaultAccuracy;  // Largest error of a delay, relative.
  Drive drive = Drive::kMatched;
  bool all_side_vectors = false;
  Tolerance tolerance;
  std::vector<ToleranceRule> tolerance_rules;
  std::vector<Exemption> exemptions;
  // Wall clock for one job, in place of an estimate.  Not part of a plan file:
  // it changes no number.
  std::optional<double> time_limit_s;
  // What relative paths start from: the plan file's folder.
  std::filesystem::path folder;
};

// Fails with the JSON pointer of what is wrong.
Result<Plan> LoadPlan(const std::filesystem::path& path);

// As a plan file would say it; what the store keeps of a run.  Rules and
// exemptions are in it only where there are some: a run of a plan without goes
// on with what an older gatedyno began.
nlohmann::json PlanToJson(const Plan& plan);

// Refuses what the schema refuses, for a plan made from command-line options:
// "--fanouts: ...".
Status CheckFanouts(const std::vector<double>& fanouts);
Status CheckAccuracy(double accuracy);

}  // namespace gatedyno

#endif  // GATEDYNO_FLOW_PLAN_H_
