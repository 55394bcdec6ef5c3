#include "harness/flow/cell_circuit.h"

#include <filesystem>
#include <string>
#include <vector>

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "harness/netlist/reader.h"
#include "harness/node/process_node.h"
#include "tests/support/cell_builder.h"

namespace gatedyno {
namespace {

using ::testing::ElementsAre;

Cell ReadBuiltIn(const std::string& name) {
  const std::filesystem::path source = GATEDYNO_SOURCE_DIR;
  const Result<ProcessNode> node =
      LoadNode((source / "models" / "p45.json").string());
  if (!node.ok()) {
    ADD_FAILURE() << node.error().message;
    return {};
  }
  const Result<std::vector<Cell>> cells = ReadCellFile(
      source / "decks" / "cells" / (name + ".sp"), ReaderOptionsOf(*node));
  if (!cells.ok() || cells->empty()) {
    ADD_FAILURE() << (cells.ok() ? name : cells.error().message);
    return {};
  }
  return cells->front();
}

// "y: mp_a mn_a", one a stage.
std::vector<std::string> StagesOf(const Circuit& circuit) {
  std::vector<std::string> stages;
  for (const CircuitStage& stage : circuit.stages) {
    std::string text;
    for (const std::string& output : stage.outputs) {
      text += output;
    }
    text += ':';
    for (const size_t device : stage.devices) {
      text += ' ' + circuit.devices[device].name;
    }
    stages.push_back(text);
  }
  return stages;
}

// The netlist's own lines: decks/cells/nor2.sp at p45, wunit 90 nm.
TEST(CellCircuitTest, DevicesAreTheNetlists) {
  const Circuit circuit = CircuitOf(ReadBuiltIn("nor2"));
  EXPECT_EQ(circuit.power, "vdd");
  EXPECT_EQ(circuit.ground, "vss");
  ASSERT_EQ(circuit.devices.size(), 4U);
  EXPECT_EQ(circuit.devices[0],
            (CircuitDevice{"mp_a", true, "a", "y", "p1", 360e-9, 45e-9}));
  EXPECT_EQ(circuit.devices[3],
            (CircuitDevice{"mn_b", false, "b", "y", "vss", 90e-9, 45e-9}));
  EXPECT_THAT(StagesOf(circuit), ElementsAre("y: mp_a mp_b mn_a mn_b"));
}

TEST(CellCircuitTest, StagesComeAfterThoseThatGateThem) {
  EXPECT_THAT(StagesOf(CircuitOf(ReadBuiltIn("buf"))),
              ElementsAre("yn: mp_1 mn_1", "y: mp_2 mn_2"));
  const std::vector<std::string> stages =
      StagesOf(CircuitOf(ReadBuiltIn("muxi3")));
  ASSERT_EQ(stages.size(), 3U);
  EXPECT_EQ(stages[0], "s0n: mp_s0n mn_s0n");
  EXPECT_EQ(stages[1], "s1n: mp_s1n mn_s1n");
  EXPECT_EQ(stages[2].substr(0, 2), "y:");
}

// Copies as one width; nets on both sides of a resistor as one net.
TEST(CellCircuitTest, CopiesAndResistorsAreTakenTogether) {
  Cell cell = CellBuilder("own")
                  .Pins({"a", "y", "vdd", "vss"})
                  .P("mp", "y", "a", "vdd", 4)
                  .N("mn", "y_far", "a", "vss", 2)
                  .R("r1", "y", "y_far", 100.0)
                  .Build();
  cell.mosfets[0].multiplicity = 3;
  const Circuit circuit = CircuitOf(cell);
  ASSERT_EQ(circuit.devices.size(), 2U);
  EXPECT_DOUBLE_EQ(circuit.devices[0].width_m, 1200e-9);
  EXPECT_EQ(circuit.devices[1].drain, "y");
}

TEST(CellCircuitTest, DummiesAreKeptOutsideTheStages) {
  const Circuit circuit = CircuitOf(CellBuilder("own")
                                        .Pins({"a", "y", "vdd", "vss"})
                                        .Inverter("a", "y", 1, 2)
                                        .N("dummy", "y", "vss", "y", 1)
                                        .N("off", "vdd", "vss", "vss", 1)
                                        .Build());
  EXPECT_EQ(circuit.devices.size(), 4U);
  EXPECT_THAT(StagesOf(circuit), ElementsAre("y: yn yp"));
}

TEST(CellCircuitTest, IsEmptyForACellThatIsNotAnalysed) {
  const Cell latch = CellBuilder("latch")
                         .Pins({"y", "vdd", "vss"})
                         .Inverter("y", "yn", 1, 2)
                         .Inverter("yn", "y", 1, 2)
                         .Build();
  EXPECT_EQ(CircuitOf(latch), Circuit());
}

}  // namespace
}  // namespace gatedyno
