// g of skewed and asymmetric gates against published tables.
//
// Sources, named in each row:
//   SSH  Sutherland, Sproull, Harris, Logical Effort, 1999; from memory.
//   WH   Weste, Harris, CMOS VLSI Design, 4th ed.; from memory, arithmetic
//        recomputed.
//   WHs  its published exercise solutions.

#include <cmath>

#include <gtest/gtest.h>

#include "harness/effort/estimate.h"
#include "tests/support/find_arc.h"
#include "tests/support/gates.h"

namespace gatedyno {
namespace {

// Fractions of small whole numbers, after a Cholesky solve.
constexpr double kExact = 1e-9;

struct SkewedGate {
  const char* name;
  const char* source;
  Cell cell;
  const char* pin;
  double up;
  double down;
  double average;
  double tolerance;
};

// Rows printed with three decimals.
constexpr double kThreeDecimals = 0.0005;

std::vector<SkewedGate> SkewedGates() {
  const double s = 0.4;  // Any skew will do.
  const double k = 3.0;
  return {
      {"HI-skew inverter",
       "common practice; WH",
       InverterCell(0.5, 2),
       "a",
       5.0 / 6,
       5.0 / 3,
       5.0 / 4,
       kExact},
      {"LO-skew inverter",
       "common practice; WH",
       InverterCell(1, 1),
       "a",
       4.0 / 3,
       2.0 / 3,
       1.0,
       kExact},
      {"HI-skew NAND2", "WH", NandCell(2, 1, 2), "b", 1, 2, 1.5, kExact},
      {"LO-skew NAND2", "WH", NandCell(2, 2, 1), "b", 2, 1, 1.5, kExact},
      {"HI-skew NOR2", "WH", NorCell(2, 0.5, 4), "b", 1.5, 3, 2.25, kExact},
      {"LO-skew NOR2", "WH", NorCell(2, 1, 2), "b", 2, 1, 1.5, kExact},
      {"HI-skew NAND3",
       "by counting",
       NandCell(3, 1.5, 2),
       "c",
       7.0 / 6,
       7.0 / 3,
       7.0 / 4,
       kExact},
      {"LO-skew NAND3",
       "by counting",
       NandCell(3, 3, 1),
       "c",
       8.0 / 3,
       4.0 / 3,
       2,
       kExact},
      {"HI-skew NOR3",
       "by counting",
       NorCell(3, 0.5, 6),
       "c",
       13.0 / 6,
       13.0 / 3,
       13.0 / 4,
       kExact},
      {"LO-skew NOR3",
       "by counting",
       NorCell(3, 1, 3),
       "c",
       8.0 / 3,
       4.0 / 3,
       2,
       kExact},
      {"inverter P 3, N 1",
       "course notes; average by counting",
       InverterCell(1, 3),
       "a",
       8.0 / 9,
       4.0 / 3,
       10.0 / 9,
       kExact},
      {"NAND3 LO-skew by 0.4",
       "WHs 9.11",
       NandCell(3, k, 2 * s),
       "a",
       (2 * s + k) / (3 * s),
       (2 * s + k) / 3,
       (2 + k + 2 * s + k / s) / 6,
       kExact},
      {"inverter P/N = sqrt 2",
       "by counting",
       InverterCell(1, std::sqrt(2.0)),
       "a",
       1.138,
       0.805,
       0.971,
       kThreeDecimals},
  };
}

TEST(SkewedGatesTest, SkewedGates) {
  for (const SkewedGate& gate : SkewedGates()) {
    SCOPED_TRACE(testing::Message() << gate.name << ": " << gate.source);
    const CellEstimate estimate = MustEstimate(gate.cell);
    const double up = FindArc(estimate, gate.pin, Edge::kRise).estimate.effort;
    const double down =
        FindArc(estimate, gate.pin, Edge::kFall).estimate.effort;
    EXPECT_NEAR(up, gate.up, gate.tolerance);
    EXPECT_NEAR(down, gate.down, gate.tolerance);
    EXPECT_NEAR((up + down) / 2, gate.average, gate.tolerance);
  }
}

// The critical input is c, at the output; a and b are next to the supply.
Cell AsymmetricNor3() {
  CellBuilder builder("nor3x");
  PinsOf(builder, 3);
  return builder.N("n1", "y", "a", "vss", 0.5)
      .N("n2", "y", "b", "vss", 0.5)
      .N("n3", "y", "c", "vss", 1)
      .P("p1", "y", "c", "x", 3.5)
      .P("p2", "x", "a", "w", 28.0 / 3)
      .P("p3", "w", "b", "vdd", 28.0 / 3)
      .Build();
}

// a is the early-out data input, b the reset.
Cell ResetNand2() {
  CellBuilder builder("nand2r");
  PinsOf(builder, 2);
  return builder.N("n1", "y", "a", "x", 4.0 / 3)
      .N("n2", "x", "b", "vss", 4)
      .P("p1", "y", "a", "vdd", 2)
      .P("p2", "y", "b", "vdd", 2)
      .Build();
}

// Symmetry factor s: the NMOS of a takes 1 - s of the resistance, b takes s.
Cell AsymmetricNand2(double s, double gamma) {
  CellBuilder builder("nand2x");
  PinsOf(builder, 2);
  return builder.N("n1", "y", "a", "x", 1 / (1 - s))
      .N("n2", "x", "b", "vss", 1 / s)
      .P("p1", "y", "a", "vdd", gamma)
      .P("p2", "y", "b", "vdd", gamma)
      .Build();
}

TEST(SkewedGatesTest, AsymmetricNor3OfExerciseSolution) {
  // WHs 9.12: critical g 1.5 with PMOS 3.5; others 28/3 and 1/2, g 3.28.
  const CellEstimate estimate = MustEstimate(AsymmetricNor3());
  EXPECT_NEAR(FindArc(estimate, "c", Edge::kRise).estimate.effort, 1.5, kExact);
  EXPECT_NEAR(FindArc(estimate, "c", Edge::kFall).estimate.effort, 1.5, kExact);
  EXPECT_NEAR(FindArc(estimate, "a", Edge::kRise).estimate.effort, 3.28, 0.005);
  EXPECT_NEAR(FindArc(estimate, "b", Edge::kRise).estimate.effort, 3.28, 0.005);
}

TEST(SkewedGatesTest, ResetNand2) {
  // WH, from memory: g of the data input 10/9, of the reset 2.
  const CellEstimate estimate = MustEstimate(ResetNand2());
  for (const Edge edge : {Edge::kRise, Edge::kFall}) {
    EXPECT_NEAR(FindArc(estimate, "a", edge).estimate.effort, 10.0 / 9, kExact);
    EXPECT_NEAR(FindArc(estimate, "b", edge).estimate.effort, 2.0, kExact);
  }
}

TEST(SkewedGatesTest, AsymmetricNand2AtAnySymmetryFactor) {
  // SSH, from memory.
  for (const double gamma : {1.0, 1.5, 2.0, 3.0}) {
    for (const double s : {0.1, 0.25, 0.5}) {
      const CellEstimate estimate =
          MustEstimate(AsymmetricNand2(s, gamma), gamma);
      for (const Edge edge : {Edge::kRise, Edge::kFall}) {
        EXPECT_NEAR(FindArc(estimate, "a", edge).estimate.effort,
                    (1 / (1 - s) + gamma) / (1 + gamma),
                    kExact);
        EXPECT_NEAR(FindArc(estimate, "b", edge).estimate.effort,
                    (1 / s + gamma) / (1 + gamma),
                    kExact);
      }
    }
  }
}

}  // namespace
}  // namespace gatedyno
