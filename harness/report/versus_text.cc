#include "harness/report/versus_text.h"

#include <algorithm>
#include <cmath>

#include <fmt/format.h>
#include <fmt/ranges.h>

#include "harness/report/number_text.h"
#include "harness/report/run_table.h"
#include "harness/report/verdict_text.h"

namespace gatedyno {
namespace {

std::string Changes(const Versus& versus) {
  const int changed = CountFindings(versus, Finding::kChanged);
  const int differ = CountVerdictsThatDiffer(versus);
  return fmt::format("{} changed by more than {} uncertainty, and {} {}",
                     changed == 0 ? "no arc" : Counted(changed, "arc"),
                     changed > 1 ? "their" : "its",
                     differ == 0 ? "no verdict" : Counted(differ, "verdict"),
                     differ > 1 ? "differ" : "differs");
}

bool IsBeyond(const std::optional<Change>& change) {
  return change && IsBeyondUncertainty(*change);
}

// "; by hand g 1.333 in A, 1.500 in B".
std::string HandText(const ArcPair& pair) {
  return HandEffortDiffers(pair) ? fmt::format(
                                       "; by hand g {:.3f} in A, "
                                       "{:.3f} in B",
                                       pair.a->estimate.effort,
                                       pair.b->estimate.effort)
                                 : "";
}

std::string VerdictText(const ArcPair& pair) {
  return pair.verdicts_differ() ? fmt::format("; {} in A, {} in B",
                                              VerdictName(pair.a->verdict),
                                              VerdictName(pair.b->verdict))
                                : "";
}

// Two corners of one run are compared.
bool SameRun(const VersusView& view) {
  return view.a.source.store == view.b.source.store &&
         view.a.source.run == view.b.source.run &&
         view.a.result.facts.started == view.b.result.facts.started;
}

// As SignedPercent() has it.
int DecimalsOf(double percent) {
  constexpr double kTwoDigits = 9.95;
  return percent < kTwoDigits ? 1 : 0;
}

// The corners of `run` that no pair has, as a sentence.
void AddLeftOut(const RunResult& run,
                const char* side,
                const std::vector<std::string>& compared,
                std::vector<std::string>* sentences) {
  std::vector<std::string> left;
  for (const std::string& corner : CornersOf(run)) {
    if (std::find(compared.begin(), compared.end(), corner) == compared.end()) {
      left.push_back(corner);
    }
  }
  if (!left.empty()) {
    sentences->push_back(fmt::format("Of {}, not compared: {} {}.",
                                     side,
                                     left.size() == 1 ? "corner" : "corners",
                                     fmt::join(left, ", ")));
  }
}

}  // namespace

std::string VersusSentence(const VersusView& view) {
  const Versus& versus = view.versus;
  const std::vector<std::size_t> all = AllPlaces(versus);
  const Spread g = SpreadOf(versus, all, EffortChange);
  if (versus.arcs.empty()) {
    return "No arc is in both runs.";
  }
  if (g.count == 0) {
    return "No arc was measured in both runs.";
  }
  if (CountFindings(versus, Finding::kSameJobs) == g.count) {
    return fmt::format(
        "All {} measured in both rest on the same jobs, so nothing can have "
        "changed.",
        Counted(g.count, "arc"));
  }
  return fmt::format(
      "g of {} of {} agrees within {}: it changes by {} on average{}; {}.",
      CountWithin(versus, EffortChange, kAgreement),
      Counted(g.count, "arc"),
      Percent(kAgreement),
      SignedPercent(g.mean),
      g.deviation ? fmt::format(", standard deviation {}", DeviationText(g))
                  : "",
      Changes(versus));
}

std::string FindingHead(const ArcPair& pair) {
  if (!pair.changed()) {
    return std::string(FindingName(pair.finding));
  }
  const bool effort = IsBeyond(pair.effort);
  const bool parasitic = IsBeyond(pair.parasitic);
  return fmt::format("changed: {}",
                     effort && parasitic ? "g and p"
                     : effort            ? "g"
                                         : "p");
}

std::string FindingText(const ArcPair& pair) {
  return FindingHead(pair) + HandText(pair) + VerdictText(pair);
}

std::string CornerPairName(const CornerPair& pair) {
  return pair.a == pair.b ? pair.a : fmt::format("{} to {}", pair.a, pair.b);
}

std::string ExpandedText(const Change& change) {
  if (!change.expanded) {
    return "";
  }
  const double percent = 100.0 * *change.expanded;
  const int decimals = DecimalsOf(percent);
  // 0.9 is 0.9, however its double is spelt.
  constexpr double kSpelling = 1e-9;
  const double unit = std::pow(10.0, -decimals);
  return fmt::format(
      "±{:.{}f} %",
      std::max(0.0, std::ceil(percent / unit - kSpelling)) * unit,
      decimals);
}

std::string ChangeText(const Change& change) {
  const std::string expanded = ExpandedText(change);
  return SignedPercent(change.relative) +
         (expanded.empty() ? "" : " " + expanded);
}

std::string DeviationText(const Spread& spread) {
  if (!spread.deviation) {
    return "-";
  }
  const double percent = 100.0 * *spread.deviation;
  return fmt::format("{:.{}f} %", percent, DecimalsOf(percent));
}

std::vector<std::string> CornersLeftOut(const VersusView& view) {
  std::vector<std::string> of_a;
  std::vector<std::string> of_b;
  for (const CornerPair& pair : view.versus.corners) {
    of_a.push_back(pair.a);
    of_b.push_back(pair.b);
  }
  std::vector<std::string> sentences;
  if (SameRun(view)) {
    of_a.insert(of_a.end(), of_b.begin(), of_b.end());
    AddLeftOut(view.a.result, "the run", of_a, &sentences);
    return sentences;
  }
  AddLeftOut(view.a.result, "A", of_a, &sentences);
  AddLeftOut(view.b.result, "B", of_b, &sentences);
  return sentences;
}

std::string VersusCaution(const VersusView& view) {
  std::string text = kCaution;
  std::replace(text.begin(), text.end(), '\n', ' ');
  if (view.a.result.facts.node != view.b.result.facts.node) {
    text +=
        " What changes from node to node, tau first of all, compares two "
        "predictive cards, not two factories.";
  }
  return text;
}

std::vector<Compared> ComparedFigures() {
  return {{"g", EffortChange},
          {"p, in tau", ParasiticChange},
          {"p, in p_inv", ParasiticInPInvChange}};
}

int CountFindings(const Versus& versus, Finding finding) {
  return static_cast<int>(std::count_if(
      versus.arcs.begin(), versus.arcs.end(), [&](const ArcPair& pair) {
        return pair.finding == finding;
      }));
}

int CountVerdictsThatDiffer(const Versus& versus) {
  return static_cast<int>(std::count_if(
      versus.arcs.begin(), versus.arcs.end(), [](const ArcPair& pair) {
        return pair.verdicts_differ();
      }));
}

}  // namespace gatedyno
