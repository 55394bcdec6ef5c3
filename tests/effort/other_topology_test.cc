#include "harness/effort/other_topology.h"

#include <gtest/gtest.h>

#include "harness/effort/weakest_drive.h"
#include "tests/support/bundle_gates.h"
#include "tests/support/find_arc.h"
#include "tests/support/gates.h"

namespace gatedyno {
namespace {

constexpr double kExact = 1e-9;
constexpr double kMu = 2.0;

Cell Other(const Cell& cell) {
  const Result<NetworkAnalysis> analysis = AnalyseNetwork(cell);
  EXPECT_TRUE(analysis.ok());
  const std::optional<Cell> other =
      WithOtherTopology(cell, *analysis, kMu, analysis->outputs.front());
  EXPECT_TRUE(other.has_value());
  return other.value_or(Cell{});
}

// Common practice: the dual of the repeated majority has P 6, 6, 6, 6 and 3.
TEST(OtherTopologyTest, DualOfTheRepeatedMajority) {
  const CellEstimate estimate = MustEstimate(Other(MajorityRepeatedCell(2)));
  const CellEstimate drawn = MustEstimate(MajorityDualCell(2));
  for (const char* pin : {"a", "b", "c"}) {
    for (const Edge edge : {Edge::kRise, Edge::kFall}) {
      EXPECT_NEAR(FindArc(estimate, pin, edge).estimate.effort,
                  FindArc(drawn, pin, edge).estimate.effort,
                  kExact);
      EXPECT_NEAR(FindArc(estimate, pin, edge).estimate.parasitic_by_nodes,
                  FindArc(drawn, pin, edge).estimate.parasitic_by_nodes,
                  kExact);
    }
  }
  EXPECT_EQ(estimate.outputs.front().tallest_pull_up, 3);
  EXPECT_EQ(estimate.outputs.front().function, "!(a & b | (a | b) & c)");
}

TEST(OtherTopologyTest, RepeatOfTheDualMajority) {
  const CellEstimate estimate = MustEstimate(Other(MajorityDualCell(2)));
  EXPECT_TRUE(estimate.outputs.front().repeated_network);
  EXPECT_NEAR(FindArc(estimate, "a", Edge::kRise).estimate.effort, 4, kExact);
  EXPECT_NEAR(FindArc(estimate, "c", Edge::kRise).estimate.effort, 2, kExact);
}

TEST(OtherTopologyTest, KeepsTheWeakestDrive) {
  for (const Cell& cell : {MajorityRepeatedCell(2),
                           MajorityDualCell(2),
                           MajoritySymmetricCell(2),
                           MirrorSumCell(2)}) {
    const Cell other = Other(cell);
    const auto drive = [](const Cell& of) {
      const Result<NetworkAnalysis> analysis = AnalyseNetwork(of);
      return WeakestDrive(*analysis,
                          MeasureWidths(of, analysis->network, kMu),
                          analysis->outputs.front(),
                          Edge::kRise);
    };
    EXPECT_NEAR(drive(other) / drive(cell), 1.0, kExact) << cell.name;
  }
}

TEST(OtherTopologyTest, InWords) {
  EXPECT_EQ(MustEstimate(MajorityRepeatedCell(2)).outputs[0].other_topology,
            "pull-up as the series/parallel dual: stack 3 (now 2), PMOS "
            "300-600 nm (now 400 nm); g a 5.333 (now 4), b 5.333 (now 4), c "
            "1.667 (now 2); p 4.333 (now 4)");
  EXPECT_EQ(MustEstimate(MajorityDualCell(2)).outputs[0].other_topology,
            "pull-up as the pull-down repeated: stack 2 (now 3), PMOS 400 nm "
            "(now 300-600 nm); g a 4 (now 5.333), b 4 (now 5.333), c 2 (now "
            "1.667); p 4 (now 4.333)");
}

TEST(OtherTopologyTest, SilentWhereThereIsNoOther) {
  // An inverter is its own dual; a plain NAND2 is not self-dual; the shared
  // XOR3 is no series/parallel network.
  EXPECT_EQ(MustEstimate(InverterCell(1, 2)).outputs[0].other_topology, "");
  EXPECT_EQ(MustEstimate(NandCell(2, 2, 2)).outputs[0].other_topology, "");
  EXPECT_EQ(MustEstimate(XorSharedCell(3, 2)).outputs[0].other_topology, "");
}

}  // namespace
}  // namespace gatedyno
