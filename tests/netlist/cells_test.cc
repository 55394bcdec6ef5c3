// The built-in cells: that all of them read, and that each is the cell its
// name says, by its pins and by the gate and drain widths that decide its hand
// numbers.  At the drive of the reference inverter (3 units of gate), g of a
// pin is its gate width / 3 and p is the drain width on the output / 3.

#include <algorithm>
#include <filesystem>
#include <map>
#include <set>
#include <string>
#include <vector>

#include <fmt/format.h>
#include <fmt/ranges.h>
#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "harness/base/file.h"
#include "harness/netlist/reader.h"
#include "tests/netlist/read_text.h"

namespace gatedyno {
namespace {

struct BuiltInCell {
  const char* name;
  const char* pins;
  size_t devices;
  const char* gate_units;  // By input, in pin order.
  double output_units;     // Drain width on the output.
};

// Units are counted by hand from the sizing rules; those of the published
// gates follow from g and p in Sutherland, Sproull, Harris, Logical Effort,
// 1999, and Weste, Harris, CMOS VLSI Design, 4th ed. (both from memory).
constexpr BuiltInCell kCells[] = {
    {"inv", "a y", 2, "3", 3},
    {"inv_hi", "a y", 2, "5", 5},
    {"inv_lo", "a y", 2, "2", 2},
    {"inv_x2", "a y", 2, "6", 6},
    {"inv_hi_x2", "a y", 2, "10", 10},
    {"inv_lo_x2", "a y", 2, "4", 4},
    {"inv_hi_grid", "a y", 2, "8", 8},
    {"inv_lo_grid", "a y", 2, "4", 4},
    // g 4/3, 5/3, 2 and p 2, 3, 4; NOR: g 5/3, 7/3, 3.
    {"nand2", "a b y", 4, "4 4", 6},
    {"nand3", "a b c y", 6, "5 5 5", 9},
    {"nand4", "a b c d y", 8, "6 6 6 6", 12},
    {"nor2", "a b y", 4, "5 5", 6},
    {"nor3", "a b c y", 6, "7 7 7", 9},
    {"nor4", "a b c d y", 8, "9 9 9 9", 12},
    {"nand2_hi", "a b y", 4, "3 3", 5},
    {"nand2_lo", "a b y", 4, "3 3", 4},
    {"nand3_hi", "a b c y", 6, "7 7 7", 15},
    {"nand3_lo", "a b c y", 6, "4 4 4", 6},
    {"nor2_hi", "a b y", 4, "9 9", 10},
    {"nor2_lo", "a b y", 4, "3 3", 4},
    {"nor3_hi", "a b c y", 6, "13 13 13", 15},
    {"nor3_lo", "a b c y", 6, "4 4 4", 6},
    // g_a 10/9, g_b 2.
    {"nand2_asym", "a b y", 4, "3.333 6", 5.3333333333},
    // Twice the published g 1.5, 3.28, 3.28 times 3.
    {"nor3_asym", "a b c y", 6, "9 19.67 19.67", 11},
    // g 2, 2, 5/3; p 7/3.
    {"aoi21", "a b c y", 6, "6 6 5", 7},
    {"aoi22", "a b c d y", 8, "6 6 6 6", 12},
    // g 8/3, 8/3, 7/3; p 11/3 (Smith, Application-Specific Integrated
    // Circuits, 1997, from memory).
    {"aoi221", "a b c d e y", 10, "8 8 8 8 7", 11},
    // g 5/3, 8/3; p 16/3.
    {"aoi22_or", "a b c d e y", 10, "5 8 8 8 8", 16},
    // g 2, 2, 4/3; p 8/3.
    {"oai21", "a b c y", 6, "6 6 4", 8},
    {"oai22", "a b c d y", 8, "6 6 6 6", 12},
    // g 16/3, 16/3, 5/3.
    {"maj3_dual", "a b c y", 10, "16 16 5", 13},
    // g 4, 4, 2; p 4.
    {"maj3_rep", "a b c y", 10, "12 12 6", 12},
    // Bundles of 4, half of each on the input, and the inverter's 3.
    {"xor2", "a b y", 12, "9 9", 12},
    {"xnor2", "a b y", 12, "9 9", 12},
    // Bundles of 6, 12, 6, the same way; inverters of 3, 6, 3.
    {"xor3_rep", "a b c y", 22, "12 24 12", 18},
    // g 2 per data input; half of the bundle of 4 and the inverter on s.
    {"muxi2", "d0 d1 s y", 10, "6 6 9", 12},
    {"muxi3", "d0 d1 d2 s0 s1 y", 18, "9 9 6 12 11", 15},
    {"buf", "a y", 4, "3", 9},
    {"and2", "a b y", 6, "4 4", 6},
    {"or2", "a b y", 6, "5 5", 6},
    // g 5, 5, 5, 2; p 5.
    {"sum3_rep", "a b c con y", 14, "15 15 15 6", 15},
};

constexpr double kUnitWidthM = 90e-9;
// Widths are sums of a few products: rounding only.
constexpr double kTolerance = 1e-9;

std::filesystem::path CellsFolder() {
  return std::filesystem::path(GATEDYNO_SOURCE_DIR) / "decks/cells";
}

Cell ReadBuiltIn(const std::string& name) {
  ReaderOptions options = TestOptions();
  options.parameters = {{"wunit", kUnitWidthM}, {"lgate", 45e-9}};
  Result<std::vector<Cell>> cells =
      ReadCellFile(CellsFolder() / (name + ".sp"), options);
  if (!cells.ok() || cells->size() != 1) {
    ADD_FAILURE() << (cells.ok() ? name : cells.error().message);
    return {};
  }
  return cells->front();
}

std::string PinNames(const Cell& cell) {
  std::vector<std::string> names;
  for (const NetId pin : cell.pins) {
    names.push_back(cell.net_name(pin));
  }
  return fmt::format("{}", fmt::join(names, " "));
}

double GateUnits(const Cell& cell, NetId net) {
  double units = 0.0;
  for (const Mosfet& mosfet : cell.mosfets) {
    units += mosfet.gate == net ? mosfet.total_width_m() / kUnitWidthM : 0.0;
  }
  return units;
}

double DrainUnits(const Cell& cell, NetId net) {
  double units = 0.0;
  for (const Mosfet& mosfet : cell.mosfets) {
    units += mosfet.drain == net ? mosfet.total_width_m() / kUnitWidthM : 0.0;
  }
  return units;
}

// Output, power and ground come last.
constexpr size_t kPinsAfterInputs = 3;

std::string InputUnits(const Cell& cell) {
  std::vector<std::string> units;
  for (size_t i = 0; i + kPinsAfterInputs < cell.pins.size(); ++i) {
    units.push_back(fmt::format("{:.4g}", GateUnits(cell, cell.pins[i])));
  }
  return fmt::format("{}", fmt::join(units, " "));
}

TEST(BuiltInCells, AreAsTheirNamesSay) {
  for (const BuiltInCell& expected : kCells) {
    SCOPED_TRACE(expected.name);
    const Cell cell = ReadBuiltIn(expected.name);
    ASSERT_GT(cell.pins.size(), kPinsAfterInputs);
    EXPECT_EQ(cell.name, expected.name);
    EXPECT_EQ(PinNames(cell), std::string(expected.pins) + " vdd vss");
    EXPECT_EQ(cell.mosfets.size(), expected.devices);
    EXPECT_EQ(InputUnits(cell), expected.gate_units);
    const NetId output = cell.pins[cell.pins.size() - kPinsAfterInputs];
    EXPECT_NEAR(DrainUnits(cell, output), expected.output_units, kTolerance);
    EXPECT_THAT(cell.warnings, testing::IsEmpty());
  }
}

TEST(BuiltInCells, AreOneAFileAndAllInTheTable) {
  std::set<std::string> in_table;
  for (const BuiltInCell& cell : kCells) {
    in_table.insert(std::string(cell.name) + ".sp");
  }
  std::set<std::string> in_folder;
  for (const auto& entry : std::filesystem::directory_iterator(CellsFolder())) {
    in_folder.insert(entry.path().filename().string());
  }
  EXPECT_EQ(in_folder, in_table);
}

TEST(BuiltInCells, KeepTheHouseStyle) {
  for (const BuiltInCell& expected : kCells) {
    SCOPED_TRACE(expected.name);
    const Result<std::string> text =
        ReadFile(CellsFolder() / (std::string(expected.name) + ".sp"));
    ASSERT_TRUE(text.ok());
    // Two lines or more that say what it is for and how it is sized.
    EXPECT_THAT(*text, testing::MatchesRegex("\\* [^\n]*\n\\* (.|\n)*"));
    EXPECT_THAT(*text, testing::HasSubstr("Sizing: "));
  }
}

// Bodies at their rails, the same length everywhere, and no device narrower
// than the unit: the unit is the node's narrowest width.
TEST(BuiltInCells, UseTheNodesParameters) {
  for (const BuiltInCell& expected : kCells) {
    SCOPED_TRACE(expected.name);
    const Cell cell = ReadBuiltIn(expected.name);
    for (const Mosfet& mosfet : cell.mosfets) {
      const bool is_n = mosfet.polarity == Polarity::kN;
      EXPECT_EQ(mosfet.body, is_n ? cell.ground : cell.power) << mosfet.name;
      EXPECT_EQ(mosfet.length_m, 45e-9) << mosfet.name;
      EXPECT_GE(mosfet.width_m, kUnitWidthM * (1 - kTolerance)) << mosfet.name;
    }
  }
}

}  // namespace
}  // namespace gatedyno
