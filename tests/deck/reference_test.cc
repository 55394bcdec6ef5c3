#include "harness/deck/reference.h"

#include <gtest/gtest.h>

#include "tests/deck/test_bench.h"

namespace gatedyno {
namespace {

// By definition g = 1 and p = 1 on both edges, at any mu.
TEST(ReferenceTest, IsTheYardstick) {
  for (const double mu : {1.3, 2.0, 2.8}) {
    ProcessNode node = NodeP45();
    node.mu = mu;
    const Cell inverter = ReferenceInverter(node);
    const CellEstimate estimate = MustEstimate(inverter, mu);
    for (const Edge edge : {Edge::kRise, Edge::kFall}) {
      const Estimate found = FindArc(estimate, "a", edge).estimate;
      EXPECT_DOUBLE_EQ(found.effort, 1.0) << mu;
      EXPECT_DOUBLE_EQ(found.parasitic_by_nodes, 1.0) << mu;
      EXPECT_DOUBLE_EQ(found.parasitic_by_elmore, 1.0) << mu;
    }
    EXPECT_DOUBLE_EQ(GateWidth(inverter, inverter.pins[0]),
                     (1.0 + mu) * node.reference_width_m());
    EXPECT_EQ(GateWidth(inverter, inverter.pins[1]), 0.0);
  }
}

TEST(ReferenceTest, GateWidthCountsCopies) {
  Cell cell = ReferenceInverter(NodeP45());
  const double width_m = GateWidth(cell, cell.pins[0]);
  for (Mosfet& mosfet : cell.mosfets) {
    mosfet.multiplicity = 4;
  }
  EXPECT_DOUBLE_EQ(GateWidth(cell, cell.pins[0]), 4 * width_m);
}

}  // namespace
}  // namespace gatedyno
