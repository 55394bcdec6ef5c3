// The built-in cells, through the reader.
//
// Expected numbers are those by which each cell was drawn (the comments of the
// cell files), and so the published ones of estimate_test.cc; functions are
// written down from what the cell is for.

#include <algorithm>
#include <filesystem>

#include <gtest/gtest.h>

#include "harness/effort/bundle.h"
#include "harness/node/process_node.h"
#include "tests/support/find_arc.h"

namespace gatedyno {
namespace {

constexpr double kExact = 1e-6;  // Some netlists write thirds in digits.

std::filesystem::path SourceFolder() {
  return GATEDYNO_SOURCE_DIR;
}

ReaderOptions OptionsOfNode() {
  const Result<ProcessNode> node =
      LoadNode((SourceFolder() / "models" / "p45.json").string());
  EXPECT_TRUE(node.ok()) << node.error().message;
  return ReaderOptionsOf(*node);
}

Cell ReadBuiltIn(const std::string& name) {
  const Result<std::vector<Cell>> cells = ReadCellFile(
      SourceFolder() / "decks" / "cells" / (name + ".sp"), OptionsOfNode());
  if (!cells.ok() || cells->empty()) {
    ADD_FAILURE() << (cells.ok() ? name : cells.error().message);
    return {};
  }
  return cells->front();
}

TEST(BuiltInCellsTest, EveryInputOfEveryCellHasBothEdges) {
  const ReaderOptions options = OptionsOfNode();
  int count = 0;
  for (const auto& file : std::filesystem::directory_iterator(
           SourceFolder() / "decks" / "cells")) {
    const Result<std::vector<Cell>> cells = ReadCellFile(file.path(), options);
    ASSERT_TRUE(cells.ok()) << cells.error().message;
    for (const Cell& cell : *cells) {
      const CellEstimate estimate = MustEstimate(cell);
      EXPECT_TRUE(estimate.warnings.empty()) << cell.name;
      for (const std::string& input : estimate.inputs) {
        for (const Edge edge : {Edge::kRise, Edge::kFall}) {
          EXPECT_GT(FindArc(estimate, input, edge).estimate.effort, 0.0);
        }
      }
      ++count;
    }
  }
  EXPECT_GE(count, 35);
}

struct CellRow {
  std::string cell;
  std::string function;
  std::string pin;
  double up;
  double down;
  double parasitic;  // Rising, by node count.
};

std::vector<CellRow> CellRows() {
  return {
      {"inv", "!a", "a", 1, 1, 1},
      {"inv_x2", "!a", "a", 1, 1, 1},
      {"inv_hi", "!a", "a", 5.0 / 6, 5.0 / 3, 5.0 / 6},
      {"inv_hi_x2", "!a", "a", 5.0 / 6, 5.0 / 3, 5.0 / 6},
      {"inv_hi_grid", "!a", "a", 8.0 / 9, 4.0 / 3, 8.0 / 9},
      {"inv_lo", "!a", "a", 4.0 / 3, 2.0 / 3, 4.0 / 3},
      {"inv_lo_grid", "!a", "a", 4.0 / 3, 2.0 / 3, 4.0 / 3},
      {"nand2", "!(a & b)", "a", 4.0 / 3, 4.0 / 3, 2},
      {"nand2_hi", "!(a & b)", "b", 1, 2, 5.0 / 3},
      {"nand2_lo", "!(a & b)", "b", 2, 1, 8.0 / 3},
      {"nand2_asym", "!(a & b)", "a", 10.0 / 9, 10.0 / 9, 16.0 / 9},
      {"nand2_asym", "!(a & b)", "b", 2, 2, 16.0 / 9},
      {"nand3", "!(a & b & c)", "c", 5.0 / 3, 5.0 / 3, 3},
      {"nand4", "!(a & b & c & d)", "d", 2, 2, 4},
      {"nor2", "!(a | b)", "a", 5.0 / 3, 5.0 / 3, 2},
      {"nor3", "!(a | b | c)", "b", 7.0 / 3, 7.0 / 3, 3},
      {"nor3_hi", "!(a | b | c)", "b", 13.0 / 6, 13.0 / 3, 2.5},
      {"nor3_asym", "!(a | b | c)", "a", 1.5, 1.5, 11.0 / 6},
      {"nor4", "!(a | b | c | d)", "d", 3, 3, 4},
      {"aoi21", "!(a & b | c)", "c", 5.0 / 3, 5.0 / 3, 7.0 / 3},
      {"aoi22", "!(a & b | c & d)", "d", 2, 2, 4},
      {"aoi221", "!(a & b | c & d | e)", "e", 7.0 / 3, 7.0 / 3, 11.0 / 3},
      {"aoi22_or", "!(a & (b | c) | d & e)", "a", 5.0 / 3, 5.0 / 3, 16.0 / 3},
      {"oai21", "!((a | b) & c)", "c", 4.0 / 3, 4.0 / 3, 8.0 / 3},
      {"oai22", "!((a | b) & (c | d))", "a", 2, 2, 4},
      {"maj3_rep", "!(a & b | (a | b) & c)", "a", 4, 4, 4},
      {"maj3_dual",
       "!(a & b | (a | b) & c)",
       "b",
       16.0 / 3,
       16.0 / 3,
       13.0 / 3},
      {"sum3_rep", "!(a & b & c | (a | b | c) & con)", "con", 2, 2, 5},
      {"muxi2", "!(d0 & !s | d1 & s)", "d0", 2, 2, 4},
      {"muxi3", "!((d0 & !s0 | d1 & s0) & !s1 | d2 & s1)", "d0", 3, 3, 5},
      // Behind a first stage of reference 3: the last inverter has 6.
      {"and2", "a & b", "a", 4.0 / 6, 4.0 / 6, 5},
      {"or2", "a | b", "a", 5.0 / 6, 5.0 / 6, 5},
      {"buf", "a", "a", 3.0 / 9, 3.0 / 9, 5},
      // Inverter 3 or, for b of xor3_rep, 6; plus the pin's gates in the tree.
      {"xor2", "a ^ b", "a", 9.0 / 3, 9.0 / 3, 7},
      {"xnor2", "!(a ^ b)", "b", 9.0 / 3, 9.0 / 3, 7},
      {"xor3_rep", "a ^ b ^ c", "b", 24.0 / 3, 24.0 / 3, 10},
  };
}

TEST(BuiltInCellsTest, HandNumbersAreTheOnesTheCellsWereDrawnBy) {
  for (const CellRow& row : CellRows()) {
    SCOPED_TRACE(row.cell + " " + row.pin);
    const CellEstimate estimate = MustEstimate(ReadBuiltIn(row.cell));
    ASSERT_EQ(estimate.outputs.size(), 1U);
    EXPECT_EQ(estimate.outputs.front().function, row.function);
    const Estimate up = FindArc(estimate, row.pin, Edge::kRise).estimate;
    const Estimate down = FindArc(estimate, row.pin, Edge::kFall).estimate;
    EXPECT_NEAR(up.effort, row.up, kExact);
    EXPECT_NEAR(down.effort, row.down, kExact);
    EXPECT_NEAR(up.parasitic_by_nodes, row.parasitic, kExact);
  }
}

struct BundleRow {
  std::string cell;
  std::vector<std::string> nets;
  double effort;
};

TEST(BuiltInCellsTest, Bundles) {
  const std::vector<BundleRow> table = {{"xor2", {"a", "an"}, 4},
                                        {"xnor2", {"b", "bn"}, 4},
                                        {"muxi2", {"s", "sn"}, 4},
                                        {"xor3_rep", {"a", "an"}, 6},
                                        {"xor3_rep", {"b", "bn"}, 12},
                                        {"xor3_rep", {"c", "cn"}, 6}};
  for (const BundleRow& row : table) {
    const auto found = EstimateBundle(
        ReadBuiltIn(row.cell), {"y", row.nets}, Edge::kFall, 2.0);
    ASSERT_TRUE(found.ok()) << found.error().message;
    EXPECT_NEAR(found->effort, row.effort, kExact) << row.cell;
  }
}

TEST(BuiltInCellsTest, SelfDualOnesAreRecognised) {
  for (const std::string name : {"maj3_rep", "sum3_rep", "xor3_rep"}) {
    const OutputEstimate output =
        MustEstimate(ReadBuiltIn(name)).outputs.front();
    EXPECT_TRUE(output.self_dual) << name;
    EXPECT_TRUE(output.repeated_network) << name;
  }
  const OutputEstimate dual =
      MustEstimate(ReadBuiltIn("maj3_dual")).outputs.front();
  EXPECT_TRUE(dual.self_dual);
  EXPECT_FALSE(dual.repeated_network);
  EXPECT_EQ(dual.tallest_pull_down, 2);
  EXPECT_EQ(dual.tallest_pull_up, 3);
}

}  // namespace
}  // namespace gatedyno
