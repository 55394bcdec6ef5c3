#include "harness/page/page_arcs.h"

#include <array>
#include <string_view>

#include <fmt/format.h>

#include "harness/report/exemption_text.h"
#include "harness/report/html_text.h"
#include "harness/report/number_text.h"

namespace gatedyno {
namespace {

constexpr std::string_view kNone = "&ndash;";

struct Column {
  std::string_view
      key;  // What the script sorts by; see reports/script/arc_table.js.
  std::string_view head;
};

constexpr std::array kColumns = {Column{"cell", "cell"},
                                 Column{"arc", "arc"},
                                 Column{"corner", "corner"},
                                 Column{"g0", "g hand"},
                                 Column{"g1", "g measured"},
                                 Column{"g3", "g difference"},
                                 Column{"p0", "p hand"},
                                 Column{"p1", "p measured"},
                                 Column{"p3", "p difference"},
                                 Column{"verdict", "verdict"}};

std::string Head() {
  std::string row;
  for (const Column& column : kColumns) {
    row += fmt::format(
        "<th scope=\"col\" data-key=\"{}\">{}</th>", column.key, column.head);
  }
  return fmt::format("<thead><tr>{}</tr></thead>\n", row);
}

std::string ArcCell(const Comparison& row, size_t place) {
  const std::string side = DescribeSide(row.arc);
  return fmt::format(
      "<a href=\"#{}\">{}</a>{}",
      ArcId(place),
      Html(DescribeArc(row.arc)),
      side.empty() ? "" : fmt::format(" <small>with {}</small>", Html(side)));
}

// "g hand" to "p difference".  HTML lets </td> be left out; with thousands of
// rows that counts.
std::string FigureCells(const Comparison& row) {
  const bool measured = row.line.has_value();
  const auto shown = [&](const std::string& text) {
    return measured ? text : std::string(kNone);
  };
  return fmt::format("<td>{:.3f}<td>{}<td>{}<td>{}<td>{}<td>{}",
                     row.estimate.effort,
                     shown(WithUncertainty(row.effort, 3)),
                     shown(SignedPercent(row.effort_difference)),
                     row.hand_parasitic > 0
                         ? fmt::format("{:.2f}", row.hand_parasitic)
                         : std::string(kNone),
                     shown(WithUncertainty(row.parasitic, 2)),
                     shown(SignedPercent(row.parasitic_difference)));
}

std::string Small(const std::string& text) {
  return text.empty()
             ? ""
             : fmt::format(" <small>{}</small>", KeepPercents(Html(text)));
}

std::string VerdictCell(const Comparison& row, const std::string& note) {
  constexpr std::array<std::string_view, 3> kClasses = {
      "within", "beyond", "unmeasured"};
  return fmt::format("<b class=\"{}\">{}</b>{}{}{}",
                     kClasses.at(static_cast<size_t>(row.verdict)),
                     VerdictName(row.verdict),
                     row.bent ? ", bent" : "",
                     Small(row.reason),
                     Small(note));
}

std::string Row(const Comparison& row, size_t place, const std::string& note) {
  return fmt::format("<tr id=\"{}\"><th scope=\"row\">{}<td>{}<td>{}{}<td>{}\n",
                     ArcId(place),
                     Html(row.arc.cell),
                     ArcCell(row, place),
                     Html(row.corner),
                     FigureCells(row),
                     VerdictCell(row, note));
}

}  // namespace

std::string ArcId(std::size_t place) {
  return fmt::format("arc-{}", place + 1);
}

std::string ArcTable(const RunResult& result, const std::string& today) {
  std::string table = fmt::format(
      "<table id=\"arc-table\" class=\"arcs\"><caption>g and p of every arc, "
      "by hand and "
      "measured; &plusmn; one standard uncertainty</caption>\n{}<tbody>\n",
      Head());
  for (size_t i = 0; i < result.comparisons.size(); ++i) {
    if (i == kRowsAtOnce) {
      table += "</tbody><tbody class=\"more\">\n";
    }
    const Comparison& row = result.comparisons[i];
    table += Row(row, i, ExemptionNote(row, result.facts.exemptions, today));
  }
  return table + "</tbody></table>\n";
}

}  // namespace gatedyno
