#include "harness/page/page_head.h"

#include <cstddef>

#include <fmt/format.h>

#include "harness/compare/summary.h"
#include "harness/page/page_arcs.h"
#include "harness/report/html_text.h"
#include "harness/report/number_text.h"
#include "harness/report/verdict_text.h"

namespace gatedyno {
namespace {

std::string CountRow(const char* what,
                     int within,
                     int beyond,
                     int not_measured) {
  return fmt::format(
      "<tr><th scope=\"row\">{}</th><td>{}</td><td>{}</td><td>{}</td></tr>\n",
      what,
      within,
      beyond,
      not_measured);
}

std::string CornerRow(const Calibration& calibration) {
  const Corner& corner = calibration.corner;
  return fmt::format(
      "<tr><th scope=\"row\">{}</th><td>{}</td><td>{:g} V</td><td>{:g} "
      "&deg;C</td><td>{}</td><td>{}</td><td>{}</td><td>{}</td><td>{}</td>"
      "</tr>\n",
      Html(corner.name),
      Html(corner.process),
      corner.supply_v,
      corner.temperature_c,
      PicosecondsWithUncertainty(calibration.tau_s),
      PicosecondsWithUncertainty(calibration.tau_rise_s),
      PicosecondsWithUncertainty(calibration.tau_fall_s),
      WithUncertainty(calibration.p_inv, 3),
      Picoseconds(calibration.fo4_s));
}

}  // namespace

std::string CountTable(const RunResult& result) {
  const CellCounts cells = CountCells(result);
  const Summary arcs = Summarise(result.comparisons);
  return fmt::format(
      "<table class=\"counts\"><caption class=\"unseen\">Verdicts</caption>"
      "<thead><tr><td></td><th scope=\"col\"><span class=\"within\">within"
      "</span></th><th scope=\"col\"><span class=\"beyond\">beyond</span></th>"
      "<th scope=\"col\"><span class=\"unmeasured\">not measured</span></th>"
      "</tr></thead>\n<tbody>\n{}{}</tbody></table>\n",
      CountRow("cells", cells.within, cells.beyond, cells.not_measured),
      CountRow("arcs", arcs.within, arcs.beyond, arcs.not_measured));
}

std::string WorstList(const RunResult& result) {
  const Summary summary = Summarise(result.comparisons);
  if (summary.worst_by_effort.empty()) {
    return "<p>No arc has a verdict.</p>\n";
  }
  std::string items;
  for (const size_t place : summary.worst_by_effort) {
    const Comparison& row = result.comparisons[place];
    items += fmt::format(
        "<li><a href=\"#{}\">{} {}</a> at {}: g {:.3f} against {:.3f} by hand, "
        "{}, <span class=\"{}\">{}</span></li>\n",
        ArcId(place),
        HtmlName(row.arc.cell),
        HtmlName(DescribeArc(row.arc)),
        HtmlName(row.corner),
        row.effort.value,
        row.estimate.effort,
        SignedPercent(row.effort_difference),
        VerdictName(row.verdict),
        VerdictName(row.verdict));
  }
  return fmt::format("<ol class=\"worst\">\n{}</ol>\n", items);
}

std::string CornerTable(const RunResult& result) {
  if (result.calibrations.empty()) {
    return "<p>The reference inverter was measured at no corner, so there is "
           "no tau.</p>\n";
  }
  std::string rows;
  for (const Calibration& calibration : result.calibrations) {
    rows += CornerRow(calibration);
  }
  return fmt::format(
      "<div class=\"wide\" role=\"region\" tabindex=\"0\" "
      "aria-label=\"reference "
      "inverter by corner\"><table class=\"corners\"><caption>The reference "
      "inverter; tau in ps, &plusmn; one standard "
      "uncertainty</caption>\n<thead>"
      "<tr><th scope=\"col\">corner</th><th scope=\"col\">process</th><th "
      "scope=\"col\">supply</th><th scope=\"col\">temperature</th><th "
      "scope=\"col\">tau</th><th scope=\"col\">tau rise</th><th "
      "scope=\"col\">tau fall</th><th scope=\"col\">p_inv</th><th "
      "scope=\"col\">FO4</th></tr></thead>\n<tbody>\n{}</tbody></table></"
      "div>\n",
      rows);
}

}  // namespace gatedyno
