#include "harness/page/versus_data.h"

#include <cstddef>
#include <utility>
#include <vector>

#include "harness/page/data_json.h"
#include "harness/report/versus_text.h"

namespace gatedyno {
namespace {

using nlohmann::json;

json FigureData(const ArcPair& pair, Quantity quantity) {
  const auto value = [quantity](const Comparison& row) {
    return !row.line ? json(nullptr)
                     : ShortNumber(quantity == Quantity::kEffort
                                       ? row.effort.value
                                       : row.parasitic.value);
  };
  const std::optional<Change>& change = ChangeIn(pair, quantity);
  return {value(*pair.a),
          value(*pair.b),
          change ? ShortNumber(change->relative) : json(nullptr),
          change ? ShortNumber(change->expanded) : json(nullptr)};
}

json ArcData(const ArcPair& pair) {
  return {{"n", DescribeArc(pair.a->arc)},
          {"e", EdgeName(pair.a->arc.edge)},
          {"f", FindingName(pair.finding)},
          {"d", pair.verdicts_differ()},
          {"g", FigureData(pair, Quantity::kEffort)},
          {"p", FigureData(pair, Quantity::kParasitic)}};
}

}  // namespace

std::string VersusData(const VersusView& view) {
  NamePlaces cells;
  NamePlaces corners;
  json arcs = json::array();
  for (const ArcPair& pair : view.versus.arcs) {
    json arc = ArcData(pair);
    arc["c"] = cells.Of(pair.a->arc.cell);
    arc["k"] = corners.Of(CornerPairName({pair.a->corner, pair.b->corner}));
    arcs.push_back(std::move(arc));
  }
  json outputs = json::array();
  for (const ArcGroup& group : GroupByStack(view.versus, view.a.result)) {
    for (const std::size_t place : group.places) {
      arcs[place]["o"] = outputs.size();
    }
    outputs.push_back(group.name);
  }
  const json data = {{"format", "gatedyno-versus-page/1"},
                     {"agreement", kAgreement},
                     {"cells", cells.names()},
                     {"corners", corners.names()},
                     {"outputs", std::move(outputs)},
                     {"arcs", std::move(arcs)}};
  return data.dump(-1, ' ', false, json::error_handler_t::replace);
}

}  // namespace gatedyno
