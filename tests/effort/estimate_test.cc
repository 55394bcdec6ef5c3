// What a cell's estimate holds beyond the published tables.

#include "harness/effort/estimate.h"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "tests/support/arc_text.h"
#include "tests/support/bundle_gates.h"
#include "tests/support/find_arc.h"
#include "tests/support/gates.h"

namespace gatedyno {
namespace {

// Fractions of small whole numbers, after a Cholesky solve.
constexpr double kExact = 1e-9;

TEST(EstimateCellTest, FingersAndCopiesCountAsWidth) {
  // Two copies of an NMOS of width 1, in two fingers each, are one of width 2:
  // with PMOS of width 2 a NAND2 of the tables.
  Cell cell = NandCell(2, 1, 2);
  for (Mosfet& mosfet : cell.mosfets) {
    if (mosfet.polarity == Polarity::kN) {
      mosfet.multiplicity = 2.0;
      mosfet.fingers = 2.0;
    }
  }
  const Estimate found = FindArc(MustEstimate(cell), "a", Edge::kFall).estimate;
  EXPECT_NEAR(found.effort, 4.0 / 3, kExact);
}

// XOR3 is self-dual, and so is the pull-up that mirrors the pull-down: its g
// must not move with gamma.
TEST(EstimateCellTest, RepeatedNetworksDoNotMoveWithRatio) {
  using Build = Cell (*)(double gamma);
  const std::vector<Build> gates = {
      [](double g) { return InverterCell(1, g); },
      MajorityRepeatedCell,
      MajoritySymmetricCell,
      MirrorSumCell,
      [](double g) { return XorSharedCell(3, g); },
      [](double g) { return XorSymmetricCell(3, g); }};
  for (const Build build : gates) {
    const CellEstimate at_one = MustEstimate(build(1.0), 1.0);
    for (const double gamma : {1.5, 2.0, 3.0}) {
      const CellEstimate estimate = MustEstimate(build(gamma), gamma);
      EXPECT_TRUE(estimate.outputs.front().self_dual) << estimate.cell;
      EXPECT_TRUE(estimate.outputs.front().repeated_network) << estimate.cell;
      ASSERT_EQ(estimate.arcs.size(), at_one.arcs.size());
      for (size_t i = 0; i < at_one.arcs.size(); ++i) {
        EXPECT_NEAR(estimate.arcs[i].estimate.effort,
                    at_one.arcs[i].estimate.effort,
                    kExact)
            << estimate.cell << " at gamma " << gamma;
      }
    }
  }
}

struct Topology {
  Cell cell;
  std::string function;
  bool self_dual;
  bool repeated;
  int pull_down;
  int pull_up;
  int stages;
};

TEST(EstimateCellTest, DescribesTheTopology) {
  const std::vector<Topology> table = {
      {InverterCell(1, 2), "!a", true, true, 1, 1, 1},
      {NandCell(2, 2, 2), "!(a & b)", false, false, 2, 1, 1},
      {NorCell(3, 1, 6), "!(a | b | c)", false, false, 1, 3, 1},
      {Aoi21Cell(2), "!(a & b | c)", false, false, 2, 2, 1},
      {CompoundCell(2), "!(a & (b | c) | d & e)", false, false, 2, 3, 1},
      {MajorityRepeatedCell(2), "!(a & b | (a | b) & c)", true, true, 2, 2, 1},
      {MajorityDualCell(2), "!(a & b | (a | b) & c)", true, false, 2, 3, 1},
      {XorSharedCell(3, 2), "a ^ b ^ c", true, true, 3, 3, 2},
      {XorSharedCell(2, 2), "a ^ b", false, false, 2, 2, 2},
      {XorSymmetricCell(4, 2), "a ^ b ^ c ^ d", false, false, 4, 4, 2},
      {Mux2Cell(2), "!(d0 & !s | d1 & s)", false, false, 2, 2, 2},
  };
  for (const Topology& row : table) {
    SCOPED_TRACE(row.cell.name);
    const CellEstimate estimate = MustEstimate(row.cell);
    ASSERT_EQ(estimate.outputs.size(), 1U);
    const OutputEstimate& output = estimate.outputs.front();
    EXPECT_EQ(output.output, "y");
    EXPECT_EQ(output.kind, "complementary static");
    EXPECT_EQ(output.function, row.function);
    EXPECT_EQ(output.self_dual, row.self_dual);
    EXPECT_EQ(output.repeated_network, row.repeated);
    EXPECT_EQ(output.tallest_pull_down, row.pull_down);
    EXPECT_EQ(output.tallest_pull_up, row.pull_up);
    EXPECT_EQ(estimate.stages, row.stages);
  }
}

TEST(EstimateCellTest, ListsInputsInPinOrderAndArcsByPinThenEdge) {
  const CellEstimate estimate = MustEstimate(Aoi21Cell(2));
  EXPECT_THAT(estimate.inputs, testing::ElementsAre("a", "b", "c"));
  std::vector<std::string> arcs;
  for (const ArcEstimate& found : estimate.arcs) {
    arcs.push_back(ArcText(found.arc));
  }
  EXPECT_THAT(arcs,
              testing::ElementsAre("fall a->y rise b=1 c=0",
                                   "rise a->y fall b=1 c=0",
                                   "fall b->y rise a=1 c=0",
                                   "rise b->y fall a=1 c=0",
                                   "fall c->y rise a=1 b=0",
                                   "rise c->y fall a=1 b=0"));
}

TEST(EstimateCellTest, KeepsEverySideVectorOnRequest) {
  const CellEstimate estimate = MustEstimate(Aoi21Cell(2), 2.0, true);
  int of_c = 0;
  for (const ArcEstimate& found : estimate.arcs) {
    of_c += found.arc.pin == "c" ? 1 : 0;
  }
  // a=0 b=0, a=1 b=0, a=0 b=1, on two edges.
  EXPECT_EQ(of_c, 6);
  EXPECT_EQ(estimate.arcs.size(), 10U);
}

TEST(EstimateCellTest, SaysWhatTheHandNumbersLeaveOut) {
  CellBuilder builder("inv");
  PinsOf(builder, 1);
  const Cell cell = builder.N("m1", "y", "g", "vss", 1)
                        .P("m2", "y", "g", "vdd", 2, 1.2)
                        .R("r1", "a", "g", 10)
                        .C("c1", "y", "vss", 1e-16)
                        .C("c2", "a", "vss", 1e-16)
                        .Build();
  EXPECT_THAT(
      MustEstimate(cell).warnings,
      testing::ElementsAre(
          "lengths differ: hand numbers take gate load as W*L and drive as "
          "W/L, relative to the smallest length, 50 nm",
          "hand numbers take 1 resistor for a wire",
          "hand numbers leave out 2 capacitors"));
}

TEST(EstimateCellTest, LengthCountsInLoadAndDrive) {
  // PMOS of width 2 and relative length 1.25: drive 2 / 1.25, load 2 * 1.25.
  CellBuilder builder("inv");
  PinsOf(builder, 1);
  const Cell cell = builder.N("m1", "y", "a", "vss", 1)
                        .P("m2", "y", "a", "vdd", 2, 1.25)
                        .Build();
  const CellEstimate estimate = MustEstimate(cell);
  EXPECT_NEAR(FindArc(estimate, "a", Edge::kFall).estimate.effort,
              (1 + 2.5) / 3,
              kExact);
  EXPECT_NEAR(FindArc(estimate, "a", Edge::kRise).estimate.effort,
              (1 + 2.5) / (3 * 0.8),
              kExact);
}

TEST(EstimateCellTest, SaysWhichInputChangesNothing) {
  // b only loads: a dummy with both ends on one net.
  CellBuilder builder("inv");
  PinsOf(builder, 2);
  const Cell cell =
      builder.Inverter("a", "y", 1, 2).N("m1", "vss", "b", "vss", 1).Build();
  EXPECT_THAT(MustEstimate(cell).warnings,
              testing::ElementsAre("input b changes no output"));
}

}  // namespace
}  // namespace gatedyno
