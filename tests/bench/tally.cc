#include "tests/bench/tally.h"

#include <cmath>

#include <fmt/format.h>

#include "harness/fit/coverage.h"
#include "tests/bench/target.h"

namespace gatedyno {
namespace {

constexpr double kPercent = 100.0;

bool JudgeCoverage(const char* what, const Coverage& coverage) {
  constexpr double kLeastShare = 95.0;
  const double per_arc = kPercent / coverage.arcs;
  Figure(fmt::format("arcs, golden at {}", what), coverage.arcs);
  const bool good = AtLeast("  of them within 2 u(g), %",
                            coverage.within_two_u * per_arc,
                            kLeastShare);
  Figure("  of them within k u(g), %", coverage.within_expanded * per_arc);
  return good;
}

}  // namespace

void Coverage::Add(double error, double u, int points) {
  ++arcs;
  within_two_u += std::abs(error) <= 2.0 * u ? 1 : 0;
  within_expanded += std::abs(error) <= CoverageFactor(points - 2) * u ? 1 : 0;
}

bool PrintTally(const Tally& tally) {
  fmt::print("\naccuracy: one input of each built-in cell, at p45 or p180\n");
  Figure("golden decks", tally.golden_decks);
  Figure("  of them with wider tolerances", tally.loosened);
  fmt::print("  golden against half its step: {}\n", tally.half_step.Text());
  for (const auto& [points, arcs] : tally.arcs_by_points) {
    Figure(fmt::format("arcs of {} points", points), arcs);
  }
  Figure("arcs not measured", tally.not_measured);
  Figure("arcs exact by definition, not counted below", tally.exact);
  fmt::print("  delays: {}\n", tally.delays.Text());
  fmt::print("  g, own fanouts: {}\n", tally.effort.Text());
  fmt::print("  g, all fanouts: {}\n", tally.effort_full.Text());
  constexpr double kDelay = 0.2;
  constexpr double kEffort = 0.3;
  bool good = AtMost(
      "largest error of a delay, %", kPercent * tally.delays.largest(), kDelay);
  good &= AtMost(
      "largest error of g, %", kPercent * tally.effort.largest(), kEffort);
  good &= JudgeCoverage("their own fanouts", tally.coverage);
  good &= JudgeCoverage("all fanouts", tally.coverage_full);
  return good;
}

}  // namespace gatedyno
