// Process parameters, supplies and temperatures move each card the right way.
// All directions asserted here are common practice.

#include <set>
#include <string>

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "tests/models/card_bench.h"

namespace gatedyno {
namespace {

class NodeCorners : public testing::TestWithParam<std::string_view> {
 protected:
  static InverterFigures Inverter(const CardNode& node,
                                  const Conditions& conditions) {
    const auto inverter = MeasureInverter(node, conditions);
    EXPECT_TRUE(inverter.ok()) << inverter.error().message;
    return inverter.value_or(InverterFigures{});
  }
  static InverterFigures Inverter(const CardNode& node,
                                  const std::string& process) {
    return Inverter(node, NominalConditions(node, process, 25.0));
  }
};

// Every name the deck may set but ktox (below); +1 raises, -1 lowers, 0 leaves
// alone the on-current of the n and the p device.
struct ParameterCase {
  const char* name;
  double step;
  int n;
  int p;
};
constexpr ParameterCase kParameters[] = {
    {"dvth_n", 0.02, -1, 0},
    {"dvth_p", 0.02, 0, -1},
    {"kmob_n", 0.05, 1, 0},
    {"kmob_p", 0.05, 0, 1},
    {"dlen", 2e-9, -1, -1},
};
// A step must move a current by at least this much to count as applied.
constexpr double kMoves = 0.003;
// Other device: the same figure again, but for the simulator's tolerance.
constexpr double kStays = 1e-6;

void ExpectMove(double before, double after, int direction, const char* what) {
  const double change = after / before - 1;
  if (direction == 0) {
    EXPECT_NEAR(change, 0.0, kStays) << what;
  } else {
    EXPECT_GT(change * direction, kMoves) << what;
  }
}

TEST_P(NodeCorners, EachParameterMovesItsDevice) {
  const CardNode node = LoadCardNode(GetParam());
  const Conditions typical = NominalConditions(node, "typical", 25.0);
  const auto before = MeasureOnCurrents(node, typical);
  ASSERT_TRUE(before.ok()) << before.error().message;
  ASSERT_EQ(typical.process.size(), std::size(kParameters) + 1);
  for (const ParameterCase& row : kParameters) {
    Conditions moved = typical;
    moved.process.at(row.name) += row.step;
    const auto after = MeasureOnCurrents(node, moved);
    ASSERT_TRUE(after.ok()) << after.error().message;
    ExpectMove(before->n_a_per_m, after->n_a_per_m, row.n, row.name);
    ExpectMove(before->p_a_per_m, after->p_a_per_m, row.p, row.name);
  }
}

// Oxide moves the on-current both ways: less charge, but more barrier lowering
// and less field on the mobility.  Barrier lowering goes one way only.
TEST_P(NodeCorners, ThickerOxideLowersTheBarrierMore) {
  const CardNode node = LoadCardNode(GetParam());
  const Conditions typical = NominalConditions(node, "typical", 25.0);
  Conditions thick = typical;
  thick.process.at("ktox") = 1.03;
  for (const char polarity : {'n', 'p'}) {
    const auto before = MeasureDevice(node, polarity, typical);
    const auto after = MeasureDevice(node, polarity, thick);
    ASSERT_TRUE(before.ok()) << before.error().message;
    ASSERT_TRUE(after.ok()) << after.error().message;
    EXPECT_GT(after->barrier_lowering, 1.005 * before->barrier_lowering)
        << polarity;
  }
}

TEST_P(NodeCorners, FastIsFasterAndSlowIsSlowerOnBothEdges) {
  const CardNode node = LoadCardNode(GetParam());
  const InverterFigures typical = Inverter(node, "typical");
  const InverterFigures fast = Inverter(node, "fast");
  const InverterFigures slow = Inverter(node, "slow");
  EXPECT_LT(fast.fo4_rise_s, typical.fo4_rise_s);
  EXPECT_LT(fast.fo4_fall_s, typical.fo4_fall_s);
  EXPECT_GT(slow.fo4_rise_s, typical.fo4_rise_s);
  EXPECT_GT(slow.fo4_fall_s, typical.fo4_fall_s);
  // A global spread of 10 to 20 % either way (from memory).
  EXPECT_THAT(typical.fo4_s / fast.fo4_s,
              testing::AllOf(testing::Gt(1.08), testing::Lt(1.25)));
  EXPECT_THAT(slow.fo4_s / typical.fo4_s,
              testing::AllOf(testing::Gt(1.08), testing::Lt(1.25)));
}

TEST_P(NodeCorners, CrossedCornersSkewTheEdges) {
  const CardNode node = LoadCardNode(GetParam());
  const InverterFigures typical = Inverter(node, "typical");
  const InverterFigures fast_n = Inverter(node, "fastn_slowp");
  const InverterFigures fast_p = Inverter(node, "slown_fastp");
  EXPECT_LT(fast_n.fo4_fall_s, typical.fo4_fall_s);
  EXPECT_GT(fast_n.fo4_rise_s, typical.fo4_rise_s);
  EXPECT_GT(fast_p.fo4_fall_s, typical.fo4_fall_s);
  EXPECT_LT(fast_p.fo4_rise_s, typical.fo4_rise_s);
}

TEST_P(NodeCorners, LowSupplyIsSlowerAndHighSupplyFaster) {
  const CardNode node = LoadCardNode(GetParam());
  Conditions conditions = NominalConditions(node, "typical", 25.0);
  const double nominal_s = Inverter(node, conditions).fo4_s;
  conditions.supply_v = 0.9 * node.supply_v;
  EXPECT_GT(Inverter(node, conditions).fo4_s, nominal_s);
  conditions.supply_v = 1.1 * node.supply_v;
  EXPECT_LT(Inverter(node, conditions).fo4_s, nominal_s);
}

// Least rise of the off-current from 25 to 125 C: a leaky short channel rises
// less than the ten times of a long one (from memory).
constexpr double kLeakageRise = 3.0;

// At these supplies mobility outweighs threshold.
TEST_P(NodeCorners, HotIsSlowerAndLeaksMore) {
  const CardNode node = LoadCardNode(GetParam());
  double previous_s = 0.0;
  for (const double temperature_c : {-40.0, 25.0, 125.0}) {
    const double fo4_s =
        Inverter(node, NominalConditions(node, "typical", temperature_c)).fo4_s;
    EXPECT_GT(fo4_s, previous_s) << temperature_c;
    previous_s = fo4_s;
  }
  for (const char polarity : {'n', 'p'}) {
    const auto cold =
        MeasureDevice(node, polarity, NominalConditions(node, "typical", 25.0));
    const auto hot = MeasureDevice(
        node, polarity, NominalConditions(node, "typical", 125.0));
    ASSERT_TRUE(cold.ok()) << cold.error().message;
    ASSERT_TRUE(hot.ok()) << hot.error().message;
    EXPECT_GT(hot->off_a_per_m, kLeakageRise * cold->off_a_per_m) << polarity;
  }
}

// The names say process, supply and temperature; `typical` comes first, at the
// node's own supply and 25 C.
TEST_P(NodeCorners, ListCoversEveryProcessSupplyAndTemperature) {
  const CardNode node = LoadCardNode(GetParam());
  std::set<std::string> names;
  std::set<std::tuple<std::string, double, double>> combinations;
  for (const auto& corner : node.corners) {
    names.insert(corner.at("name"));
    combinations.emplace(corner.at("process"),
                         corner.at("supply_v"),
                         corner.at("temperature_c"));
  }
  const size_t expected = node.processes.size() * 3 * 3;
  EXPECT_EQ(names.size(), expected);
  EXPECT_EQ(combinations.size(), expected);
  EXPECT_EQ(node.corners.front().at("name"), "typical");
  EXPECT_EQ(node.corners.front().at("process"), "typical");
  EXPECT_EQ(node.corners.front().at("supply_v"), node.supply_v);
  EXPECT_EQ(node.corners.front().at("temperature_c"), 25);
}

// Widest factor between a corner's on-current and the typical one's.
constexpr double kCornerFactor = 2.0;

TEST_P(NodeCorners, EveryCornerConducts) {
  const CardNode node = LoadCardNode(GetParam());
  const auto typical =
      MeasureOnCurrents(node, NominalConditions(node, "typical", 25.0));
  ASSERT_TRUE(typical.ok()) << typical.error().message;
  for (const auto& corner : node.corners) {
    const auto currents =
        MeasureOnCurrents(node,
                          {node.processes.at(corner.at("process")),
                           corner.at("supply_v"),
                           corner.at("temperature_c")});
    ASSERT_TRUE(currents.ok()) << corner << currents.error().message;
    for (const double ratio : {currents->n_a_per_m / typical->n_a_per_m,
                               currents->p_a_per_m / typical->p_a_per_m}) {
      EXPECT_GT(ratio, 1 / kCornerFactor) << corner;
      EXPECT_LT(ratio, kCornerFactor) << corner;
    }
  }
}

INSTANTIATE_TEST_SUITE_P(Cards,
                         NodeCorners,
                         testing::ValuesIn(kNodes),
                         [](const auto& row) {
                           return std::string(row.param);
                         });

}  // namespace
}  // namespace gatedyno
