#include "harness/report/versus_json.h"

#include <cmath>
#include <optional>
#include <vector>

#include <nlohmann/json.hpp>

#include "harness/record/comparison_json.h"
#include "harness/report/versus_text.h"

namespace gatedyno {
namespace {

using nlohmann::json;

json Write(std::optional<double> number) {
  return number && std::isfinite(*number) ? json(*number) : json(nullptr);
}

json SideJson(const VersusSide& side) {
  const RunFacts& facts = side.result.facts;
  return {{"store", side.source.store},
          {"run", side.source.run},
          {"title", facts.title},
          {"node", facts.node},
          {"started", facts.started},
          {"simulator", facts.simulator},
          {"program", facts.program},
          {"accuracy", Write(facts.accuracy)}};
}

json CalibrationJson(const std::string& corner, const RunResult& result) {
  const Calibration* calibration = CalibrationAt(corner, result);
  return calibration != nullptr ? CalibrationToJson(*calibration)
                                : json(nullptr);
}

json SpreadJson(const Versus& versus, RelativeChange change) {
  const Spread spread = SpreadOf(versus, AllPlaces(versus), change);
  return {{"count", spread.count},
          {"mean", spread.count > 0 ? Write(spread.mean) : json(nullptr)},
          {"deviation", Write(spread.deviation)},
          {"within_10_percent", CountWithin(versus, change, kAgreement)}};
}

// What one side says of an arc, in the words of its own report.
json RowJson(const json& row, const Comparison& comparison) {
  return {{"effort", row.at("effort")},
          {"parasitic", row.at("parasitic")},
          {"effort_by_hand", Write(comparison.estimate.effort)},
          {"parasitic_by_hand", Write(comparison.hand_parasitic)},
          {"bent", comparison.bent},
          {"verdict", VerdictName(comparison.verdict)},
          {"reason", comparison.reason}};
}

json ChangeJson(const std::optional<Change>& change) {
  return change ? json{{"relative", Write(change->relative)},
                       {"expanded", Write(change->expanded)}}
                : json(nullptr);
}

json PairJson(const ArcPair& pair) {
  const json a = ComparisonToJson(*pair.a);
  const json b = ComparisonToJson(*pair.b);
  return {{"arc", a.at("arc")},
          {"corner_a", pair.a->corner},
          {"corner_b", pair.b->corner},
          {"finding", FindingName(pair.finding)},
          {"a", RowJson(a, *pair.a)},
          {"b", RowJson(b, *pair.b)},
          {"effort_change", ChangeJson(pair.effort)},
          {"parasitic_change", ChangeJson(pair.parasitic)}};
}

json OnlyJson(const std::vector<const Comparison*>& rows) {
  json list = json::array();
  for (const Comparison* row : rows) {
    list.push_back(
        {{"arc", ComparisonToJson(*row).at("arc")}, {"corner", row->corner}});
  }
  return list;
}

}  // namespace

std::string VersusJson(const VersusView& view) {
  constexpr int kIndent = 1;
  const Versus& versus = view.versus;
  json corners = json::array();
  for (const CornerPair& pair : versus.corners) {
    corners.push_back({{"a", CalibrationJson(pair.a, view.a.result)},
                       {"b", CalibrationJson(pair.b, view.b.result)}});
  }
  json arcs = json::array();
  for (const ArcPair& pair : versus.arcs) {
    arcs.push_back(PairJson(pair));
  }
  const json all = {
      {"format", "gatedyno-versus/1"},
      {"a", SideJson(view.a)},
      {"b", SideJson(view.b)},
      {"corners", std::move(corners)},
      {"spread",
       {{"g", SpreadJson(versus, EffortChange)},
        {"p", SpreadJson(versus, ParasiticChange)},
        {"p_in_p_inv", SpreadJson(versus, ParasiticInPInvChange)}}},
      {"arcs", std::move(arcs)},
      {"only_a", OnlyJson(versus.only_a)},
      {"only_b", OnlyJson(versus.only_b)}};
  return all.dump(kIndent, ' ', false, json::error_handler_t::replace) + '\n';
}

}  // namespace gatedyno
