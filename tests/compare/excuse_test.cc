#include "harness/compare/excuse.h"

#include <optional>
#include <string>
#include <vector>

#include <gtest/gtest.h>

#include "tests/compare/exempt_rows.h"

namespace gatedyno {
namespace {

constexpr const char* kToday = "2026-12-02";
constexpr const char* kPast = "2026-12-01";
constexpr auto kG = Quantity::kEffort;
constexpr auto kP = Quantity::kParasitic;

TEST(ExcuseTest, AnArcIsExcusedWhenEveryTroubleIs) {
  const ArcPattern elsewhere{.corners = "slow_*", .edge = {}};
  struct Case {
    const char* name;
    Comparison row;
    std::vector<Exemption> exemptions;
    bool excused;
  };
  const Case cases[] = {
      {"nothing wrong", WithinRow(), {ExemptionFor({})}, false},
      {"no exemption", EffortBeyondRow(), {}, false},
      {"both quantities", EffortBeyondRow(), {ExemptionFor({})}, true},
      {"its own quantity", EffortBeyondRow(), {ExemptionFor(kG)}, true},
      {"the other quantity", EffortBeyondRow(), {ExemptionFor(kP)}, false},
      {"half of it", BothBeyondRow(), {ExemptionFor(kG)}, false},
      {"one each", BothBeyondRow(), {ExemptionFor(kP), ExemptionFor(kG)}, true},
      {"doubt of the other",
       BeyondAndUncertainRow(),
       {ExemptionFor(kG)},
       false},
      {"doubt of its own", DoubtfulRow(), {ExemptionFor(kG)}, true},
      {"not measured, g and p",
       WithoutLineRow(),
       {ExemptionFor(kG), ExemptionFor(kP)},
       false},
      {"not measured", WithoutLineRow(), {ExemptionFor({})}, true},
      {"not known", WithoutUncertaintyRow(), {ExemptionFor(kG)}, false},
      {"last day", EffortBeyondRow(), {ExemptionFor({}, kToday)}, true},
      {"day after", EffortBeyondRow(), {ExemptionFor({}, kPast)}, false},
      {"other arcs",
       EffortBeyondRow(),
       {ExemptionFor({}, "2027-03-31", elsewhere)},
       false},
  };
  for (const Case& test : cases) {
    EXPECT_EQ(IsExcused(test.row, test.exemptions, kToday), test.excused)
        << test.name;
  }
}

TEST(ExcuseTest, TheFirstInForceCountsBeforeAnyThatHasExpired) {
  struct Case {
    std::vector<Exemption> exemptions;
    std::optional<size_t> in_force;
    std::optional<size_t> expired;
  };
  const Case cases[] = {
      {{}, std::nullopt, std::nullopt},
      {{ExemptionFor(kP), ExemptionFor({}), ExemptionFor(kG)}, 1, std::nullopt},
      {{ExemptionFor({}, kPast), ExemptionFor({})}, 1, std::nullopt},
      {{ExemptionFor(kP), ExemptionFor(kG, kPast), ExemptionFor({}, kPast)},
       std::nullopt,
       1},
  };
  const Comparison row = EffortBeyondRow();
  for (const Case& test : cases) {
    const Excuse excuse =
        ExcuseFor(row, TroublesOf(row).front(), test.exemptions, kToday);
    EXPECT_EQ(excuse.in_force, test.in_force);
    EXPECT_EQ(excuse.expired, test.expired);
  }
}

TEST(ExcuseTest, HowEachExemptionStands) {
  struct Case {
    Exemption exemption;
    std::string state;
    int arcs;
    int in_need;
  };
  const ArcPattern none{.cells = "nadn2", .edge = {}};
  const Case cases[] = {
      {ExemptionFor({}), "in force", 4, 3},
      {ExemptionFor(kG), "in force", 4, 1},
      {ExemptionFor(kP, kPast), "expired", 4, 1},
      {ExemptionFor({}, kToday, none), "covers no arc", 0, 0},
      {ExemptionFor({}, kPast, none), "expired", 0, 0},
      {ExemptionFor({}, kToday, {.corners = "slow", .edge = {}}),
       "not needed",
       1,
       0},
  };
  RunResult result;
  result.comparisons = {
      EffortBeyondRow(), ParasiticBeyondRow(), WithoutLineRow(), WithinRow()};
  result.comparisons.back().corner = "slow";
  for (const Case& test : cases) {
    result.facts.exemptions.push_back(test.exemption);
  }
  const std::vector<ExemptionUse> uses = UseOfExemptions(result, kToday);
  ASSERT_EQ(uses.size(), std::size(cases));
  for (size_t i = 0; i < uses.size(); ++i) {
    EXPECT_EQ(ExemptionStateName(uses[i].state), cases[i].state) << i;
    EXPECT_EQ(uses[i].arcs, cases[i].arcs) << i;
    EXPECT_EQ(uses[i].in_need, cases[i].in_need) << i;
  }
}

}  // namespace
}  // namespace gatedyno
