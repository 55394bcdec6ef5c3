#include "harness/report/estimate_table.h"

#include <fmt/format.h>

#include "harness/report/number_text.h"
#include "harness/report/wrap.h"

namespace gatedyno {
namespace {

constexpr size_t kArcColumns = 18;
// Where the side inputs begin.
constexpr size_t kSideColumn = 59;

struct Cells {
  std::string arc;
  std::string effort;
  std::string fraction;
  std::string by_nodes;
  std::string by_elmore;
  std::string side;
};

// An arc whose names are too long for its column has a line of its own.
std::string Laid(const Cells& cells) {
  const bool fits = ColumnsOf(cells.arc) <= kArcColumns;
  const std::string line =
      Wrap(fmt::format("  {:<{}} {:>8} {:>7} {:>8} {:>9}   {}",
                       fits ? cells.arc : "",
                       kArcColumns,
                       cells.effort,
                       cells.fraction,
                       cells.by_nodes,
                       cells.by_elmore,
                       cells.side),
           kSideColumn);
  return (fits ? "" : Wrap("  " + cells.arc, 4) + '\n') + line + '\n';
}

std::string OutputLines(const OutputEstimate& output, const Style& style) {
  constexpr size_t kIndent = 4;
  std::string text =
      Wrap(fmt::format("  {} = {}", output.output, output.function), kIndent) +
      '\n' +
      Wrap(
          fmt::format(
              "  {}; stacks {} down, {} up{}{}",
              output.kind,
              output.tallest_pull_down,
              output.tallest_pull_up,
              output.self_dual ? "; self-dual" : "",
              output.repeated_network ? ", pull-up repeats the pull-down" : ""),
          kIndent) +
      '\n';
  if (!output.other_topology.empty()) {
    text += style.Quiet(Wrap("  " + output.other_topology, kIndent)) + '\n';
  }
  return text;
}

std::string ArcLine(const ArcEstimate& row) {
  return Laid({DescribeArc(row.arc),
               fmt::format("{:.4f}", row.estimate.effort),
               FractionText(row.estimate.effort),
               fmt::format("{:.3f}", row.estimate.parasitic_by_nodes),
               fmt::format("{:.3f}", row.estimate.parasitic_by_elmore),
               DescribeSide(row.arc)});
}

}  // namespace

std::string EstimateTable(const CellEstimate& estimate, const Style& style) {
  std::string text =
      style.Heading(Wrap(estimate.cell)) +
      (estimate.stages > 1 ? fmt::format("  ({} stages)\n", estimate.stages)
                           : "\n");
  for (const OutputEstimate& output : estimate.outputs) {
    text += OutputLines(output, style);
  }
  text += style.Quiet(
      Laid({"arc", "g", "", "p, nodes", "p, Elmore", "side inputs"}));
  for (const ArcEstimate& arc : estimate.arcs) {
    text += ArcLine(arc);
  }
  return text;
}

}  // namespace gatedyno
