#include "harness/effort/grid.h"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "tests/support/find_arc.h"
#include "tests/support/gates.h"

namespace gatedyno {
namespace {

constexpr double kExact = 1e-9;
constexpr double kGridM = 5e-9;
const EstimateOptions kOptions = {};

GridEffect MustRound(const Cell& cell, double grid_m = kGridM) {
  Result<GridEffect> effect = RoundToGrid(cell, grid_m, kOptions);
  EXPECT_TRUE(effect.ok());
  return *effect;
}

TEST(RoundToGridTest, WidthsOnTheGridStay) {
  const GridEffect effect = MustRound(NandCell(2, 2, 2));
  EXPECT_TRUE(effect.devices.empty());
  EXPECT_TRUE(effect.warnings.empty());
  for (const EffortChange& change : effect.changes) {
    EXPECT_EQ(change.before, change.after);
  }
}

TEST(RoundToGridTest, KeepingTheRatioKeepsEffort) {
  // 1.5:1 becomes 3:2 in steps of 100 nm when drawn twice as large; drawn at
  // its own size it becomes 2:1.
  Cell cell = InverterCell(1, 1.5);
  const double before =
      FindArc(MustEstimate(cell), "a", Edge::kFall).estimate.effort;
  for (Mosfet& mosfet : cell.mosfets) {
    mosfet.width_m *= 2.0;
  }
  const GridEffect kept = MustRound(cell, 100e-9);
  EXPECT_TRUE(kept.devices.empty());
  EXPECT_NEAR(
      FindArc(MustEstimate(kept.rounded), "a", Edge::kFall).estimate.effort,
      before,
      kExact);
}

TEST(RoundToGridTest, RoundingThatKeepsTheRatioSaysSo) {
  // Every width 1 % off, all rounded back: g as before.
  Cell cell = InverterCell(1, 2);
  for (Mosfet& mosfet : cell.mosfets) {
    mosfet.width_m *= 1.01;
  }
  const GridEffect effect = MustRound(cell);
  EXPECT_EQ(effect.devices.size(), 2U);
  for (const EffortChange& change : effect.changes) {
    EXPECT_NEAR(change.after, change.before, kExact);
  }
}

TEST(RoundToGridTest, WarnsWithTheEffectOnEffort) {
  // HI-skew by hand: N 93, P 372: g(fall) = 465 / 279 = 5/3; with 95 it is
  // 467 / 285 = 1.639; g(rise) = 465 / 558 = 0.833 becomes 467 / 558 = 0.837.
  const Cell cell = InverterCell(0.93, 3.70);
  const GridEffect effect = MustRound(cell);
  EXPECT_THAT(
      effect.warnings,
      testing::ElementsAre("yn w=93n is off the 5 nm grid: rounded to 95n, "
                           "g(a, fall) 1.659 -> 1.632"));
  ASSERT_EQ(effect.devices.size(), 1U);
  EXPECT_EQ(effect.devices[0].mosfet, 0);
  EXPECT_NEAR(effect.devices[0].width_m, 93e-9, 1e-15);
  EXPECT_NEAR(effect.devices[0].rounded_m, 95e-9, 1e-15);
  EXPECT_NEAR(effect.rounded.mosfets[0].width_m, 95e-9, 1e-15);
  EXPECT_NEAR(effect.rounded.mosfets[1].width_m, 370e-9, 1e-15);
  ASSERT_EQ(effect.changes.size(), 2U);
  EXPECT_EQ(effect.changes[1].edge, Edge::kFall);
  EXPECT_NEAR(effect.changes[1].before, 463.0 / 279, kExact);
  EXPECT_NEAR(effect.changes[1].after, 465.0 / 285, kExact);
}

TEST(RoundToGridTest, FingersAreRoundedOneByOne) {
  Cell cell = InverterCell(2, 4);
  cell.mosfets[0].fingers = 3.0;  // 66.67 nm each.
  const GridEffect effect = MustRound(cell);
  EXPECT_THAT(effect.warnings,
              testing::ElementsAre(
                  "yn w=66.6667n a finger is off the 5 nm grid: rounded to "
                  "65n, g(a, fall) 1.000 -> 1.017"));
  EXPECT_NEAR(effect.rounded.mosfets[0].width_m, 195e-9, 1e-15);
}

TEST(RoundToGridTest, NarrowDevicesGetOneStep) {
  const GridEffect effect = MustRound(InverterCell(0.01, 2));
  ASSERT_EQ(effect.devices.size(), 1U);
  EXPECT_NEAR(effect.devices[0].rounded_m, kGridM, 1e-15);
}

TEST(RoundToGridTest, NamesTheOutputWhereThereAreSeveral) {
  CellBuilder builder("buf");
  builder.Pins({"a", "x", "y", "vdd", "vss"});
  const Cell cell =
      builder.Inverter("a", "x", 1, 2).Inverter("x", "y", 1.02, 2).Build();
  EXPECT_THAT(
      MustRound(cell).warnings,
      testing::ElementsAre("yn w=102n is off the 5 nm grid: rounded to 100n, "
                           "g(a->y, fall) 0.980 -> 1.000"));
}

TEST(RoundToGridTest, PassesOnWhatTheEstimateRefuses) {
  CellBuilder builder("none");
  const Cell cell =
      builder.Pins({"a", "vdd", "vss"}).N("m1", "vss", "a", "vss", 1).Build();
  const auto effect = RoundToGrid(cell, kGridM, kOptions);
  ASSERT_FALSE(effect.ok());
  EXPECT_EQ(effect.error().message,
            "none.sp:1:1: cell 'none': has no output: its devices drive no "
            "pin");
}

}  // namespace
}  // namespace gatedyno
