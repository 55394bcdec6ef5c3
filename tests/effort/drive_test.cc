#include "harness/effort/drive.h"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "harness/effort/weakest_drive.h"
#include "harness/network/analysis.h"
#include "harness/network/rail_network.h"
#include "harness/network/series_parallel.h"
#include "tests/support/gates.h"

namespace gatedyno {
namespace {

constexpr double kUnitM = 100e-9;  // Of the gates in tests/support.
constexpr double kExact = 1e-9;    // In units, after a Cholesky solve.
constexpr double kMu = 2.0;

NetworkAnalysis MustAnalyse(const Cell& cell) {
  Result<NetworkAnalysis> analysis = AnalyseNetwork(cell);
  EXPECT_TRUE(analysis.ok()) << analysis.error().message;
  return *analysis;
}

NetId Named(const Cell& cell, const std::string& name) {
  for (size_t i = 0; i < cell.nets.size(); ++i) {
    if (cell.nets[i] == name) {
      return static_cast<NetId>(i);
    }
  }
  return -1;
}

// All five inputs of the bridge high: a, b, c, d, e conduct.
constexpr InputVector kAllHigh = 0b11111;
constexpr InputVector kAllLow = 0;

Drive SolveBridge(const Cell& cell, InputVector vector) {
  const NetworkAnalysis analysis = MustAnalyse(cell);
  const NetId output = analysis.outputs.front();
  return SolveDrive(analysis.network,
                    analysis.group_of(output),
                    MeasureWidths(cell, analysis.network, kMu),
                    analysis.levels[vector],
                    output);
}

TEST(SolveDriveTest, BridgeSolvedByHand) {
  // Conductances a 1, b 2 at the output, c 2, d 1 at the ground, e 1 across.
  // With 1 V at the output: 1 = 4 l - r, 2 = 4 r - l, so l = 0.4, r = 0.6, and
  // the current is 1 (1 - 0.4) + 2 (1 - 0.6) = 1.4.
  const Cell cell = BridgeCell({1, 2, 2, 1, 1}, kMu);
  const Drive drive = SolveBridge(cell, kAllHigh);
  EXPECT_NEAR(drive.conductance_m / kUnitM, 1.4, kExact);
  EXPECT_EQ(drive.carrying.size(), 5U);
  ASSERT_EQ(drive.nets.size(), 3U);
  for (size_t k = 0; k < drive.nets.size(); ++k) {
    const std::string& net = cell.net_name(drive.nets[k]);
    const double volts = net == "y" ? 1.0 : (net == "l" ? 0.4 : 0.6);
    EXPECT_NEAR(drive.transfer_per_m[k] * kUnitM, volts / 1.4, kExact) << net;
  }
}

TEST(SolveDriveTest, BridgeOfThePullUp) {
  // The same conductances between other gates: a, b in one leg, c, d in the
  // other, e across: a 1, c 2 at the output, b 2, d 1 at the supply.
  const Cell cell = BridgeCell({1, 2, 2, 1, 1}, kMu);
  EXPECT_NEAR(SolveBridge(cell, kAllLow).conductance_m / kUnitM, 1.4, kExact);
}

TEST(SolveDriveTest, BalancedBridgeCarriesNothingAcross) {
  const Cell cell = BridgeCell({1, 2, 1, 2, 5}, kMu);
  const Drive drive = SolveBridge(cell, kAllHigh);
  EXPECT_NEAR(drive.conductance_m / kUnitM, 1.5, kExact);
  // Devices alternate N and P: n1..n5 are 0..4.
  EXPECT_THAT(drive.carrying, testing::ElementsAre(0, 1, 2, 3));
}

TEST(SolveDriveTest, DanglingNetsOfTheOtherNetworkAreJoined) {
  // NAND2, a = 1 and b = 0: the net between the NMOS hangs on the output and
  // has the output's whole resistance in common.
  const Cell cell = NandCell(2, 2, 2);
  const NetworkAnalysis analysis = MustAnalyse(cell);
  const NetId output = Named(cell, "y");
  const Drive drive = SolveDrive(analysis.network,
                                 analysis.group_of(output),
                                 MeasureWidths(cell, analysis.network, kMu),
                                 analysis.levels[0b01],
                                 output);
  EXPECT_THAT(drive.nets,
              testing::ElementsAre(output, Named(cell, "y.n.a.b:1")));
  EXPECT_NEAR(drive.transfer_per_m[0] * kUnitM, 1.0, kExact);
  EXPECT_NEAR(drive.transfer_per_m[1] * kUnitM, 1.0, kExact);
}

// Conductance of a tree of devices that all conduct, without nodal analysis.
double TreeConductance(const SeriesParallel& tree, const CellWidths& widths) {
  if (tree.form == SeriesParallel::Form::kDevice) {
    return widths.conductance_m[static_cast<size_t>(tree.index)];
  }
  const bool series = tree.form == SeriesParallel::Form::kSeries;
  double sum = 0.0;
  for (const SeriesParallel& part : tree.parts) {
    const double conductance = TreeConductance(part, widths);
    sum += series ? 1.0 / conductance : conductance;
  }
  return series ? 1.0 / sum : sum;
}

TEST(SolveDriveTest, AgreesWithSeriesParallelReduction) {
  for (const Cell& cell : {NandCell(5, 3, 2),
                           CompoundCell(1.7),
                           Aoi221Cell(2.3),
                           MajorityDualCell(2),
                           MirrorSumCell(3)}) {
    const NetworkAnalysis analysis = MustAnalyse(cell);
    const SwitchNetwork& network = analysis.network;
    const CellWidths widths = MeasureWidths(cell, network, kMu);
    const NetId output = analysis.outputs.front();
    const Group& group = analysis.group_of(output);
    const InputVector all_high = (1U << analysis.inputs.size()) - 1U;
    for (const bool high : {false, true}) {
      const auto tree = ReduceSeriesParallel(
          network,
          FindRailNetwork(
              network, group, output, high ? network.ground : network.power));
      ASSERT_TRUE(tree.has_value());
      const Drive drive = SolveDrive(
          network, group, widths, analysis.levels[high ? all_high : 0], output);
      EXPECT_NEAR(
          drive.conductance_m / TreeConductance(*tree, widths), 1.0, kExact)
          << cell.name;
    }
  }
}

TEST(WeakestDriveTest, OverAllVectors) {
  const Cell cell = NandCell(3, 3, 2);
  const NetworkAnalysis analysis = MustAnalyse(cell);
  const CellWidths widths = MeasureWidths(cell, analysis.network, kMu);
  const NetId output = Named(cell, "y");
  EXPECT_NEAR(WeakestDrive(analysis, widths, output, Edge::kFall) / kUnitM,
              1.0,
              kExact);
  // One PMOS of width 2 at mu = 2.
  EXPECT_NEAR(WeakestDrive(analysis, widths, output, Edge::kRise) / kUnitM,
              1.0,
              kExact);
}

}  // namespace
}  // namespace gatedyno
