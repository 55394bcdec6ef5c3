#include "harness/compare/release.h"

#include <string>
#include <vector>

#include <gtest/gtest.h>

#include "tests/compare/exempt_rows.h"

namespace gatedyno {
namespace {

constexpr const char* kToday = "2026-12-02";

AccuracyCheck CheckOf(int delays, double largest) {
  return {.promised = 0.002,
          .delays = delays,
          .rms = largest / 2,
          .largest = largest,
          .worst = "nand2 a->y h=4 typical"};
}

RunResult RunOf(std::vector<Comparison> rows,
                std::vector<Exemption> exemptions = {}) {
  RunResult result;
  result.comparisons = std::move(rows);
  result.facts.exemptions = std::move(exemptions);
  result.accuracy = CheckOf(8, 0.001);
  return result;
}

TEST(ReleaseTest, YesOrNo) {
  Comparison bent = WithinRow();
  bent.bent = true;
  struct Case {
    const char* name;
    std::vector<Comparison> rows;
    std::vector<Exemption> exemptions;
    bool yes;
  };
  const Case cases[] = {
      {"all within", {WithinRow(), WithinRow()}, {}, true},
      {"bent, within", {bent}, {}, true},
      {"no arcs", {}, {}, false},
      {"one beyond", {WithinRow(), EffortBeyondRow()}, {}, false},
      {"excused", {EffortBeyondRow()}, {ExemptionFor({})}, true},
      {"expired", {EffortBeyondRow()}, {ExemptionFor({}, "2026-12-01")}, false},
      {"the other figure",
       {BothBeyondRow()},
       {ExemptionFor(Quantity::kEffort)},
       false},
      {"too uncertain", {DoubtfulRow()}, {}, false},
      {"not measured", {WithoutLineRow()}, {}, false},
      {"not measured, excused", {WithoutLineRow()}, {ExemptionFor({})}, true},
      {"not measured, g excused",
       {WithoutLineRow()},
       {ExemptionFor(Quantity::kEffort)},
       false},
      {"an exemption for nothing", {WithinRow()}, {ExemptionFor({})}, true},
  };
  for (const Case& test : cases) {
    const RunResult result = RunOf(test.rows, test.exemptions);
    EXPECT_EQ(DecideRelease(result, 0, kToday).yes(), test.yes) << test.name;
  }
}

TEST(ReleaseTest, ReasonsOfTheRunAsAWhole) {
  struct Case {
    size_t arcs;
    int missing;
    AccuracyCheck accuracy;
    std::vector<std::string> reasons;
  };
  const Case cases[] = {
      {1, 0, CheckOf(8, 0.002), {}},
      {0, 0, CheckOf(8, 0.001), {"there is no arc to judge"}},
      {1, 1, CheckOf(8, 0.001), {"1 job of the plan is not in the store"}},
      {1, 12, CheckOf(8, 0.001), {"12 jobs of the plan are not in the store"}},
      {1,
       0,
       CheckOf(0, 0.0),
       {"the accuracy of the delays could not be checked"}},
      {1,
       0,
       CheckOf(8, 0.0031),
       {"the accuracy was not kept: settings one rung tighter move nand2 a->y "
        "h=4 typical by 0.31 % (promised: 0.2 %)"}},
  };
  for (const Case& test : cases) {
    RunResult result = RunOf(std::vector<Comparison>(test.arcs, WithinRow()));
    result.accuracy = test.accuracy;
    const ReleaseDecision decision =
        DecideRelease(result, test.missing, kToday);
    EXPECT_EQ(decision.of_the_run, test.reasons);
    EXPECT_EQ(decision.yes(), test.reasons.empty());
  }
}

// Exemptions speak for arcs, never for the run.
TEST(ReleaseTest, AnExemptionDoesNotExcuseMissingJobs) {
  const RunResult result = RunOf({WithoutLineRow()}, {ExemptionFor({})});
  EXPECT_FALSE(DecideRelease(result, 3, kToday).yes());
}

TEST(ReleaseTest, KeepsWhatWasWeighed) {
  const RunResult result =
      RunOf({WithinRow(), BothBeyondRow(), WithoutLineRow()},
            {ExemptionFor(Quantity::kParasitic),
             ExemptionFor(Quantity::kEffort, "2026-01-31")});
  const ReleaseDecision decision = DecideRelease(result, 0, kToday);
  ASSERT_EQ(decision.excused.size(), 1U);
  EXPECT_EQ(decision.excused[0].row, &result.comparisons[1]);
  EXPECT_EQ(decision.excused[0].trouble.quantity, Quantity::kParasitic);
  EXPECT_EQ(decision.excused[0].exemption, 0U);
  ASSERT_EQ(decision.obstacles.size(), 2U);
  EXPECT_EQ(decision.obstacles[0].row, &result.comparisons[1]);
  EXPECT_EQ(decision.obstacles[0].trouble.quantity, Quantity::kEffort);
  EXPECT_EQ(decision.obstacles[0].expired, 1U);
  EXPECT_EQ(decision.obstacles[1].row, &result.comparisons[2]);
  EXPECT_EQ(decision.obstacles[1].trouble.kind, TroubleKind::kNotMeasured);
  EXPECT_EQ(decision.obstacles[1].expired, std::nullopt);
  ASSERT_EQ(decision.exemptions.size(), 2U);
  EXPECT_EQ(decision.exemptions[0].state, ExemptionState::kInForce);
  EXPECT_EQ(decision.exemptions[1].state, ExemptionState::kExpired);
  EXPECT_EQ(decision.counts.within, 1);
  EXPECT_EQ(decision.counts.beyond, 1);
  EXPECT_EQ(decision.counts.not_measured, 1);
}

}  // namespace
}  // namespace gatedyno
