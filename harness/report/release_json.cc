#include "harness/report/release_json.h"

#include <cmath>
#include <cstddef>
#include <utility>

#include <nlohmann/json.hpp>

#include "harness/record/agreement_json.h"
#include "harness/record/comparison_json.h"

namespace gatedyno {
namespace {

using nlohmann::json;

json OrNull(const std::optional<double>& number) {
  return number && std::isfinite(*number) ? json(*number) : json(nullptr);
}

json OrNull(const std::optional<size_t>& place) {
  return place ? json(*place) : json(nullptr);
}

json ArcOf(const Comparison& row) {
  return {{"arc", ComparisonToJson(row).at("arc")}, {"corner", row.corner}};
}

json TroubleToJson(const Comparison& row, const Trouble& trouble) {
  json out = ArcOf(row);
  out["kind"] = TroubleKindName(trouble.kind);
  out["quantity"] =
      trouble.quantity ? json(QuantityName(*trouble.quantity)) : json(nullptr);
  out["text"] = trouble.text;
  return out;
}

json Reasons(const ReleaseDecision& decision) {
  json list = json::array();
  for (const Obstacle& obstacle : decision.obstacles) {
    list.push_back(TroubleToJson(*obstacle.row, obstacle.trouble));
    list.back()["expired_exemption"] = OrNull(obstacle.expired);
  }
  return list;
}

json Excused(const ReleaseDecision& decision) {
  json list = json::array();
  for (const ExcusedTrouble& excused : decision.excused) {
    list.push_back(TroubleToJson(*excused.row, excused.trouble));
    list.back()["exemption"] = excused.exemption;
  }
  return list;
}

json Exemptions(const ReleaseReport& report) {
  json list = ExemptionsToJson(report.result.facts.exemptions);
  for (size_t i = 0; i < list.size(); ++i) {
    const ExemptionUse& use = report.decision.exemptions[i];
    list[i]["state"] = ExemptionStateName(use.state);
    list[i]["arcs"] = use.arcs;
    list[i]["arcs_in_need"] = use.in_need;
  }
  return list;
}

json Counts(const ReleaseReport& report) {
  const Summary& counts = report.decision.counts;
  return {{"all", report.result.comparisons.size()},
          {"within", counts.within},
          {"beyond", counts.beyond},
          {"not_measured", counts.not_measured},
          {"bent", counts.bent}};
}

json ChangeToJson(const std::optional<Change>& change) {
  if (!change) {
    return nullptr;
  }
  const auto measured = [](const Measured& m) {
    return json{{"value", m.value}, {"u", OrNull(m.u)}};
  };
  return {{"before", measured(change->before)},
          {"after", measured(change->after)},
          {"relative", change->relative},
          {"expanded", OrNull(change->expanded)}};
}

json BaselineToJson(const ReleaseBaseline& baseline) {
  json moved = json::array();
  for (const ArcPair* pair : MovedArcs(baseline)) {
    json out = ArcOf(*pair->b);
    out["finding"] = FindingName(pair->finding);
    out["verdict_before"] = VerdictName(pair->a->verdict);
    out["verdict"] = VerdictName(pair->b->verdict);
    out["effort"] = ChangeToJson(pair->effort);
    out["parasitic"] = ChangeToJson(pair->parasitic);
    moved.push_back(std::move(out));
  }
  return {{"store", baseline.source.store},
          {"run", baseline.source.run},
          {"arcs", baseline.versus.arcs.size()},
          {"only_before", baseline.versus.only_a.size()},
          {"only_now", baseline.versus.only_b.size()},
          {"moved", std::move(moved)}};
}

}  // namespace

std::string ReleaseJson(const ReleaseReport& report) {
  const RunFacts& facts = report.result.facts;
  const json out = {
      {"format", "gatedyno-release/1"},
      {"decision", report.decision.yes() ? "yes" : "no"},
      {"date", report.today},
      {"plan", report.plan},
      {"store", report.store},
      {"title", facts.title},
      {"node", facts.node},
      {"simulator", facts.simulator},
      {"program", facts.program},
      {"tolerances",
       {{"effort", facts.tolerance.effort},
        {"parasitic", facts.tolerance.parasitic},
        {"rules", ToleranceRulesToJson(facts.tolerance_rules)}}},
      {"arcs", Counts(report)},
      {"missing_jobs", report.missing_jobs},
      {"reasons_of_the_run", report.decision.of_the_run},
      {"reasons", Reasons(report.decision)},
      {"excused", Excused(report.decision)},
      {"exemptions", Exemptions(report)},
      {"baseline",
       report.baseline ? BaselineToJson(*report.baseline) : json(nullptr)}};
  constexpr int kIndent = 1;
  return out.dump(kIndent, ' ', false, json::error_handler_t::replace) + '\n';
}

}  // namespace gatedyno
