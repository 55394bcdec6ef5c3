// Worked paths, decoders and stage counts.
//
// Sources: WH, WHs, SSH, RCN, HL as in estimate_test.cc and Rabaey,
// Chandrakasan, Nikolic, Digital Integrated Circuits, 2nd ed. (from memory,
// arithmetic recomputed).

#include "harness/effort/path.h"

#include <cmath>

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

constexpr double kExact = 1e-9;

// Stages at mobility ratio 2, p_inv = 1.
constexpr PathStage kInv = {1.0, 1.0};
constexpr PathStage kNand2 = {4.0 / 3, 2.0};
constexpr PathStage kNand4 = {2.0, 4.0};
constexpr PathStage kNand8 = {10.0 / 3, 8.0};
constexpr PathStage kNor2 = {5.0 / 3, 2.0};
constexpr PathStage kNor4 = {3.0, 4.0};

struct PathDelay {
  const char* name;
  const char* source;
  std::vector<PathStage> stages;
  double electrical_effort;
  double delay;
  double tolerance;  // Half of the last digit printed.
};

// Branching is folded into the electrical effort: B * H.
std::vector<PathDelay> PathDelays() {
  return {
      {"inverter, FO1", "HL", {kInv}, 1, 2, kExact},
      {"inverter, FO4", "WH", {kInv}, 4, 5, kExact},
      {"NOR4 driving 10 copies", "SSH", {kNor4}, 10, 34, kExact},
      {"three NAND2, H 1", "SSH", {kNand2, kNand2, kNand2}, 1, 10.0, 0.05},
      {"three NAND2, H 8", "SSH", {kNand2, kNand2, kNand2}, 8, 14.0, 0.05},
      {"three NAND2, B 6, H 4.5",
       "SSH",
       {kNand2, kNand2, kNand2},
       27,
       18.0,
       0.05},
      {"AND8 as NAND8-INV, H 1", "SSH", {kNand8, kInv}, 1, 12.65, 0.005},
      {"AND8 as NAND4-NOR2, H 1", "SSH", {kNand4, kNor2}, 1, 9.65, 0.005},
      {"AND8 as NAND2-NOR2-NAND2-INV, H 1",
       "SSH",
       {kNand2, kNor2, kNand2, kInv},
       1,
       12.25,
       0.005},
      {"AND8 as NAND8-INV, H 12", "SSH", {kNand8, kInv}, 12, 21.65, 0.005},
      {"AND8 as NAND4-NOR2, H 12", "SSH", {kNand4, kNor2}, 12, 18.65, 0.005},
      {"AND8 as NAND2-NOR2-NAND2-INV, H 12",
       "SSH",
       {kNand2, kNor2, kNand2, kInv},
       12,
       16.77,
       0.005},
      {"decoder NOR4", "WH", {kNor4}, 76.8, 234.4, 0.05},
      {"decoder NAND4-INV", "WH", {kNand4, kInv}, 76.8, 29.8, 0.05},
      {"decoder NAND2-NOR2", "WH", {kNand2, kNor2}, 76.8, 30.1, 0.05},
      {"decoder INV-NAND4-INV", "WH", {kInv, kNand4, kInv}, 76.8, 22.1, 0.05},
      {"decoder NAND4-INV-INV-INV",
       "WH",
       {kNand4, kInv, kInv, kInv},
       76.8,
       21.1,
       0.05},
      {"decoder NAND2-NOR2-INV-INV",
       "WH",
       {kNand2, kNor2, kInv, kInv},
       76.8,
       20.5,
       0.05},
      {"decoder NAND2-INV-NAND2-INV",
       "WH",
       {kNand2, kInv, kNand2, kInv},
       76.8,
       19.7,
       0.05},
      {"decoder INV-NAND2-INV-NAND2-INV",
       "WH",
       {kInv, kNand2, kInv, kNand2, kInv},
       76.8,
       20.4,
       0.05},
      {"decoder NAND2-INV-NAND2-INV-INV-INV",
       "WH",
       {kNand2, kInv, kNand2, kInv, kInv, kInv},
       76.8,
       21.6,
       0.05},
      {"drive 64x, 1 stage", "WH, RCN", {kInv}, 64, 65, kExact},
      {"drive 64x, 2 stages", "WH, RCN", {kInv, kInv}, 64, 18, kExact},
      {"drive 64x, 3 stages", "WH, RCN", {kInv, kInv, kInv}, 64, 15, kExact},
      {"drive 64x, 4 stages",
       "WH, RCN",
       {kInv, kInv, kInv, kInv},
       64,
       15.3,
       0.05},
  };
}

TEST(SumPathTest, DelaysOfWorkedPaths) {
  for (const PathDelay& row : PathDelays()) {
    EXPECT_NEAR(SumPath(row.stages, row.electrical_effort).delay,
                row.delay,
                row.tolerance)
        << row.name << ": " << row.source;
  }
}

TEST(SumPathTest, PathWithBranching) {
  // WH, arithmetic recomputed: NAND2, NAND3, NOR2; Cin 8, load 45, branching 3
  // then 2.
  const std::vector<PathStage> stages = {
      {4.0 / 3, 2.0, 3.0}, {5.0 / 3, 3.0, 2.0}, {5.0 / 3, 2.0, 1.0}};
  const PathSums sums = SumPath(stages, 45.0 / 8);
  EXPECT_NEAR(sums.logical_effort, 100.0 / 27, kExact);
  EXPECT_NEAR(sums.branching_effort, 6, kExact);
  EXPECT_NEAR(sums.electrical_effort, 45.0 / 8, kExact);
  EXPECT_NEAR(sums.path_effort, 125, kExact);
  EXPECT_NEAR(sums.stage_effort, 5, kExact);
  EXPECT_NEAR(sums.parasitic, 7, kExact);
  EXPECT_NEAR(sums.delay, 22, kExact);
  const std::vector<double> sizes = SizePath(stages, 8, 45);
  EXPECT_NEAR(sizes[0], 8, kExact);
  EXPECT_NEAR(sizes[1], 10, kExact);
  EXPECT_NEAR(sizes[2], 15, kExact);
}

