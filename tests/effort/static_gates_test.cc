// g and p of complementary static gates, at several mobility ratios, against
// published tables.
//
// Sources, named in each row:
//   HL   Harris, lecture tables.
//   SSH  Sutherland, Sproull, Harris, Logical Effort, 1999; from memory.
//   WH   Weste, Harris, CMOS VLSI Design, 4th ed.; from memory, arithmetic
//        recomputed.
//   Smith  Application-Specific Integrated Circuits, 1997; from memory,
//        arithmetic recomputed.

#include <gtest/gtest.h>

#include "harness/effort/estimate.h"
#include "tests/support/find_arc.h"
#include "tests/support/gates.h"

namespace gatedyno {
namespace {

// Fractions of small whole numbers, after a Cholesky solve.
constexpr double kExact = 1e-9;

using OfGamma = double (*)(double gamma);

struct PinEffort {
  std::string pin;
  OfGamma effort;
  double at_two;  // As printed, gamma = 2.
};

struct StaticGate {
  const char* name;
  const char* source;
  Cell (*build)(double gamma);
  std::vector<PinEffort> efforts;
  OfGamma parasitic;  // By node count.
  double parasitic_at_two;
};

double Two(double /*gamma*/) {
  return 2.0;
}
double Four(double /*gamma*/) {
  return 4.0;
}
double Five(double /*gamma*/) {
  return 5.0;
}

template <int kInputs>
std::vector<PinEffort> AllInputs(OfGamma effort, double at_two) {
  std::vector<PinEffort> efforts;
  efforts.reserve(kInputs);
  for (int i = 0; i < kInputs; ++i) {
    efforts.push_back({InputName(i), effort, at_two});
  }
  return efforts;
}

template <int kInputs>
StaticGate Nand(const char* source) {
  const OfGamma effort = [](double g) { return (kInputs + g) / (1 + g); };
  const double at_two = (kInputs + 2) / 3.0;
  return {"NAND",
          source,
          [](double g) { return NandCell(kInputs, kInputs, g); },
          AllInputs<kInputs>(effort, at_two),
          // Every PMOS and one NMOS sit on the output.
          [](double g) { return kInputs * (1 + g) / (1 + g); },
          kInputs};
}

template <int kInputs>
StaticGate Nor(const char* source) {
  const OfGamma effort = [](double g) { return (1 + kInputs * g) / (1 + g); };
  const double at_two = (2 * kInputs + 1) / 3.0;
  return {"NOR",
          source,
          [](double g) { return NorCell(kInputs, 1, kInputs * g); },
          AllInputs<kInputs>(effort, at_two),
          [](double g) { return kInputs * (1 + g) / (1 + g); },
          kInputs};
}

std::vector<StaticGate> StaticGates() {
  return {
      {"inverter",
       "HL",
       [](double g) { return InverterCell(1, g); },
       {{"a", [](double) { return 1.0; }, 1}},
       [](double) { return 1.0; },
       1},
      Nand<2>("HL; general gamma SSH, from memory"),
      Nand<3>("HL; general gamma SSH, from memory"),
      Nand<4>("HL; general gamma SSH, from memory"),
      Nand<5>("HL; general gamma SSH, from memory"),
      Nor<2>("HL; general gamma SSH, from memory"),
      Nor<3>("HL; general gamma SSH, from memory"),
      Nor<4>("HL; general gamma SSH, from memory"),
      Nor<5>("HL; general gamma SSH, from memory"),
      {"AOI21",
       "WH",
       Aoi21Cell,
       {{"a", Two, 2},
        {"b", Two, 2},
        {"c", [](double g) { return (1 + 2 * g) / (1 + g); }, 5.0 / 3}},
       [](double g) { return (3 + 2 * g) / (1 + g); },
       7.0 / 3},
      {"AOI22",
       "WH",
       Aoi22Cell,
       {{"a", Two, 2}, {"b", Two, 2}, {"c", Two, 2}, {"d", Two, 2}},
       Four,
       4},
      {"OAI21, c at the output",
       "by counting",
       Oai21Cell,
       {{"a", Two, 2},
        {"b", Two, 2},
        {"c", [](double g) { return (2 + g) / (1 + g); }, 4.0 / 3}},
       [](double g) { return (2 + 3 * g) / (1 + g); },
       8.0 / 3},
      {"OAI21, c at the ground",
       "by counting",
       Oai21TurnedCell,
       {{"a", Two, 2},
        {"b", Two, 2},
        {"c", [](double g) { return (2 + g) / (1 + g); }, 4.0 / 3}},
       [](double g) { return (4 + 3 * g) / (1 + g); },
       10.0 / 3},
      {"OAI22",
       "by counting",
       Oai22Cell,
       {{"a", Two, 2}, {"b", Two, 2}, {"c", Two, 2}, {"d", Two, 2}},
       Four,
       4},
      {"!(a & (b | c) | d & e)",
       "WH; general gamma by counting",
       CompoundCell,
       {{"a", [](double g) { return (2 + 1.5 * g) / (1 + g); }, 5.0 / 3},
        {"b", [](double g) { return (2 + 3 * g) / (1 + g); }, 8.0 / 3},
        {"c", [](double g) { return (2 + 3 * g) / (1 + g); }, 8.0 / 3},
        {"d", [](double g) { return (2 + 3 * g) / (1 + g); }, 8.0 / 3},
        {"e", [](double g) { return (2 + 3 * g) / (1 + g); }, 8.0 / 3}},
       [](double g) { return (4 + 6 * g) / (1 + g); },
       16.0 / 3},
      {"AOI221",
       "Smith (g); general gamma by counting",
       Aoi221Cell,
       {{"a", [](double g) { return (2 + 3 * g) / (1 + g); }, 8.0 / 3},
        {"b", [](double g) { return (2 + 3 * g) / (1 + g); }, 8.0 / 3},
        {"c", [](double g) { return (2 + 3 * g) / (1 + g); }, 8.0 / 3},
        {"d", [](double g) { return (2 + 3 * g) / (1 + g); }, 8.0 / 3},
        {"e", [](double g) { return (1 + 3 * g) / (1 + g); }, 7.0 / 3}},
       [](double g) { return (5 + 3 * g) / (1 + g); },
       11.0 / 3},
      {"majority, symmetric",
       "SSH, from memory; p by counting",
       MajoritySymmetricCell,
       {{"a", Four, 4}, {"b", Four, 4}, {"c", Four, 4}},
       [](double) { return 6.0; },
       6},
      {"majority, repeated network",
       "SSH, from memory, arithmetic recomputed",
       MajorityRepeatedCell,
       {{"a", Four, 4}, {"b", Four, 4}, {"c", Two, 2}},
       Four,
       4},
      {"majority, series/parallel dual",
       "common practice; general gamma by counting",
       MajorityDualCell,
       {{"a", [](double g) { return (4 + 6 * g) / (1 + g); }, 16.0 / 3},
        {"b", [](double g) { return (4 + 6 * g) / (1 + g); }, 16.0 / 3},
        {"c", [](double g) { return (2 + 1.5 * g) / (1 + g); }, 5.0 / 3}},
       [](double g) { return (4 + 4.5 * g) / (1 + g); },
       13.0 / 3},
      {"sum of a mirror adder, d = inverted carry",
       "by counting",
       MirrorSumCell,
       {{"a", Five, 5}, {"b", Five, 5}, {"c", Five, 5}, {"d", Two, 2}},
       Five,
       5},
  };
}

TEST(StaticGatesTest, StaticGatesAtEveryRatio) {
  for (const StaticGate& gate : StaticGates()) {
    for (const double gamma : {1.0, 1.5, 2.0, 3.0}) {
      SCOPED_TRACE(testing::Message() << gate.name << " at gamma " << gamma
                                      << ": " << gate.source);
      const CellEstimate estimate = MustEstimate(gate.build(gamma), gamma);
      for (const PinEffort& pin : gate.efforts) {
        for (const Edge edge : {Edge::kRise, Edge::kFall}) {
          SCOPED_TRACE(testing::Message() << pin.pin << EdgeName(edge));
          const Estimate found = FindArc(estimate, pin.pin, edge).estimate;
          EXPECT_NEAR(found.effort, pin.effort(gamma), kExact);
          EXPECT_NEAR(found.parasitic_by_nodes, gate.parasitic(gamma), kExact);
        }
      }
    }
  }
}

TEST(StaticGatesTest, FormulasGiveThePrintedValuesAtRatioTwo) {
  for (const StaticGate& gate : StaticGates()) {
    SCOPED_TRACE(testing::Message() << gate.name << ": " << gate.source);
    const CellEstimate estimate = MustEstimate(gate.build(2.0));
    for (const PinEffort& pin : gate.efforts) {
      const Estimate found = FindArc(estimate, pin.pin, Edge::kRise).estimate;
      EXPECT_NEAR(found.effort, pin.at_two, kExact) << pin.pin;
      EXPECT_NEAR(found.parasitic_by_nodes, gate.parasitic_at_two, kExact);
    }
  }
}

TEST(StaticGatesTest, ScaleLeavesEverythingUnchanged) {
  for (const StaticGate& gate : StaticGates()) {
    const Cell cell = gate.build(2.0);
    const CellEstimate unit = MustEstimate(cell);
    for (const double scale : {2.0, 7.3}) {
      Cell scaled = cell;
      for (Mosfet& mosfet : scaled.mosfets) {
        mosfet.width_m *= scale;
      }
      const CellEstimate estimate = MustEstimate(scaled);
      ASSERT_EQ(estimate.arcs.size(), unit.arcs.size());
      for (size_t i = 0; i < unit.arcs.size(); ++i) {
        const Estimate& before = unit.arcs[i].estimate;
        const Estimate& after = estimate.arcs[i].estimate;
        EXPECT_EQ(estimate.arcs[i].arc, unit.arcs[i].arc);
        EXPECT_NEAR(after.effort, before.effort, kExact);
        EXPECT_NEAR(
            after.parasitic_by_nodes, before.parasitic_by_nodes, kExact);
        EXPECT_NEAR(
            after.parasitic_by_elmore, before.parasitic_by_elmore, kExact);
      }
    }
  }
}

}  // namespace
}  // namespace gatedyno
