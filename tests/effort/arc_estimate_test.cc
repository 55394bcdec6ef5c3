// Parasitic delay by Elmore, and cells of several stages, by hand.

#include "harness/effort/arc_estimate.h"

#include <gtest/gtest.h>

#include "tests/support/bundle_gates.h"
#include "tests/support/find_arc.h"
#include "tests/support/gates.h"

namespace gatedyno {
namespace {

constexpr double kExact = 1e-9;  // Small fractions after a Cholesky solve.

struct ElmoreRow {
  const char* why;
  Cell cell;
  const char* pin;
  Edge edge;
  double parasitic;
};

// In units of RC of the reference inverter, 3 RC; mu = 2.
std::vector<ElmoreRow> ElmoreRows() {
  return {
      {"inverter: 3 RC", InverterCell(1, 2), "a", Edge::kFall, 1},
      {"by node count and by Elmore alike: nothing inside moves",
       NandCell(2, 2, 2),
       "a",
       Edge::kFall,
       2},
      {"WH: (R/2)(2C) + R(6C) = 7 RC",
       NandCell(2, 2, 2),
       "b",
       Edge::kFall,
       7.0 / 3},
      {"inner net hangs on the output and was discharged: R(6C + 2C)",
       NandCell(2, 2, 2),
       "b",
       Edge::kRise,
       8.0 / 3},
      {"inner net cut off by a", NandCell(2, 2, 2), "a", Edge::kRise, 2},
      {"WH, the sum for NAND3: (R/3)(3C) + (2R/3)(3C) + R(9C) = 12 RC",
       NandCell(3, 3, 2),
       "c",
       Edge::kFall,
       4},
      {"middle input: (2R/3)(3C) + R(9C); the lowest net is at ground",
       NandCell(3, 3, 2),
       "b",
       Edge::kFall,
       11.0 / 3},
      {"middle input falling: the upper net hangs on the output, the lower "
       "one stays at ground: R(9C + 3C)",
       NandCell(3, 3, 2),
       "b",
       Edge::kRise,
       4},
      {"NOR2, outer input rising: (R/2)(4C) + R(6C)",
       NorCell(2, 1, 4),
       "b",
       Edge::kRise,
       8.0 / 3},
      {"NOR2, outer input falling: the net between the PMOS hangs on the "
       "output: R(6C + 4C)",
       NorCell(2, 1, 4),
       "b",
       Edge::kFall,
       10.0 / 3},
      {"NOR2, inner input falling", NorCell(2, 1, 4), "a", Edge::kFall, 2},
  };
}

TEST(EstimateToggleTest, ElmoreByHand) {
  for (const ElmoreRow& row : ElmoreRows()) {
    EXPECT_NEAR(FindArc(MustEstimate(row.cell), row.pin, row.edge)
                    .estimate.parasitic_by_elmore,
                row.parasitic,
                kExact)
        << row.cell.name << " " << row.pin << " " << EdgeName(row.edge) << ": "
        << row.why;
  }
}

// NAND2 and an inverter of twice the unit size.
Cell And2() {
  CellBuilder builder("and2");
  builder.Pins({"a", "b", "y", "vdd", "vss"});
  NStack(builder, "x", {"a", "b"}, 2);
  PStack(builder, "x", {"a"}, 2);
  PStack(builder, "x", {"b"}, 2);
  return builder.Inverter("x", "y", 2, 4).Build();
}

TEST(EstimateToggleTest, TwoStages) {
  // Output rising: the NAND2 falls (reference 3) into 6 units of gate: effort
  // 2, p 2 by nodes, 7/3 by Elmore from b; then the inverter, reference 6: the
  // pin's 4 units make g 4/6.
  const CellEstimate estimate = MustEstimate(And2());
  EXPECT_EQ(estimate.stages, 2);
  EXPECT_EQ(estimate.outputs.front().function, "a & b");
  const ArcEstimate rise = FindArc(estimate, "b", Edge::kRise);
  EXPECT_EQ(rise.arc.input_edge, Edge::kRise);
  EXPECT_NEAR(rise.estimate.effort, 4.0 / 6, kExact);
  EXPECT_NEAR(rise.estimate.inner_effort, 2, kExact);
  EXPECT_NEAR(rise.estimate.parasitic_by_nodes, 2 + 2 + 1, kExact);
  EXPECT_NEAR(rise.estimate.parasitic_by_elmore, 2 + 7.0 / 3 + 1, kExact);
  ASSERT_TRUE(rise.estimate.fixed_first_effort.has_value());
  EXPECT_NEAR(*rise.estimate.fixed_first_effort, 2, kExact);
}

TEST(EstimateToggleTest, OneStageHasNoFixedFirstEffort) {
  const Estimate estimate =
      FindArc(MustEstimate(NandCell(2, 2, 2)), "a", Edge::kFall).estimate;
  EXPECT_FALSE(estimate.fixed_first_effort.has_value());
  EXPECT_EQ(estimate.inner_effort, 0.0);
}

TEST(EstimateToggleTest, ExclusiveOrThroughItsOwnInverter) {
  // a rises with b = 0: the path through the PMOS of an and b conducts once
  // the inverter has fallen.  Inverter: load 2 + 4 on reference 3, p 1.  Last
  // stage: reference 3, drains 12; by Elmore the upper NMOS net of a (2 C)
  // hangs on the output and floated.  The pin loads 3 + 2 + 4.
  const CellEstimate estimate = MustEstimate(XorSymmetricCell(2, 2));
  const ArcEstimate rise = FindArc(estimate, "a", Edge::kRise);
  EXPECT_EQ(rise.arc.input_edge, Edge::kRise);
  EXPECT_NEAR(rise.estimate.effort, 9.0 / 3, kExact);
  EXPECT_NEAR(rise.estimate.inner_effort, 2, kExact);
  EXPECT_NEAR(*rise.estimate.fixed_first_effort, 2, kExact);
  EXPECT_NEAR(rise.estimate.parasitic_by_nodes, 2 + 1 + 4, kExact);
  EXPECT_NEAR(
      rise.estimate.parasitic_by_elmore, 2 + 1 + (12.0 + 2.0) / 3, kExact);
}

TEST(EstimateToggleTest, ExclusiveOrHasFasterArcsWithoutTheInverter) {
  const CellEstimate estimate = MustEstimate(XorSymmetricCell(2, 2), 2.0, true);
  int direct = 0;
  for (const ArcEstimate& found : estimate.arcs) {
    if (!found.estimate.fixed_first_effort) {
      ++direct;
      EXPECT_NEAR(found.estimate.effort, 3, kExact);
      EXPECT_NEAR(found.estimate.parasitic_by_nodes, 4, kExact);
      EXPECT_EQ(found.estimate.inner_effort, 0.0);
    }
  }
  // Of each input's four arcs two open their path by the pin itself.
  EXPECT_EQ(direct, 4);
  EXPECT_EQ(estimate.arcs.size(), 8U);
}

TEST(EstimateToggleTest, LoadInsideTheCellOnAnOutputPin) {
  // A buffer with both outputs: x also gates the second inverter, which costs
  // a -> x an effort of 6/3 at any fanout.
  CellBuilder builder("buf");
  builder.Pins({"a", "x", "y", "vdd", "vss"});
  const CellEstimate estimate = MustEstimate(
      builder.Inverter("a", "x", 1, 2).Inverter("x", "y", 2, 4).Build());
  const Estimate x = FindArc(estimate, "a", Edge::kFall, "x").estimate;
  EXPECT_NEAR(x.effort, 1, kExact);
  EXPECT_NEAR(x.inner_effort, 2, kExact);
  EXPECT_NEAR(x.parasitic_by_nodes, 1 + 2, kExact);
  EXPECT_FALSE(x.fixed_first_effort.has_value());
  const Estimate y = FindArc(estimate, "a", Edge::kFall, "y").estimate;
  EXPECT_NEAR(y.effort, 3.0 / 6, kExact);
  EXPECT_NEAR(y.inner_effort, 2, kExact);
}

TEST(EstimateToggleTest, LaterOfTwoWaysDecides) {
  // y = !(a & aa), aa being a twice inverted: falling, the path is complete
  // when both inverters are through; rising, the drive counted is that of both
  // PMOS, so the later one decides there too.
  CellBuilder builder("late");
  builder.Pins({"a", "y", "vdd", "vss"})
      .Inverter("a", "an", 1, 2)
      .Inverter("an", "aa", 1, 2);
  NStack(builder, "y", {"a", "aa"}, 2);
  PStack(builder, "y", {"a"}, 2);
  PStack(builder, "y", {"aa"}, 2);
  const CellEstimate estimate = MustEstimate(builder.Build());
  // an: load 3 on 3; aa: load 4 on 3.
  const Estimate fall = FindArc(estimate, "a", Edge::kFall).estimate;
  EXPECT_NEAR(fall.inner_effort, 1 + 4.0 / 3, kExact);
  EXPECT_NEAR(*fall.fixed_first_effort, 1, kExact);
  EXPECT_NEAR(fall.effort, 7.0 / 3, kExact);
  EXPECT_NEAR(fall.parasitic_by_nodes, 1 + 4.0 / 3 + 1 + 1 + 2, kExact);
  // Both PMOS conduct in the end: reference 6.
  const Estimate rise = FindArc(estimate, "a", Edge::kRise).estimate;
  EXPECT_NEAR(rise.inner_effort, 1 + 4.0 / 3, kExact);
  EXPECT_NEAR(rise.effort, 7.0 / 6, kExact);
  EXPECT_NEAR(rise.parasitic_by_nodes, 1 + 4.0 / 3 + 1 + 1 + 1, kExact);
}

}  // namespace
}  // namespace gatedyno
