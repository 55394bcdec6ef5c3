#include "harness/page/page_data.h"

#include <utility>

#include <nlohmann/json.hpp>

#include "harness/compare/figure.h"
#include "harness/page/data_json.h"
#include "harness/page/hand_line.h"

namespace gatedyno {
namespace {

using nlohmann::json;

constexpr double kPicosecondsPerSecond = 1e12;

json Picoseconds(double seconds) {
  return ShortNumber(seconds * kPicosecondsPerSecond);
}

// Null for what an arc without a line does not have.
json FigureData(const Comparison& row, Quantity quantity) {
  const Figure figure = FigureOf(row, quantity);
  if (!row.line) {
    return {ShortNumber(figure.hand),
            nullptr,
            nullptr,
            nullptr,
            nullptr,
            ShortNumber(figure.tolerance)};
  }
  return {ShortNumber(figure.hand),
          ShortNumber(figure.measured.value),
          ShortNumber(figure.measured.u),
          ShortNumber(figure.difference),
          ShortNumber(figure.expanded),
          ShortNumber(figure.tolerance)};
}

json PointsData(const Comparison& row) {
  json points = json::array();
  for (const Point& point : row.points) {
    points.push_back({ShortNumber(point.fanout), Picoseconds(point.delay_s)});
  }
  return points;
}

json ArcData(const Comparison& row, const Calibration* calibration) {
  json arc = {{"n", DescribeArc(row.arc)},
              {"e", EdgeName(row.arc.edge)},
              {"s", DescribeSide(row.arc)},
              {"v", VerdictName(row.verdict)},
              {"b", row.bent},
              {"g", FigureData(row, Quantity::kEffort)},
              {"p", FigureData(row, Quantity::kParasitic)},
              {"x", PointsData(row)},
              {"l", nullptr},
              {"h", nullptr}};
  if (row.line) {
    arc["l"] = {Picoseconds(row.line->slope_s),
                Picoseconds(row.line->intercept_s)};
  }
  if (calibration != nullptr) {
    const HandLine hand = HandLineOf(row, *calibration);
    arc["h"] = {Picoseconds(hand.slope_s), Picoseconds(hand.intercept_s)};
  }
  return arc;
}

}  // namespace

std::string PageData(const RunResult& result) {
  NamePlaces cells;
  NamePlaces corners;
  json arcs = json::array();
  for (const Comparison& row : result.comparisons) {
    json arc = ArcData(row, CalibrationOf(row, result));
    arc["c"] = cells.Of(row.arc.cell);
    arc["k"] = corners.Of(row.corner);
    arcs.push_back(std::move(arc));
  }
  const bool checked = result.accuracy.delays > 0;
  const json data = {
      {"format", "gatedyno-page/1"},
      {"cells", cells.names()},
      {"corners", corners.names()},
      {"u", checked ? ShortNumber(result.accuracy.rms) : json(nullptr)},
      {"arcs", std::move(arcs)}};
  return data.dump(-1, ' ', false, json::error_handler_t::replace);
}

}  // namespace gatedyno
