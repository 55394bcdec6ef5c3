#include "harness/page/page_heat.h"

#include <algorithm>
#include <cmath>
#include <cstddef>
#include <cstdlib>
#include <map>
#include <optional>
#include <string_view>
#include <utility>
#include <vector>

#include <fmt/format.h>

#include "harness/page/page_arcs.h"
#include "harness/report/html_text.h"
#include "harness/report/number_text.h"

namespace gatedyno {
namespace {

// What one map is of.
struct Subject {
  std::string_view symbol;
  double (*difference)(const Comparison&);
  double (*tolerance)(const Comparison&);
};

constexpr Subject kEffort = {
    "g",
    [](const Comparison& row) { return row.effort_difference; },
    [](const Comparison& row) { return row.tolerance.effort; }};
constexpr Subject kParasitic = {
    "p",
    [](const Comparison& row) { return row.parasitic_difference; },
    [](const Comparison& row) { return row.tolerance.parasitic; }};

// The arcs of one cell at one corner.
struct Place {
  std::optional<size_t> worst;  // Of those with a line.
  bool some_beyond = false;     // In what the map is of.
  bool some_unmeasured = false;
};

// Cells and corners in the order of the run.
struct Grid {
  std::vector<std::string> cells;
  std::vector<std::string> corners;
  std::map<std::pair<std::string, std::string>, Place> places;
};

void AddNew(const std::string& name, std::vector<std::string>* names) {
  if (std::find(names->begin(), names->end(), name) == names->end()) {
    names->push_back(name);
  }
}

// A verdict is on g and p together.
bool IsBeyond(const Comparison& row, const Subject& subject) {
  return row.verdict == Verdict::kBeyond &&
         std::abs(subject.difference(row)) > subject.tolerance(row);
}

Grid GridOf(const RunResult& result, const Subject& subject) {
  Grid grid;
  const std::vector<Comparison>& rows = result.comparisons;
  for (size_t i = 0; i < rows.size(); ++i) {
    AddNew(rows[i].arc.cell, &grid.cells);
    AddNew(rows[i].corner, &grid.corners);
    Place& place = grid.places[{rows[i].arc.cell, rows[i].corner}];
    place.some_beyond |= IsBeyond(rows[i], subject);
    place.some_unmeasured |= rows[i].verdict == Verdict::kNotMeasured;
    if (rows[i].line && (!place.worst || std::abs(subject.difference(rows[i])) >
                                             std::abs(subject.difference(
                                                 rows[*place.worst])))) {
      place.worst = i;
    }
  }
  return grid;
}

std::string Mark(std::string_view meaning, std::string_view sign) {
  return fmt::format(
      " <span class=\"mark\" role=\"img\" aria-label=\"{}\">{}</span>",
      meaning,
      sign);
}

std::string PlaceCell(const Place& place,
                      const RunResult& result,
                      const Subject& subject) {
  if (!place.worst) {
    return "<td class=\"unmeasured\">not measured</td>";
  }
  const Comparison& row = result.comparisons[*place.worst];
  const double difference = subject.difference(row);
  return fmt::format(
      "<td class=\"{}\"><a href=\"#{}\">{}</a>{}{}</td>",
      HeatClass(difference, subject.tolerance(row)),
      ArcId(*place.worst),
      SignedPercent(difference),
      place.some_beyond ? Mark("beyond", "&#9670;") : "",
      place.some_unmeasured ? Mark("some arcs not measured", "&#9651;") : "");
}

std::string Map(const RunResult& result, const Subject& subject) {
  const Grid grid = GridOf(result, subject);
  std::string head = "<th scope=\"col\">cell</th>";
  for (const std::string& corner : grid.corners) {
    head += fmt::format("<th scope=\"col\">{}</th>", Html(corner));
  }
  std::string body;
  for (const std::string& cell : grid.cells) {
    body += fmt::format("<tr><th scope=\"row\">{}</th>", Html(cell));
    for (const std::string& corner : grid.corners) {
      const auto place = grid.places.find({cell, corner});
      body += place == grid.places.end()
                  ? "<td>&ndash;</td>"
                  : PlaceCell(place->second, result, subject);
    }
    body += "</tr>\n";
  }
  return fmt::format(
      "<div class=\"wide\" role=\"region\" tabindex=\"0\" aria-label=\"largest "
      "difference of {} by cell and corner\"><table class=\"heat\"><caption>"
      "Largest difference of {}</caption>\n<thead><tr>{}"
      "</tr></thead>\n<tbody>\n{}</tbody></table></div>\n",
      subject.symbol,
      subject.symbol,
      head,
      body);
}

}  // namespace

std::string HeatClass(double difference, double tolerance) {
  constexpr double kSlight = 0.25;
  constexpr double kMedium = 0.5;
  const std::string shown = SignedPercent(difference);
  const double rounded = std::strtod(shown.c_str(), nullptr) / 100.0;
  // A percentage in decimals is no exact double.
  constexpr double kRoundingError = 1e-12;
  const double size = std::abs(rounded) - kRoundingError;
  if (size <= kSlight * tolerance) {
    return "h0";
  }
  const int step = size <= kMedium * tolerance ? 1 : size <= tolerance ? 2 : 3;
  return fmt::format("{}{}", rounded > 0 ? "up" : "down", step);
}

std::string HeatMaps(const RunResult& result) {
  return Map(result, kEffort) + Map(result, kParasitic);
}

}  // namespace gatedyno
