// Rail networks, their series/parallel form, their stacks and whether two are
// the same.

#include <gtest/gtest.h>

#include "harness/network/analysis.h"
#include "harness/network/isomorphism.h"
#include "harness/network/rail_network.h"
#include "harness/network/series_parallel.h"
#include "harness/network/stack.h"
#include "tests/network/rail_networks.h"
#include "tests/support/bundle_gates.h"

namespace gatedyno {
namespace {

struct TopologyRow {
  Cell cell;
  size_t down_devices;
  size_t up_devices;
  int down_stack;
  int up_stack;
  bool series_parallel;  // The pull-down.
  bool same;
};

// A NAND2 whose pull-down ends are written the other way round, with a device
// tied off and a dead end, neither of which belongs to a network.
Cell NandWithExtras() {
  CellBuilder builder("nand2e");
  PinsOf(builder, 2);
  return builder.N("m1", "n1", "a", "y", 2)
      .N("m2", "vss", "b", "n1", 2)
      .P("m3", "vdd", "a", "y", 2)
      .P("m4", "y", "b", "vdd", 2)
      .N("m5", "y", "vss", "vss", 2)
      .N("m6", "n1", "a", "n9", 2)
      .Build();
}

// Majority whose pull-up has the pull-down's topology with c at the supply and
// the stack of two turned round.
Cell MajorityTurned() {
  CellBuilder builder = MajorityPullDown("maj3t");
  PStack(builder, "y", {"b", "a"}, 4);
  return builder.P("p1", "w", "c", "vdd", 4)
      .P("p2", "y", "a", "w", 4)
      .P("p3", "y", "b", "w", 4)
      .Build();
}

TEST(TopologyTest, OfKnownGates) {
  const std::vector<TopologyRow> table = {
      {InverterCell(1, 2), 1, 1, 1, 1, true, true},
      {NandCell(3, 3, 2), 3, 3, 3, 1, true, false},
      {NandWithExtras(), 2, 2, 2, 1, true, false},
      {CompoundCell(2), 5, 5, 2, 3, true, false},
      {MajorityRepeatedCell(2), 5, 5, 2, 2, true, true},
      {MajorityTurned(), 5, 5, 2, 2, true, true},
      {MajorityDualCell(2), 5, 5, 2, 3, true, false},
      {MajoritySymmetricCell(2), 6, 6, 2, 2, true, true},
      {MirrorSumCell(2), 7, 7, 3, 3, true, true},
      // A way through both middle nets would need a net and its inverse high.
      {XorSharedCell(3, 2), 8, 8, 3, 3, false, true},
      {XorSharedCell(4, 2), 12, 12, 4, 4, false, false},
      {BridgeCell({1, 1, 1, 1, 1}, 2), 5, 5, 3, 3, false, false},
  };
  for (const TopologyRow& row : table) {
    SCOPED_TRACE(row.cell.name);
    const Networks found = NetworksOf(row.cell);
    const SwitchNetwork& network = found.analysis.network;
    EXPECT_EQ(found.down.switches.size(), row.down_devices);
    EXPECT_EQ(found.up.switches.size(), row.up_devices);
    EXPECT_EQ(TallestStack(found.analysis, found.down), row.down_stack);
    EXPECT_EQ(TallestStack(found.analysis, found.up), row.up_stack);
    EXPECT_EQ(ReduceSeriesParallel(network, found.down).has_value(),
              row.series_parallel);
    EXPECT_EQ(SameTopology(network, found.down, found.up), row.same);
    EXPECT_EQ(SameTopology(network, found.up, found.down), row.same);
    EXPECT_TRUE(SameTopology(network, found.down, found.down));
  }
}

}  // namespace
}  // namespace gatedyno
