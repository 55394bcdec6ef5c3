#include "harness/page/versus_arcs.h"

#include <array>
#include <optional>
#include <string_view>

#include <fmt/format.h>

#include "harness/page/page_arcs.h"
#include "harness/report/html_text.h"
#include "harness/report/number_text.h"
#include "harness/report/versus_text.h"

namespace gatedyno {
namespace {

constexpr std::string_view kNone = "&ndash;";

struct Column {
  std::string_view
      key;  // What the script sorts by; see reports/script/versus_pairs.js.
  std::string_view head;
};

constexpr std::array kColumns = {Column{"cell", "cell"},
                                 Column{"arc", "arc"},
                                 Column{"corner", "corner"},
                                 Column{"g0", "g in A"},
                                 Column{"g1", "g in B"},
                                 Column{"g2", "change of g"},
                                 Column{"p0", "p in A"},
                                 Column{"p1", "p in B"},
                                 Column{"p2", "change of p"},
                                 Column{"finding", "finding"}};

std::string Head() {
  std::string row;
  for (const Column& column : kColumns) {
    row += fmt::format(
        "<th scope=\"col\" data-key=\"{}\">{}</th>", column.key, column.head);
  }
  return fmt::format("<thead><tr>{}</tr></thead>\n", row);
}

std::string ArcCell(const Arc& arc) {
  const std::string side = DescribeSide(arc);
  return Html(DescribeArc(arc)) +
         (side.empty() ? ""
                       : fmt::format(" <small>with {}</small>", Html(side)));
}

std::string MeasuredCell(const Comparison& row, Quantity quantity) {
  if (!row.line) {
    return std::string(kNone);
  }
  return quantity == Quantity::kEffort ? WithUncertainty(row.effort, 3)
                                       : WithUncertainty(row.parasitic, 2);
}

std::string ChangeCell(const std::optional<Change>& change) {
  if (!change) {
    return std::string(kNone);
  }
  const std::string expanded = ExpandedText(*change);
  return KeepPercents(
      SignedPercent(change->relative) +
      (expanded.empty() ? "" : fmt::format(" <small>{}</small>", expanded)));
}

// HTML lets </td> be left out; with thousands of rows that counts.
std::string FigureCells(const ArcPair& pair, Quantity quantity) {
  return fmt::format("<td>{}<td>{}<td>{}",
                     MeasuredCell(*pair.a, quantity),
                     MeasuredCell(*pair.b, quantity),
                     ChangeCell(ChangeIn(pair, quantity)));
}

std::string_view FindingClass(Finding finding) {
  switch (finding) {
    case Finding::kChanged:
      return "changed";
    case Finding::kAlike:
    case Finding::kSameJobs:
      return "alike";
    default:
      return "unsaid";
  }
}

// Why a side has no line.
std::string ReasonText(const ArcPair& pair) {
  std::string text;
  for (const auto& [name, row] : {std::pair("A", pair.a), {"B", pair.b}}) {
    if (!row->line) {
      text += fmt::format(
          " <small>{}: {}</small>", name, KeepPercents(Html(row->reason)));
    }
  }
  return text;
}

std::string FindingCell(const ArcPair& pair) {
  const std::string head = FindingHead(pair);
  const std::string more = FindingText(pair).substr(head.size());
  return fmt::format("<b class=\"{}\">{}</b>{}{}",
                     FindingClass(pair.finding),
                     head,
                     more,
                     ReasonText(pair));
}

std::string Row(const ArcPair& pair) {
  return fmt::format("<tr><th scope=\"row\">{}<td>{}<td>{}{}{}<td>{}\n",
                     Html(pair.a->arc.cell),
                     ArcCell(pair.a->arc),
                     Html(CornerPairName({pair.a->corner, pair.b->corner})),
                     FigureCells(pair, Quantity::kEffort),
                     FigureCells(pair, Quantity::kParasitic),
                     FindingCell(pair));
}

}  // namespace

std::string PairTable(const Versus& versus) {
  std::string table = fmt::format(
      "<table id=\"arc-table\" class=\"arcs\"><caption>g and p of every arc "
      "that is in both. &plusmn; after g and p: one standard uncertainty; "
      "after "
      "a change: its expanded uncertainty</caption>\n{}<tbody>\n",
      Head());
  for (std::size_t i = 0; i < versus.arcs.size(); ++i) {
    if (i == kRowsAtOnce) {
      table += "</tbody><tbody class=\"more\">\n";
    }
    table += Row(versus.arcs[i]);
  }
  return table + "</tbody></table>\n";
}

std::string PairList(const Versus& versus,
                     const std::vector<std::size_t>& places,
                     const std::string& label) {
  std::string rows;
  for (const std::size_t place : places) {
    rows += Row(versus.arcs[place]);
  }
  return fmt::format(
      "<div class=\"wide\" role=\"region\" tabindex=\"0\" aria-label=\"{0}\">"
      "<table class=\"arcs\"><caption class=\"unseen\">{0}</caption>\n{1}"
      "<tbody>\n{2}</tbody></table></div>\n",
      label,
      Head(),
      rows);
}

}  // namespace gatedyno
