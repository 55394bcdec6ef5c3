#include "harness/report/comparison_rows.h"

#include <array>
#include <string_view>

#include <fmt/format.h>

#include "harness/report/number_text.h"
#include "harness/report/wrap.h"

namespace gatedyno {
namespace {

constexpr size_t kArcColumns = 15;
constexpr size_t kReasonIndent = 4;
constexpr const char* kNone = "-";

struct Cells {
  std::string arc;
  std::string hand_effort;
  std::string effort;
  std::string effort_difference;
  std::string hand_parasitic;
  std::string node_parasitic;
  std::string parasitic;
  std::string parasitic_difference;
  std::string verdict;
};

std::string Laid(const Cells& cells) {
  const std::string line =
      fmt::format("  {:<{}}{:>7} {:>13} {:>7}  {:>6} {:>7} {:>12} {:>7}  {}",
                  cells.arc,
                  kArcColumns,
                  cells.hand_effort,
                  cells.effort,
                  cells.effort_difference,
                  cells.hand_parasitic,
                  cells.node_parasitic,
                  cells.parasitic,
                  cells.parasitic_difference,
                  cells.verdict);
  return Wrap(line, kReasonIndent) + '\n';
}

Cells MeasuredCells(const Comparison& row) {
  Cells cells;
  cells.effort = WithUncertainty(row.effort, 3);
  cells.effort_difference = SignedPercent(row.effort_difference);
  cells.hand_parasitic = fmt::format("{:.2f}", row.hand_parasitic);
  cells.parasitic = WithUncertainty(row.parasitic, 2);
  cells.parasitic_difference = SignedPercent(row.parasitic_difference);
  return cells;
}

Cells UnmeasuredCells(const Comparison& row) {
  Cells cells;
  cells.effort = cells.effort_difference = kNone;
  cells.hand_parasitic = row.hand_parasitic > 0
                             ? fmt::format("{:.2f}", row.hand_parasitic)
                             : kNone;
  cells.parasitic = cells.parasitic_difference = kNone;
  return cells;
}

// What the row does not say.  "bent" has room beside the shorter verdicts.
std::string ReasonOf(const Comparison& row) {
  std::string text = row.reason;
  if (row.bent && row.verdict == Verdict::kNotMeasured) {
    text += "; bent";
  }
  const std::string side = DescribeSide(row.arc);
  return side.empty() ? text : text + "; with " + side;
}

// After wrapping, which counts columns.
std::string WithStyledVerdict(std::string line,
                              Verdict verdict,
                              const Style& style) {
  const std::string_view name = VerdictName(verdict);
  const size_t at = line.rfind(name);
  return at == std::string::npos
             ? line
             : line.replace(at, name.size(), style.OfVerdict(verdict, name));
}

}  // namespace

std::string ComparisonHead() {
  Cells figures;
  figures.effort = "g";
  figures.hand_parasitic = "p, tau";
  return Laid(figures) + Laid({"arc",
                               "hand",
                               "measured",
                               "diff",
                               "hand",
                               "p_inv=1",
                               "measured",
                               "diff",
                               "verdict"});
}

std::string ComparisonRow(const Comparison& row,
                          const Style& style,
                          const std::string& note) {
  const std::string arc = DescribeArc(row.arc);
  const bool fits = ColumnsOf(arc) <= kArcColumns;
  Cells cells = row.line ? MeasuredCells(row) : UnmeasuredCells(row);
  cells.arc = fits ? arc : "";
  cells.hand_effort = fmt::format("{:.3f}", row.estimate.effort);
  cells.node_parasitic =
      fmt::format("({:.2f})", row.estimate.parasitic_by_nodes);
  cells.verdict = VerdictName(row.verdict);
  if (row.bent && row.verdict != Verdict::kNotMeasured) {
    cells.verdict += " bent";
  }
  std::string text = fits ? "" : Wrap("  " + arc, kReasonIndent) + '\n';
  text += WithStyledVerdict(Laid(cells), row.verdict, style);
  if (row.verdict != Verdict::kWithin) {
    const std::string indent(kReasonIndent, ' ');
    text += style.Quiet(Wrap(indent + ReasonOf(row), kReasonIndent)) + '\n';
    text += note.empty() ? "" : Wrap(indent + note, kReasonIndent) + '\n';
  }
  return text;
}

}  // namespace gatedyno
