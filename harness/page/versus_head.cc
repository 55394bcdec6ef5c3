#include "harness/page/versus_head.h"

#include <cmath>
#include <cstddef>
#include <iterator>
#include <optional>
#include <string_view>
#include <vector>

#include <fmt/format.h>
#include <fmt/ranges.h>

#include "harness/page/page_head.h"
#include "harness/report/html_text.h"
#include "harness/report/number_text.h"
#include "harness/report/versus_text.h"

namespace gatedyno {
namespace {

constexpr std::string_view kNone = "&ndash;";

std::string SideRow(std::string_view name,
                    const std::string& a,
                    const std::string& b) {
  return fmt::format(
      "<tr><th scope=\"row\">{}</th><td>{}</td><td>{}</td></tr>\n",
      name,
      Html(a),
      Html(b));
}

std::string Stored(const RunSource& source) {
  return fmt::format("{}, run {}", source.store, source.run);
}

std::string Accuracy(const RunResult& result) {
  const AccuracyCheck& check = result.accuracy;
  return fmt::format("{:.2g} % of each delay; {}",
                     100.0 * result.facts.accuracy,
                     check.delays == 0
                         ? "not checked"
                         : fmt::format("checked on {}: {:.2g} % at most",
                                       check.delays,
                                       100.0 * check.largest));
}

std::string Corners(const VersusView& view, bool of_a) {
  std::vector<std::string> names;
  for (const CornerPair& pair : view.versus.corners) {
    names.push_back(of_a ? pair.a : pair.b);
  }
  return fmt::format("{}", fmt::join(names, ", "));
}

std::string ScrollableTable(std::string_view label,
                            std::string_view caption,
                            std::string_view head,
                            const std::string& rows) {
  return fmt::format(
      "<div class=\"wide\" role=\"region\" tabindex=\"0\" aria-label=\"{}\">"
      "<table class=\"corners "
      "spread\"><caption>{}</caption>\n<thead><tr>{}</tr>"
      "</thead>\n<tbody>\n{}</tbody></table></div>\n",
      label,
      caption,
      head,
      rows);
}

std::string Heads(const std::vector<std::string_view>& names) {
  std::string heads;
  for (const std::string_view name : names) {
    heads += fmt::format("<th scope=\"col\">{}</th>", name);
  }
  return heads;
}

std::string Three(const std::string& a, const std::string& b, double ratio) {
  return fmt::format("<td>{}</td><td>{}</td><td>{:.3f}</td>", a, b, ratio);
}

std::string CornerPairRow(const CornerPair& pair, const VersusView& view) {
  const Calibration* a = CalibrationAt(pair.a, view.a.result);
  const Calibration* b = CalibrationAt(pair.b, view.b.result);
  const std::string name =
      fmt::format("<tr><th scope=\"row\">{}</th>", Html(CornerPairName(pair)));
  if (a == nullptr || b == nullptr) {
    return name + "<td colspan=\"9\">no tau on both sides</td></tr>\n";
  }
  return name +
         Three(PicosecondsWithUncertainty(a->tau_s),
               PicosecondsWithUncertainty(b->tau_s),
               b->tau_s.value / a->tau_s.value) +
         Three(Picoseconds(a->fo4_s),
               Picoseconds(b->fo4_s),
               b->fo4_s / a->fo4_s) +
         Three(WithUncertainty(a->p_inv, 3),
               WithUncertainty(b->p_inv, 3),
               b->p_inv.value / a->p_inv.value) +
         "</tr>\n";
}

std::string LargestCell(const Versus& versus,
                        const Spread& spread,
                        RelativeChange change) {
  if (spread.largest.empty()) {
    return std::string(kNone);
  }
  const ArcPair& pair = versus.arcs[spread.largest.front()];
  return fmt::format(
      "{} {} {} at {}",
      SignedPercent(change(pair).value_or(0.0)),
      HtmlName(pair.a->arc.cell),
      HtmlName(DescribeArc(pair.a->arc)),
      HtmlName(CornerPairName({pair.a->corner, pair.b->corner})));
}

std::string SpreadRow(const std::string& name,
                      const Versus& versus,
                      const std::vector<std::size_t>& places,
                      RelativeChange change) {
  const Spread spread = SpreadOf(versus, places, change);
  int within = 0;
  for (const std::size_t place : places) {
    const std::optional<double> relative = change(versus.arcs[place]);
    within += relative && std::abs(*relative) <= kAgreement ? 1 : 0;
  }
  return fmt::format(
      "<tr><th scope=\"row\">{}</th><td>{}</td><td>{}</td><td>{}</td><td>{}"
      "</td><td class=\"words\">{}</td></tr>\n",
      name,
      spread.count,
      spread.count > 0 ? SignedPercent(spread.mean) : kNone,
      spread.deviation ? DeviationText(spread) : kNone,
      within,
      LargestCell(versus, spread, change));
}

constexpr std::string_view kSpreadHeads[] = {
    "arcs", "mean", "standard deviation", "within 10 %"};

std::string SpreadHeads(std::string_view first) {
  std::vector<std::string_view> names = {first};
  names.insert(names.end(), std::begin(kSpreadHeads), std::end(kSpreadHeads));
  return Heads(names) + "<th scope=\"col\" class=\"words\">the largest</th>";
}

}  // namespace

std::string SideTable(const VersusView& view) {
  const RunResult& a = view.a.result;
  const RunResult& b = view.b.result;
  std::string rows =
      SideRow("run", a.facts.title, b.facts.title) +
      SideRow("node",
              fmt::format("{}: {}", a.facts.node, a.facts.node_title),
              fmt::format("{}: {}", b.facts.node, b.facts.node_title)) +
      SideRow("corners compared", Corners(view, true), Corners(view, false)) +
      SideRow("store", Stored(view.a.source), Stored(view.b.source)) +
      SideRow("begun", a.facts.started, b.facts.started) +
      SideRow("simulator", a.facts.simulator, b.facts.simulator) +
      SideRow("accuracy", Accuracy(a), Accuracy(b));
  std::string left;
  for (const std::string& sentence : CornersLeftOut(view)) {
    left += fmt::format("<p>{}</p>\n", Html(sentence));
  }
  return fmt::format(
      "<table class=\"sides\"><caption class=\"unseen\">What A and B are"
      "</caption><thead><tr><td></td><th scope=\"col\">A</th><th "
      "scope=\"col\">B</th></tr></thead>\n<tbody>\n{}</tbody></table>\n{}",
      rows,
      left);
}

std::string CornerPairTable(const VersusView& view) {
  std::string rows;
  for (const CornerPair& pair : view.versus.corners) {
    rows += CornerPairRow(pair, view);
  }
  return ScrollableTable(
      "reference inverters side by side",
      "The reference inverters; tau in ps, &plusmn; one standard uncertainty",
      Heads({"corner",
             "tau in A",
             "in B",
             "B / A",
             "FO4 in A",
             "in B",
             "B / A",
             "p_inv in A",
             "in B",
             "B / A"}),
      rows);
}

std::string SpreadTable(const VersusView& view) {
  std::string rows;
  for (const Compared& figure : ComparedFigures()) {
    rows += SpreadRow(
        figure.name, view.versus, AllPlaces(view.versus), figure.change);
  }
  return ScrollableTable("changes of g and p",
                         "How far g and p hold: change from A to B",
                         SpreadHeads("change of"),
                         rows);
}

std::string StackSpreadTable(const VersusView& view) {
  std::string rows;
  for (const ArcGroup& group : GroupByStack(view.versus, view.a.result)) {
    rows += SpreadRow(group.name, view.versus, group.places, EffortChange);
  }
  return ScrollableTable("change of g by what drives the output",
                         "Change of g from A to B, by what drives the output",
                         SpreadHeads("output"),
                         rows);
}

}  // namespace gatedyno
