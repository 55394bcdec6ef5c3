// That the drawings of all built-in cells say what their netlists say.

#include <filesystem>

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "harness/flow/cell_circuit.h"
#include "harness/netlist/reader.h"
#include "harness/node/process_node.h"
#include "harness/page/circuit_layout.h"
#include "tests/page/drawn_wires.h"

namespace gatedyno {
namespace {

TEST(BuiltInDrawingsTest, SayWhatTheNetlistsSay) {
  const std::filesystem::path source = GATEDYNO_SOURCE_DIR;
  const Result<ProcessNode> node =
      LoadNode((source / "models" / "p45.json").string());
  ASSERT_TRUE(node.ok()) << node.error().message;
  int cells_drawn = 0;
  for (const auto& file :
       std::filesystem::directory_iterator(source / "decks" / "cells")) {
    const Result<std::vector<Cell>> cells =
        ReadCellFile(file.path(), ReaderOptionsOf(*node));
    ASSERT_TRUE(cells.ok()) << cells.error().message;
    for (const Cell& cell : *cells) {
      const Circuit circuit = CircuitOf(cell);
      size_t devices = 0;
      for (const CircuitStage& stage : circuit.stages) {
        const StageLayout layout = LayOutStage(circuit, stage);
        devices += layout.devices.size();
        EXPECT_THAT(FaultsOf(circuit, stage, layout), ::testing::IsEmpty())
            << cell.name;
      }
      EXPECT_EQ(devices, cell.mosfets.size()) << cell.name;
      ++cells_drawn;
    }
  }
  EXPECT_GE(cells_drawn, 41);
}

}  // namespace
}  // namespace gatedyno
