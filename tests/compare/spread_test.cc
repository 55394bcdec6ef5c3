#include "harness/compare/spread.h"

#include <cmath>
#include <cstddef>
#include <string>
#include <vector>

#include <gtest/gtest.h>

#include "tests/compare/two_runs.h"

namespace gatedyno {
namespace {

// g of 1 in A; in B one effort an arc, all different cells.
struct Runs {
  RunResult a;
  RunResult b;

  explicit Runs(const std::vector<double>& after) {
    for (size_t i = 0; i < after.size(); ++i) {
      const std::string cell = fmt::format("cell{}", i);
      a.comparisons.push_back(RowOf("a", cell, Edge::kFall, 1.0, 1.0));
      b.comparisons.push_back(RowOf("b", cell, Edge::kFall, after[i], 2.0));
    }
  }
  Versus versus() const { return PutSideBySide(a, b, PairCorners(a, b)); }
};

constexpr double kRounding = 1e-12;

// 2, 4, 4, 4, 5, 5, 7, 9: mean 5, squared deviations 32, so that the standard
// deviation of n - 1 is sqrt(32 / 7).
TEST(SpreadTest, MeanAndDeviation) {
  const Runs runs({1.02, 1.04, 1.04, 1.04, 1.05, 1.05, 1.07, 1.09});
  const Versus versus = runs.versus();
  const Spread g = SpreadOf(versus, AllPlaces(versus), EffortChange, 2);
  EXPECT_EQ(g.count, 8);
  EXPECT_NEAR(g.mean, 0.05, kRounding);
  ASSERT_TRUE(g.deviation);
  EXPECT_NEAR(*g.deviation, 0.01 * std::sqrt(32.0 / 7.0), kRounding);
  EXPECT_EQ(g.largest, (std::vector<size_t>{7, 6}));
  const Spread p = SpreadOf(versus, {0, 3}, ParasiticChange);
  EXPECT_EQ(p.count, 2);
  EXPECT_NEAR(p.mean, 1.0, kRounding);
  EXPECT_NEAR(*p.deviation, 0.0, kRounding);
}

// p doubles, and so does p_inv: p in p_inv stays.
TEST(SpreadTest, ParasiticInPInv) {
  Runs runs({1.0, 1.0});
  Calibration calibration;
  calibration.corner.name = "typical";
  calibration.p_inv = {1.0, 0.0};
  runs.a.calibrations = {calibration};
  const Versus unknown = runs.versus();
  EXPECT_EQ(SpreadOf(unknown, {0, 1}, ParasiticInPInvChange).count, 0);
  calibration.p_inv = {2.0, 0.0};
  runs.b.calibrations = {calibration};
  const Versus versus = runs.versus();
  const Spread p = SpreadOf(versus, {0, 1}, ParasiticInPInvChange);
  EXPECT_EQ(p.count, 2);
  EXPECT_NEAR(p.mean, 0.0, kRounding);
}

TEST(SpreadTest, LargestEitherWay) {
  const Runs runs({1.1, 0.7, 1.2});
  const Versus versus = runs.versus();
  EXPECT_EQ(SpreadOf(versus, AllPlaces(versus), EffortChange).largest,
            (std::vector<size_t>{1, 2, 0}));
}

TEST(SpreadTest, FewArcs) {
  Runs runs({1.1, 1.2});
  runs.b.comparisons[1].line.reset();
  const Versus versus = runs.versus();
  const Spread one = SpreadOf(versus, AllPlaces(versus), EffortChange);
  EXPECT_EQ(one.count, 1);
  EXPECT_NEAR(one.mean, 0.1, kRounding);
  EXPECT_FALSE(one.deviation);
  const Spread none = SpreadOf(versus, {1}, EffortChange);
  EXPECT_EQ(none.count, 0);
  EXPECT_EQ(none.mean, 0.0);
  EXPECT_TRUE(none.largest.empty());
}

TEST(SpreadTest, CountsWithinALimit) {
  Runs runs({1.05, 0.96, 1.2, 1.0});
  runs.b.comparisons[3].line.reset();
  const Versus versus = runs.versus();
  EXPECT_EQ(CountWithin(versus, EffortChange, 0.1), 2);
  EXPECT_EQ(CountWithin(versus, ParasiticChange, 0.1), 0);
  EXPECT_EQ(CountWithin(versus, ParasiticChange, 1.0), 3);
}

TEST(SpreadTest, GroupsByTheStackThatDrives) {
  RunResult run;
  run.cells = {{.name = "buf",
                .functions = {},
                .stages = 2,
                .tallest_pull_down = 1,
                .tallest_pull_up = 1},
               {.name = "nand2",
                .functions = {},
                .stages = 1,
                .tallest_pull_down = 2,
                .tallest_pull_up = 1},
               {.name = "inv",
                .functions = {},
                .stages = 1,
                .tallest_pull_down = 1,
                .tallest_pull_up = 1}};
  for (const char* cell : {"buf", "nand2", "inv", "stranger"}) {
    for (const Edge edge : {Edge::kRise, Edge::kFall}) {
      run.comparisons.push_back(RowOf("a", cell, edge, 1.0, 1.0));
    }
  }
  const Versus versus = PutSideBySide(run, run, PairCorners(run, run));
  std::string text;
  for (const ArcGroup& group : GroupByStack(versus, run)) {
    text += group.name + ':';
    for (const size_t place : group.places) {
      text += ' ' + versus.arcs[place].a->arc.cell;
    }
    text += '\n';
  }
  EXPECT_EQ(text,
            "fall, pull-down 1 high: inv\n"
            "fall, pull-down 2 high: nand2\n"
            "rise, pull-up 1 high: nand2 inv\n"
            "fall, several stages: buf stranger\n"
            "rise, several stages: buf stranger\n");
}

}  // namespace
}  // namespace gatedyno