TEST(SumPathTest, PathOfFourStages) {
  // WH, arithmetic recomputed: INV, NOR2, NAND2, INV; 10 to 20.
  const std::vector<PathStage> stages = {kInv, kNor2, kNand2, kInv};
  const PathSums sums = SumPath(stages, 2);
  EXPECT_NEAR(sums.logical_effort, 20.0 / 9, kExact);
  EXPECT_NEAR(sums.path_effort, 40.0 / 9, kExact);
  EXPECT_NEAR(sums.stage_effort, 1.45, 0.005);
  EXPECT_NEAR(sums.delay, 11.8, 0.05);
  // Printed as "about".
  const std::vector<double> sizes = SizePath(stages, 10, 20);
  EXPECT_NEAR(sizes[1], 15, 0.5);
  EXPECT_NEAR(sizes[2], 13, 0.5);
  EXPECT_NEAR(sizes[3], 14, 0.5);
}

TEST(SizePathTest, ChainSizedFromTheLoadBack) {
  // RCN, from memory, arithmetic recomputed: g = 1, 5/3, 5/3, 1, load 5: F
  // 125/9, f 1.93; sizes 1.93, 2.23, 2.59, which the book works on from the
  // rounded f.
  constexpr double kFromRounded = 0.01;
  const std::vector<PathStage> stages = {kInv, kNor2, kNor2, kInv};
  const PathSums sums = SumPath(stages, 5);
  EXPECT_NEAR(sums.path_effort, 125.0 / 9, kExact);
  EXPECT_NEAR(sums.stage_effort, 1.93, 0.005);
  const std::vector<double> sizes = SizePath(stages, 1, 5);
  EXPECT_NEAR(sizes[1], 1.93, kFromRounded);
  EXPECT_NEAR(sizes[2], 2.23, kFromRounded);
  EXPECT_NEAR(sizes[3], 2.59, kFromRounded);
}

TEST(BestStageEffortTest, KnownRoots) {
  struct Row {
    double parasitic;
    double rho;
  };
  // By counting; 2.718 and 3.59 are common knowledge of the trade.
  const std::vector<Row> table = {
      {0, 2.718}, {0.5, 3.181}, {1, 3.591}, {1.5, 3.967}, {2, 4.319}};
  for (const Row& row : table) {
    const double rho = BestStageEffort(row.parasitic);
    EXPECT_NEAR(rho, row.rho, 0.0005);
    EXPECT_NEAR(row.parasitic + rho * (1 - std::log(rho)), 0, kExact);
  }
}

TEST(BestStageEffortTest, WithLogicalEffort) {
  // WHs 9.14: rho(g, p) = g rho(1, p/g), the least of the delay per ln F:
  // (rho + p) / ln(rho / g).
  for (const double g : {4.0 / 3, 5.0 / 3, 3.0}) {
    for (const double p : {1.0, 2.0, 4.0}) {
      const double rho = BestStageEffort(p, g);
      EXPECT_NEAR(rho, g * BestStageEffort(p / g), kExact);
      const auto cost = [&](double f) { return (f + p) / std::log(f / g); };
      EXPECT_LT(cost(rho), cost(rho * 1.01));
      EXPECT_LT(cost(rho), cost(rho * 0.99));
    }
  }
}

TEST(StageCountTest, CrossoversAtUnitParasitic) {
  struct Row {
    int stages;
    double effort;
    double effort_tolerance;
    double delay;
  };
  // SSH, from memory, arithmetic recomputed.
  const std::vector<Row> table = {{1, 5.83, 0.005, 6.83},
                                  {2, 22.3, 0.05, 11.44},
                                  {3, 82.2, 0.05, 16.04},
                                  {4, 299.6, 0.3, 20.64},
                                  {5, 1086, 1, 25.24},
                                  {6, 3924, 1, 29.83},
                                  {7, 14159, 5, 34.42}};
  for (const Row& row : table) {
    const double effort = StageCountCrossover(row.stages, 1);
    EXPECT_NEAR(effort, row.effort, row.effort_tolerance);
    EXPECT_NEAR(ChainDelay(effort, row.stages, 1), row.delay, 0.01);
    EXPECT_EQ(BestStageCount(effort * 0.999, 1), row.stages);
    EXPECT_EQ(BestStageCount(effort * 1.001, 1), row.stages + 1);
  }
}

TEST(StageCountTest, WrongCountCosts) {
  // WH, arithmetic recomputed: 1.51 at half the best count, 1.26 at twice.
  const double rho = BestStageEffort(1);
  const int best = 4;
  const double effort = std::pow(rho, best);
  const double least = ChainDelay(effort, best, 1);
  EXPECT_NEAR(ChainDelay(effort, best / 2, 1) / least, 1.51, 0.005);
  EXPECT_NEAR(ChainDelay(effort, best * 2, 1) / least, 1.26, 0.005);
}

}  // namespace
}  // namespace gatedyno
