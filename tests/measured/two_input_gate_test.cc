// Tau, p_inv, FO4 and two-input gates of every node against published figures
// and against public cards of the same nodes.

#include <string>

#include <gtest/gtest.h>

#include "tests/measured/lab.h"

namespace gatedyno {
namespace {

class NodeTest : public testing::TestWithParam<const char*> {};
INSTANTIATE_TEST_SUITE_P(Nodes, NodeTest, testing::ValuesIn(kNodes), ParamName);

// FO4 = (4 g + p_inv) tau with g = 1: an identity of the method, broken by a
// delay that is no line of the fanout.  Parasitic of an inverter between 0.8
// and 1.7: public cards of five nodes, 180 to 22 nm, run in ngspice 39.3.
TEST_P(NodeTest, InverterObeysTheMethod) {
  constexpr double kBend = 0.05;
  const RunResult result = MeasureCells(GetParam(), {"inv"});
  ASSERT_EQ(result.calibrations.size(), 1u);
  const Calibration& calibration = result.calibrations.front();
  const double p_inv = calibration.p_inv.value;
  EXPECT_NEAR(calibration.fo4_s / calibration.tau_s.value, 4 + p_inv, kBend);
  EXPECT_GT(p_inv, 0.8);
  EXPECT_LT(p_inv, 1.7);
}

// The outer input also moves the net between the devices of the stack.
TEST_P(NodeTest, OuterInputHasTheLargerParasitic) {
  const RunResult result = MeasureCells(GetParam(), {"nand2", "nor2"});
  for (const std::string cell : {"nand2", "nor2"}) {
    for (const Edge edge : {Edge::kRise, Edge::kFall}) {
      EXPECT_GT(FindRow(result, cell, "b", edge).parasitic.value,
                1.1 * FindRow(result, cell, "a", edge).parasitic.value)
          << cell << " " << EdgeName(edge);
    }
  }
}

struct BandRow {
  const char* node;
  const char* cell;
  const char* pin;  // a is the inner input, next to the output; b the outer.
  double effort;    // Mean of both edges.
};

// Other, public cards of the same nodes at P/N 2, run in ngspice 39.3: not
// published, and no more than a band.
constexpr BandRow kBandRows[] = {
    {"p180", "nand2", "a", 1.15},
    {"p180", "nand2", "b", 1.10},
    {"p180", "nor2", "a", 1.48},
    {"p180", "nor2", "b", 1.53},
    {"p130", "nand2", "a", 1.14},
    {"p130", "nand2", "b", 1.09},
    {"p130", "nor2", "a", 1.52},
    {"p130", "nor2", "b", 1.56},
    {"p65", "nand2", "a", 1.16},
    {"p65", "nand2", "b", 1.14},
    {"p65", "nor2", "a", 1.56},
    {"p65", "nor2", "b", 1.62},
    {"p45", "nand2", "a", 1.22},
    {"p45", "nand2", "b", 1.20},
    {"p45", "nor2", "a", 1.57},
    {"p45", "nor2", "b", 1.64},
};

TEST_P(NodeTest, EffortLiesInTheBandOfPublicCards) {
  constexpr double kBand = 0.10;  // Absolute: 6 to 9 % of g.
  const RunResult result = MeasureCells(GetParam(), {"nand2", "nor2"});
  for (const BandRow& row : kBandRows) {
    if (row.node == std::string(GetParam())) {
      EXPECT_NEAR(FindMean(result, row.cell, row.pin).effort, row.effort, kBand)
          << row.cell << " " << row.pin;
    }
  }
}

struct ParasiticRow {
  const char* node;
  double inner;  // Of a NAND2, in tau, mean of both edges.
  double outer;
};
constexpr ParasiticRow kParasiticRows[] = {
    {"p180", 2.7, 3.8},
    {"p130", 1.5, 2.1},
    {"p65", 1.8, 2.4},
    {"p45", 2.0, 2.7},
};

// A wide band: p is junction capacitance, and with it the drawn diffusion,
// which the runs above took from other layout rules than ours.
TEST_P(NodeTest, ParasiticLiesInTheBandOfPublicCards) {
  constexpr double kBand = 0.35;  // Relative.
  const RunResult result = MeasureCells(GetParam(), {"nand2"});
  for (const ParasiticRow& row : kParasiticRows) {
    if (row.node == std::string(GetParam())) {
      EXPECT_NEAR(FindMean(result, "nand2", "a").parasitic,
                  row.inner,
                  kBand * row.inner);
      EXPECT_NEAR(FindMean(result, "nand2", "b").parasitic,
                  row.outer,
                  kBand * row.outer);
    }
  }
}

// A two-input NAND's outer input at 180 nm, both edges over the mean tau:
// rising 4.5253 * 0.0039 ns and falling 2.8470 * 0.0039 ns a fanout at tau
// 12.4 ps.  Source: published exercise solutions to Weste, Harris, CMOS VLSI
// Design, earlier edition, 6.9.
TEST(PublishedNand2Test, OuterInputAt180Nm) {
  constexpr double kTolerance = 0.1;  // Another card, other layout rules.
  const RunResult result = MeasureCells("p180", {"nand2"});
  const auto effort = [&](Edge edge) {
    return FindRow(result, "nand2", "b", edge).effort_mean.value;
  };
  EXPECT_NEAR(effort(Edge::kRise), 1.42, kTolerance);
  EXPECT_NEAR(effort(Edge::kFall), 0.90, kTolerance);
  ASSERT_EQ(result.calibrations.size(), 1u);
  constexpr double kPublishedTau_s = 12.4e-12;
  EXPECT_NEAR(result.calibrations.front().tau_s.value / kPublishedTau_s,
              1.0,
              kTolerance);
}

}  // namespace
}  // namespace gatedyno
