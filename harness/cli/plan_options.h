// The options that say what to characterize, shared by the commands that do:
// a plan file, or cells and a node; options override what the plan says.

#ifndef GATEDYNO_CLI_PLAN_OPTIONS_H_
#define GATEDYNO_CLI_PLAN_OPTIONS_H_

#include <optional>
#include <string>
#include <vector>

#include <CLI/CLI.hpp>

#include "harness/base/result.h"
#include "harness/flow/plan.h"

namespace gatedyno {

struct PlanOptions {
  std::vector<std::string> what;  // One PLAN.json, or cells.
  std::optional<std::string> node;
  std::vector<std::string> corners;
  std::vector<double> fanouts;
  std::optional<double> accuracy;
  std::optional<std::string> drive;
  bool all_side_vectors = false;
  std::optional<double> effort_tolerance;
  std::optional<double> parasitic_tolerance;
};

// `options` outlives the parse.
void AddPlanOptions(CLI::App& app, PlanOptions& options);

Result<Plan> PlanOf(const PlanOptions& options);

}  // namespace gatedyno

#endif  // GATEDYNO_CLI_PLAN_OPTIONS_H_
