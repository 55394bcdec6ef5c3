#include "harness/page/circuit_layout.h"

#include <algorithm>
#include <random>
#include <string>
#include <vector>

#include <fmt/format.h>
#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "tests/page/drawn_wires.h"
#include "tests/support/test_circuit.h"

namespace gatedyno {
namespace {

using ::testing::ElementsAre;
using ::testing::IsEmpty;

// "mp_a: column 0, slot 0", in netlist order.
std::vector<std::string> PlacesOf(const Circuit& circuit) {
  std::vector<std::string> places;
  for (const PlacedDevice& device :
       LayOutStage(circuit, circuit.stages.front()).devices) {
    places.push_back(fmt::format("{}: column {}, slot {}",
                                 circuit.devices[device.between.device].name,
                                 device.column,
                                 device.slot));
  }
  return places;
}

TEST(CircuitLayoutTest, AStackIsOneColumnInItsOrder) {
  EXPECT_THAT(PlacesOf(Nand2Circuit()),
              ElementsAre("mp_a: column 0, slot 0",
                          "mp_b: column 1, slot 0",
                          "mn_a: column 0, slot 1",
                          "mn_b: column 0, slot 2"));
}

TEST(CircuitLayoutTest, ADeviceOverSeveralRowsIsInTheMiddle) {
  const Circuit circuit = CircuitBuilder()
                              .N("m1", "y", "a", "n1")
                              .N("m2", "n1", "b", "n2")
                              .N("m3", "n2", "c", "vss")
                              .N("m4", "y", "d", "vss")
                              .Stage({"y"});
  EXPECT_THAT(PlacesOf(circuit),
              ElementsAre("m1: column 0, slot 1",
                          "m2: column 0, slot 2",
                          "m3: column 0, slot 3",
                          "m4: column 1, slot 2"));
}

TEST(CircuitLayoutTest, AnOutputReachesTheRightEdge) {
  const Circuit circuit = Nand2Circuit();
  const StageLayout layout = LayOutStage(circuit, circuit.stages[0]);
  EXPECT_EQ(layout.columns, 2);
  for (const PlacedNet& net : layout.nets) {
    if (net.net.name == "y") {
      EXPECT_EQ(net.first_column, 0);
      EXPECT_EQ(net.last_column, 2);
      EXPECT_THAT(net.dots, ElementsAre(0, 1));
    }
    if (net.net.name == "n1") {
      EXPECT_EQ(net.last_column, 0);
      EXPECT_THAT(net.dots, IsEmpty());
    }
  }
}

// As in the middle of a parity gate: what crosses gets a track of its own.
TEST(CircuitLayoutTest, BarsThatCrossLieOnTracksOfTheirOwn) {
  const Circuit circuit = CircuitBuilder()
                              .N("m1", "n3", "b", "n1")
                              .N("m2", "n3", "bn", "n2")
                              .N("m3", "n4", "bn", "n1")
                              .N("m4", "n4", "b", "n2")
                              .N("m5", "y", "c", "n3")
                              .N("m6", "y", "cn", "n4")
                              .N("m7", "n1", "a", "vss")
                              .N("m8", "n2", "an", "vss")
                              .Stage({"y"});
  const StageLayout layout = LayOutStage(circuit, circuit.stages[0]);
  EXPECT_THAT(layout.tracks, ElementsAre(1, 1, 1, 2, 1));
  EXPECT_THAT(FaultsOf(circuit, circuit.stages[0], layout), IsEmpty());
}

TEST(CircuitLayoutTest, ABridgeSaysWhatItsNetlistSays) {
  const Circuit circuit = BridgeCircuit();
  EXPECT_THAT(
      FaultsOf(
          circuit, circuit.stages[0], LayOutStage(circuit, circuit.stages[0])),
      IsEmpty());
}

// Networks of no sense at all; the same ones every time.
TEST(CircuitLayoutTest, AnyNetworkSaysWhatItsNetlistSays) {
  constexpr int kNetworks = 300;
  constexpr int kMostDevices = 24;
  std::mt19937 random(20261202);
  const std::vector<std::string> nets = {
      "vdd", "vss", "y", "z", "n1", "n2", "n3", "n4", "n5", "n6", "n7"};
  const auto any = [&](size_t below) { return random() % below; };
  for (int i = 0; i < kNetworks; ++i) {
    CircuitBuilder builder;
    const size_t devices = 1 + any(kMostDevices);
    for (size_t device = 0; device < devices; ++device) {
      const std::string& drain = nets[any(nets.size())];
      const std::string& source = nets[any(nets.size())];
      builder.N(fmt::format("m{}", device), drain, "a", source);
    }
    const Circuit circuit = builder.Stage({"y", "z"});
    const StageLayout layout = LayOutStage(circuit, circuit.stages[0]);
    ASSERT_THAT(FaultsOf(circuit, circuit.stages[0], layout), IsEmpty())
        << "network " << i;
  }
}

// The pencil finds what is wrong.
TEST(CircuitLayoutTest, FaultsAreSeen) {
  const Circuit circuit = Nand2Circuit();
  const CircuitStage& stage = circuit.stages[0];
  const StageLayout good = LayOutStage(circuit, stage);
  ASSERT_THAT(FaultsOf(circuit, stage, good), IsEmpty());

  StageLayout lost = good;
  lost.devices.pop_back();
  EXPECT_THAT(FaultsOf(circuit, stage, lost),
              ElementsAre("mn_b is drawn 0 times"));

  StageLayout dotless = good;
  for (PlacedNet& net : dotless.nets) {
    net.dots.clear();
  }
  EXPECT_THAT(FaultsOf(circuit, stage, dotless),
              ElementsAre("dots are not where three wires meet"));

  StageLayout on_one = good;
  on_one.devices[1].column = 0;
  EXPECT_THAT(FaultsOf(circuit, stage, on_one),
              ::testing::Contains("mp_b lies on mp_a"));

  StageLayout joined = good;
  for (PlacedNet& net : joined.nets) {
    net.net.row = net.net.name == "n1" ? 1 : net.net.row;
  }
  EXPECT_THAT(FaultsOf(circuit, stage, joined),
              ::testing::Contains(::testing::HasSubstr(" touches ")));
}

}  // namespace
}  // namespace gatedyno
