#include "harness/report/versus_table.h"

#include <optional>
#include <string_view>
#include <vector>

#include <fmt/format.h>

#include "harness/report/number_text.h"
#include "harness/report/verdict_text.h"
#include "harness/report/versus_text.h"
#include "harness/report/wrap.h"

namespace gatedyno {
namespace {

std::string Wrapped(const std::string& text, size_t indent = 2) {
  return Wrap(text, indent) + '\n';
}

std::string SideLine(const char* name, const VersusSide& side) {
  const RunFacts& facts = side.result.facts;
  return Wrapped(fmt::format("{}: {}{}node {}, run {} of {}, begun {}",
                             name,
                             facts.title,
                             facts.title.empty() ? "" : "; ",
                             facts.node,
                             side.source.run,
                             side.source.store,
                             facts.started),
                 3);
}

std::string CornerRow(const char* name,
                      const std::string& a,
                      const std::string& b,
                      double ratio) {
  return fmt::format("  {:<6}{:>12}{:>12}{:>10.3f}\n", name, a, b, ratio);
}

std::string CornerLines(const CornerPair& pair,
                        const VersusView& view,
                        const Style& style) {
  const Calibration* a = CalibrationAt(pair.a, view.a.result);
  const Calibration* b = CalibrationAt(pair.b, view.b.result);
  const std::string heading = Wrap("corner " + CornerPairName(pair));
  if (a == nullptr || b == nullptr) {
    return style.Heading(heading) + "\n  without tau on both sides\n";
  }
  return style.Heading(heading) +
         fmt::format("\n  {:<6}{:>12}{:>12}{:>10}\n", "", "A", "B", "B / A") +
         CornerRow("tau",
                   Picoseconds(a->tau_s.value),
                   Picoseconds(b->tau_s.value),
                   b->tau_s.value / a->tau_s.value) +
         CornerRow("FO4",
                   Picoseconds(a->fo4_s),
                   Picoseconds(b->fo4_s),
                   b->fo4_s / a->fo4_s) +
         CornerRow("p_inv",
                   fmt::format("{:.3f}", a->p_inv.value),
                   fmt::format("{:.3f}", b->p_inv.value),
                   b->p_inv.value / a->p_inv.value);
}

std::string SpreadLines(const Versus& versus, const Style& style) {
  const std::vector<std::size_t> all = AllPlaces(versus);
  std::string text = style.Heading(fmt::format("{:<14}{:>6}{:>10}{:>12}{:>14}",
                                               "change of",
                                               "arcs",
                                               "mean",
                                               "deviation",
                                               "within 10 %")) +
                     '\n';
  for (const Compared& figure : ComparedFigures()) {
    const Spread spread = SpreadOf(versus, all, figure.change);
    text += fmt::format("  {:<12}{:>6}{:>10}{:>12}{:>14}\n",
                        figure.name,
                        spread.count,
                        spread.count > 0 ? SignedPercent(spread.mean) : "-",
                        DeviationText(spread),
                        CountWithin(versus, figure.change, kAgreement));
  }
  return text;
}

std::string LargestLine(const ArcPair& pair, bool effort) {
  const Change& change = effort ? *pair.effort : *pair.parasitic;
  return fmt::format("{} {} at {}: {:.{}f} in A, {:.{}f} in B, {}{}",
                     pair.a->arc.cell,
                     DescribeArc(pair.a->arc),
                     CornerPairName({pair.a->corner, pair.b->corner}),
                     change.before.value,
                     effort ? 3 : 2,
                     change.after.value,
                     effort ? 3 : 2,
                     ChangeText(change),
                     effort && HandEffortDiffers(pair)
                         ? fmt::format(" (by hand g {:.3f}, {:.3f})",
                                       pair.a->estimate.effort,
                                       pair.b->estimate.effort)
                         : "");
}

std::string LargestLines(const Versus& versus, bool effort) {
  std::string title = fmt::format("largest of {}: ", effort ? "g" : "p");
  const size_t indent = title.size();
  std::string text;
  for (const std::size_t place :
       SpreadOf(
           versus, AllPlaces(versus), effort ? EffortChange : ParasiticChange)
           .largest) {
    text += Wrapped(title + LargestLine(versus.arcs[place], effort), indent);
    title.assign(indent, ' ');
  }
  return text;
}

std::string CountLine(const Versus& versus) {
  std::string text =
      Counted(static_cast<int>(versus.arcs.size()), "arc") + " in both";
  std::string_view before = ": ";
  for (const Finding finding : {Finding::kChanged,
                                Finding::kAlike,
                                Finding::kSameJobs,
                                Finding::kBentApart,
                                Finding::kUnknown,
                                Finding::kNotMeasured}) {
    if (const int count = CountFindings(versus, finding); count > 0) {
      text += fmt::format("{}{} {}", before, count, FindingName(finding));
      before = ", ";
    }
  }
  const int differ = CountVerdictsThatDiffer(versus);
  return Wrapped(
      fmt::format("{}; {} {}; only in A: {}, only in B: {}",
                  text,
                  Counted(differ, "verdict"),
                  differ == 1 ? "differs" : "differ",
                  Counted(static_cast<int>(versus.only_a.size()), "arc"),
                  Counted(static_cast<int>(versus.only_b.size()), "arc")));
}

}  // namespace

std::string VersusTable(const VersusView& view, const Style& style) {
  std::string text = SideLine("A", view.a) + SideLine("B", view.b);
  for (const std::string& left : CornersLeftOut(view)) {
    text += Wrapped(left);
  }
  for (const CornerPair& pair : view.versus.corners) {
    text += '\n' + CornerLines(pair, view, style);
  }
  text += '\n' + SpreadLines(view.versus, style);
  text += LargestLines(view.versus, true) + LargestLines(view.versus, false);
  text += '\n' + Wrapped(VersusSentence(view)) + CountLine(view.versus);
  return text + style.Quiet(Wrap(VersusCaution(view), 0)) + '\n';
}

}  // namespace gatedyno
