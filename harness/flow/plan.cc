#include "harness/flow/plan.h"

#include <set>
#include <utility>

#include <fmt/format.h>

#include "harness/base/install.h"
#include "harness/flow/agreement.h"
#include "harness/node/json_file.h"
#include "harness/record/agreement_json.h"

namespace gatedyno {
namespace {

using nlohmann::json;

constexpr const char* kFormat = "gatedyno-plan/1";

}  // namespace

Result<Plan> LoadPlan(const std::filesystem::path& path) {
  const Result<json> file =
      ReadJsonFile(path, DecksFolder() / "plan.schema.json");
  if (!file.ok()) {
    return Forward(file);
  }
  const json& in = *file;
  Plan plan;
  plan.title = in.value("title", path.stem().string());
  plan.node = in["node"];
  plan.cells = in["cells"].get<std::vector<std::string>>();
  plan.corners = in.value("corners", plan.corners);
  plan.fanouts = in.value("fanouts", plan.fanouts);
  plan.accuracy = in.value("accuracy", plan.accuracy);
  plan.drive =
      in.value("drive", "matched") == "self" ? Drive::kSelf : Drive::kMatched;
  plan.all_side_vectors = in.value("side_vectors", "worst") == "all";
  const json tolerances = in.value("tolerances", json::object());
  plan.tolerance.effort = tolerances.value("effort", plan.tolerance.effort);
  plan.tolerance.parasitic =
      tolerances.value("parasitic", plan.tolerance.parasitic);
  plan.folder = path.parent_path();
  const Status agreed = ReadAgreement(in, path.string(), &plan);
  return agreed.ok() ? Result<Plan>(std::move(plan)) : Forward(agreed);
}

json PlanToJson(const Plan& plan) {
  json out = {{"format", kFormat},
              {"title", plan.title},
              {"node", plan.node},
              {"cells", plan.cells},
              {"accuracy", plan.accuracy},
              {"drive", DriveName(plan.drive)},
              {"side_vectors", plan.all_side_vectors ? "all" : "worst"},
              {"tolerances",
               {{"effort", plan.tolerance.effort},
                {"parasitic", plan.tolerance.parasitic}}}};
  if (!plan.corners.empty()) {
    out["corners"] = plan.corners;
  }
  if (!plan.fanouts.empty()) {
    out["fanouts"] = plan.fanouts;
  }
  if (!plan.tolerance_rules.empty()) {
    out["tolerances"]["rules"] = ToleranceRulesToJson(plan.tolerance_rules);
  }
  if (!plan.exemptions.empty()) {
    out["exemptions"] = ExemptionsToJson(plan.exemptions);
  }
  return out;
}

Status CheckAccuracy(double accuracy) {
  if (!(accuracy >= kFinestAccuracy && accuracy <= kCoarsestAccuracy)) {
    return BadInput(fmt::format("--accuracy: {}: must be {} to {}",
                                accuracy,
                                kFinestAccuracy,
                                kCoarsestAccuracy));
  }
  return Ok();
}

Status CheckFanouts(const std::vector<double>& fanouts) {
  constexpr double kLargest = 1000.0;
  for (const double fanout : fanouts) {
    if (!(fanout > 0.0 && fanout <= kLargest)) {
      return BadInput(fmt::format(
          "--fanouts: {}: must be above 0 and at most {}", fanout, kLargest));
    }
  }
  std::set<double> seen;
  for (const double fanout : fanouts) {
    if (!seen.insert(fanout).second) {
      return BadInput(fmt::format("--fanouts: {} is there twice", fanout));
    }
  }
  if (fanouts.size() < 2) {
    return BadInput(fmt::format(
        "--fanouts: a line needs two different ones, got {}", fanouts.size()));
  }
  return Ok();
}

}  // namespace gatedyno
