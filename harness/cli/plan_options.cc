#include "harness/cli/plan_options.h"

#include <filesystem>

#include <fmt/format.h>

#include "harness/cli/value_kind.h"

namespace gatedyno {
namespace {

constexpr const char* kDefaultNode = "p45";

bool IsPlanFile(const std::string& name) {
  return std::filesystem::path(name).extension() == ".json";
}

Result<Plan> BasePlan(const PlanOptions& options) {
  if (options.what.size() == 1 && IsPlanFile(options.what.front())) {
    return LoadPlan(options.what.front());
  }
  for (const std::string& name : options.what) {
    if (IsPlanFile(name)) {
      return BadInput(fmt::format(
          "{}: a plan stands alone, without cells or other plans", name));
    }
  }
  Plan plan;
  plan.node = kDefaultNode;
  plan.cells = options.what;
  return plan;
}

Status CheckTolerance(const char* option, std::optional<double> value) {
  if (value && !(*value > 0.0)) {
    return BadInput(fmt::format("{}: {}: must be above 0", option, *value));
  }
  return Ok();
}

}  // namespace

void AddPlanOptions(CLI::App& app, PlanOptions& options) {
  app.add_option("plan-or-cells",
                 options.what,
                 "PLAN.json, or cells: netlist files, or built-in cells by "
                 "name (* and ? allowed)")
      ->type_name(kPlanOrCell)
      ->required();
  app.add_option("--node",
                 options.node,
                 "built-in node or a node file (default: p45, or the plan's)")
      ->type_name(kNode);
  app.add_option("--corner",
                 options.corners,
                 "corner of the node by name (* and ? allowed), repeatable "
                 "(default: its first)")
      ->type_name(kCorner)
      ->allow_extra_args(false);
  app.add_option("--fanouts",
                 options.fanouts,
                 "for example 1,2,3,4,6 (default: as few as each arc needs)")
      ->delimiter(',');
  app.add_option("--accuracy",
                 options.accuracy,
                 "largest numerical error of a delay, relative (default: "
                 "0.002)");
  app.add_option("--drive", options.drive, "what drives the cell under test")
      ->check(CLI::IsMember({"matched", "self"}));
  app.add_flag("--all-side-vectors",
               options.all_side_vectors,
               "measure every side vector, not only the worst by hand numbers");
  app.add_option("--allow-g",
                 options.effort_tolerance,
                 "allowed difference of g, relative: 0.25; rules of the plan "
                 "keep theirs");
  app.add_option("--allow-p",
                 options.parasitic_tolerance,
                 "allowed difference of p, relative: 0.35; rules of the plan "
                 "keep theirs");
}

Result<Plan> PlanOf(const PlanOptions& options) {
  Result<Plan> plan = BasePlan(options);
  if (!plan.ok()) {
    return plan;
  }
  for (const Status& check :
       {options.fanouts.empty() ? Ok() : CheckFanouts(options.fanouts),
        options.accuracy ? CheckAccuracy(*options.accuracy) : Ok(),
        CheckTolerance("--allow-g", options.effort_tolerance),
        CheckTolerance("--allow-p", options.parasitic_tolerance)}) {
    if (!check.ok()) {
      return Forward(check);
    }
  }
  plan->node = options.node.value_or(plan->node);
  plan->corners = options.corners.empty() ? plan->corners : options.corners;
  plan->fanouts = options.fanouts.empty() ? plan->fanouts : options.fanouts;
  plan->accuracy = options.accuracy.value_or(plan->accuracy);
  if (options.drive) {
    plan->drive = *options.drive == "self" ? Drive::kSelf : Drive::kMatched;
  }
  plan->all_side_vectors |= options.all_side_vectors;
  plan->tolerance.effort =
      options.effort_tolerance.value_or(plan->tolerance.effort);
  plan->tolerance.parasitic =
      options.parasitic_tolerance.value_or(plan->tolerance.parasitic);
  if (plan->title.empty()) {
    plan->title = fmt::format("cells on {}", plan->node);
  }
  return plan;
}

}  // namespace gatedyno
