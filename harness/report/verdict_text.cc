#include "harness/report/verdict_text.h"

#include <fmt/format.h>

#include "harness/compare/summary.h"
#include "harness/report/number_text.h"

namespace gatedyno {
namespace {

// Higher outweighs lower.
int Weight(Verdict verdict) {
  switch (verdict) {
    case Verdict::kWithin:
      return 0;
    case Verdict::kNotMeasured:
      return 1;
    case Verdict::kBeyond:
      return 2;
  }
  return 0;
}

}  // namespace

std::string AllowedText(const RunFacts& facts) {
  const auto rules = static_cast<int>(facts.tolerance_rules.size());
  return fmt::format("g {}, p {} of the hand number{}",
                     Percent(facts.tolerance.effort),
                     Percent(facts.tolerance.parasitic),
                     rules == 0 ? ""
                                : fmt::format(", but for {} of the plan",
                                              Counted(rules, "rule")));
}

std::string Counted(int count, const std::string& what) {
  return fmt::format("{} {}{}", count, what, count == 1 ? "" : "s");
}

std::map<std::string, Verdict> VerdictsOfCells(const RunResult& result) {
  std::map<std::string, Verdict> verdicts;
  for (const Comparison& row : result.comparisons) {
    Verdict& verdict =
        verdicts.try_emplace(row.arc.cell, row.verdict).first->second;
    if (Weight(row.verdict) > Weight(verdict)) {
      verdict = row.verdict;
    }
  }
  return verdicts;
}

CellCounts CountCells(const RunResult& result) {
  CellCounts counts;
  for (const auto& [cell, verdict] : VerdictsOfCells(result)) {
    counts.within += verdict == Verdict::kWithin ? 1 : 0;
    counts.beyond += verdict == Verdict::kBeyond ? 1 : 0;
    counts.not_measured += verdict == Verdict::kNotMeasured ? 1 : 0;
  }
  return counts;
}

std::string VerdictSentence(const RunResult& result) {
  const int arcs = static_cast<int>(result.comparisons.size());
  const Summary summary = Summarise(result.comparisons);
  const CellCounts cells = CountCells(result);
  const int all_cells = cells.within + cells.beyond + cells.not_measured;
  if (summary.not_measured == arcs) {
    return "Nothing was measured, so nothing can be said of the hand numbers.";
  }
  if (summary.beyond == 0 && summary.not_measured == 0) {
    const std::string all = arcs == 1 ? "The only arc lies"
                                      : fmt::format("All {} arcs of {} lie",
                                                    arcs,
                                                    Counted(all_cells, "cell"));
    return fmt::format(
        "{} within what is allowed ({}).", all, AllowedText(result.facts));
  }
  const std::string unmeasured =
      summary.not_measured == 0
          ? ""
          : fmt::format("; {} {} not measured",
                        Counted(summary.not_measured, "arc"),
                        summary.not_measured == 1 ? "was" : "were");
  if (summary.beyond == 0) {
    return fmt::format("Every arc measured lies within what is allowed ({}){}.",
                       AllowedText(result.facts),
                       unmeasured);
  }
  return fmt::format("{} of {}, in {} of {}, {} beyond what is allowed ({}){}.",
                     summary.beyond,
                     Counted(arcs, "arc"),
                     cells.beyond,
                     Counted(all_cells, "cell"),
                     summary.beyond == 1 ? "lies" : "lie",
                     AllowedText(result.facts),
                     unmeasured);
}

}  // namespace gatedyno
