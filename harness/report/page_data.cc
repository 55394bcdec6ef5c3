#include "harness/report/page_data.h"

#include <cmath>
#include <cstddef>
#include <cstdlib>
#include <map>
#include <optional>
#include <utility>

#include <fmt/format.h>
#include <nlohmann/json.hpp>

#include "harness/report/figure_view.h"

namespace gatedyno {
namespace {

using nlohmann::json;

constexpr double kPicosecondsPerSecond = 1e12;

// Nine digits: far more than is measured, at half the size of all of them.
json Short(double number) {
  if (!std::isfinite(number)) {
    return nullptr;
  }
  return std::strtod(fmt::format("{:.9g}", number).c_str(), nullptr);
}

json Short(const std::optional<double>& number) {
  return number ? Short(*number) : json(nullptr);
}

json Picoseconds(double seconds) {
  return Short(seconds * kPicosecondsPerSecond);
}

// Gives each name the place at which it came first.
class Places {
 public:
  size_t Of(const std::string& name) {
    const auto [place, fresh] = places_.try_emplace(name, names_.size());
    if (fresh) {
      names_.push_back(name);
    }
    return place->second;
  }
  const json& names() const { return names_; }

 private:
  std::map<std::string, size_t> places_;
  json names_ = json::array();
};

json FigureData(const FigureView& figure) {
  return {Short(figure.hand),
          Short(figure.measured.value),
          Short(figure.measured.u),
          Short(figure.difference),
          Short(figure.difference_expanded),
          Short(figure.tolerance)};
}

// Of an arc without a line.
json HandData(double hand, double tolerance) {
  return {Short(hand), nullptr, nullptr, nullptr, nullptr, Short(tolerance)};
}

json PointsData(const Comparison& row) {
  json points = json::array();
  for (const Point& point : row.points) {
    points.push_back({Short(point.fanout), Picoseconds(point.delay_s)});
  }
  return points;
}

json ArcData(const Comparison& row, const Calibration* calibration) {
  json arc = {{"n", DescribeArc(row.arc)},
              {"e", EdgeName(row.arc.edge)},
              {"s", DescribeSide(row.arc)},
              {"v", VerdictName(row.verdict)},
              {"b", row.bent},
              {"x", PointsData(row)},
              {"l", nullptr},
              {"h", nullptr}};
  if (row.line) {
    arc["g"] = FigureData(EffortView(row));
    arc["p"] = FigureData(ParasiticView(row, calibration));
    arc["l"] = {Picoseconds(row.line->slope_s),
                Picoseconds(row.line->intercept_s)};
  } else {
    arc["g"] = HandData(row.estimate.effort, row.tolerance.effort);
    arc["p"] = HandData(row.hand_parasitic, row.tolerance.parasitic);
  }
  if (calibration != nullptr) {
    const HandLine hand = HandLineOf(row, *calibration);
    arc["h"] = {Picoseconds(hand.slope_s), Picoseconds(hand.intercept_s)};
  }
  return arc;
}

}  // namespace

std::string PageData(const RunResult& result) {
  Places cells;
  Places corners;
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
      {"u", checked ? Short(result.accuracy.rms) : json(nullptr)},
      {"arcs", std::move(arcs)}};
  return data.dump(-1, ' ', false, json::error_handler_t::replace);
}

}  // namespace gatedyno
