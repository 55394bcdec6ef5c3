#include "harness/page/page_cells.h"

#include <cstddef>
#include <map>
#include <set>
#include <vector>

#include <fmt/format.h>

#include "harness/page/page_arcs.h"
#include "harness/page/page_circuit.h"
#include "harness/report/html_text.h"
#include "harness/report/number_text.h"
#include "harness/report/verdict_text.h"

namespace gatedyno {
namespace {

// Places in RunResult::comparisons.
using PlacesByCell = std::map<std::string, std::vector<size_t>>;

PlacesByCell GroupByCell(const RunResult& result) {
  PlacesByCell groups;
  for (size_t i = 0; i < result.comparisons.size(); ++i) {
    groups[result.comparisons[i].arc.cell].push_back(i);
  }
  return groups;
}

// "1.333 = 4/3".
std::string HandNumber(double value) {
  const std::string fraction = FractionText(value);
  return fraction.find('/') == std::string::npos
             ? fmt::format("{:.3f}", value)
             : fmt::format("{:.3f} = {}", value, fraction);
}

std::string ArcRow(const Comparison& row, size_t place) {
  const std::string side = DescribeSide(row.arc);
  const Estimate& estimate = row.estimate;
  return fmt::format(
      "<tr><th scope=\"row\"><a href=\"#{}\">{}</a><td>{}<td>{}<td>{}<td>{}\n",
      ArcId(place),
      Html(DescribeArc(row.arc)),
      side.empty() ? "&ndash;" : Html(side),
      HandNumber(estimate.effort),
      HandNumber(estimate.parasitic_by_nodes),
      HandNumber(estimate.parasitic_by_elmore));
}

// One row an arc, whatever the number of corners.
std::string ArcRows(const std::vector<size_t>& places,
                    const RunResult& result) {
  std::set<std::string> seen;
  std::string rows;
  for (const size_t place : places) {
    const Comparison& row = result.comparisons[place];
    if (seen.insert(DescribeArc(row.arc) + '\n' + DescribeSide(row.arc))
            .second) {
      rows += ArcRow(row, place);
    }
  }
  return rows;
}

std::string Counts(const std::vector<size_t>& places, const RunResult& result) {
  std::map<Verdict, int> counts;
  for (const size_t place : places) {
    ++counts[result.comparisons[place].verdict];
  }
  return fmt::format("{} within, {} beyond, {} not measured",
                     counts[Verdict::kWithin],
                     counts[Verdict::kBeyond],
                     counts[Verdict::kNotMeasured]);
}

std::string HandTable(const CellSummary& cell, const std::string& rows) {
  return fmt::format(
      "<div class=\"wide\" role=\"region\" tabindex=\"0\" aria-label=\"hand "
      "numbers of {0}\"><table class=\"hand\"><caption class=\"unseen\">Hand "
      "numbers of {0}</caption><thead><tr><th scope=\"col\">arc</th><th "
      "scope=\"col\">other inputs</th><th scope=\"col\">g</th><th "
      "scope=\"col\">p by nodes</th><th scope=\"col\">p by Elmore</th></tr>"
      "</thead>\n<tbody>\n{1}</tbody></table></div>",
      Html(cell.name),
      rows);
}

std::string Section(const CellSummary& cell,
                    const std::vector<size_t>& places,
                    const RunResult& result) {
  std::string functions;
  for (const std::string& function : cell.functions) {
    functions += fmt::format("<p><code>{}</code></p>\n", Html(function));
  }
  return fmt::format(
      "<section class=\"cell\"><h3>{}</h3>\n{}<p>{}; tallest stacks: {} "
      "pull-down, {} pull-up. Arcs at all corners: {}.</p>\n<div "
      "class=\"abreast\">{}{}</div></section>\n",
      Html(cell.name),
      functions,
      Counted(cell.stages, "stage"),
      cell.tallest_pull_down,
      cell.tallest_pull_up,
      Counts(places, result),
      CircuitFigure(cell),
      HandTable(cell, ArcRows(places, result)));
}

}  // namespace

std::string CellSections(const RunResult& result) {
  const PlacesByCell groups = GroupByCell(result);
  std::string sections;
  for (const CellSummary& cell : result.cells) {
    const auto group = groups.find(cell.name);
    sections +=
        Section(cell,
                group == groups.end() ? std::vector<size_t>() : group->second,
                result);
  }
  return sections;
}

}  // namespace gatedyno
