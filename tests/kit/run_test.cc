// The whole chain on a kit: sections of a library with nested files, devices
// as subcircuits, lengths in micrometres.

#include <string>

#include <boost/process.hpp>
#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "tests/kit/kit_folder.h"
#include "tests/measured/lab.h"
#include "tests/support/find_arc.h"
#include "tests/support/temporary_folder.h"

namespace gatedyno {
namespace {

using testing::HasSubstr;

RunResult MeasureKit(const std::vector<std::string>& corners) {
  PreparedRun run = Prepare(KitFile("kit.json"), {KitFile("gates.sp")});
  run.corners.clear();
  for (const std::string& name : corners) {
    const Result<Corner> corner = FindCorner(run.node, name);
    EXPECT_TRUE(corner.ok()) << corner.error().message;
    run.corners.push_back(*corner);
  }
  return Lab::Shared().Measure(run);
}

struct EffortRow {
  const char* cell;
  const char* pin;
  double effort;  // The textbooks' at P/N 2.
};
constexpr EffortRow kEffortRows[] = {
    {"kit_inv", "a", 1.0},
    {"kit_nand2", "a", 4.0 / 3},
    {"kit_nand2", "b", 4.0 / 3},
    {"kit_nor2", "a", 5.0 / 3},
    {"kit_nor2", "b", 5.0 / 3},
};

TEST(KitRunTest, EstimatesTheTextbookNumbers) {
  constexpr double kRounding = 1e-12;
  const PreparedRun run = Prepare(KitFile("kit.json"), {KitFile("gates.sp")});
  EXPECT_THAT(run.warnings, testing::IsEmpty());
  for (const EffortRow& row : kEffortRows) {
    for (const CellEstimate& cell : run.estimates) {
      if (cell.cell != row.cell) {
        continue;
      }
      for (const Edge edge : {Edge::kRise, Edge::kFall}) {
        EXPECT_NEAR(
            FindArc(cell, row.pin, edge).estimate.effort, row.effort, kRounding)
            << row.cell << " " << row.pin;
      }
    }
  }
}

TEST(KitRunTest, MeasuresGatesLikeThoseOfTheNode) {
  // An inverter twice the reference has its effort.
  constexpr double kYardstick = 0.01;
  // Mean of both edges, of public 130 nm cards: see two_input_gate_test.cc.
  constexpr double kBand = 0.12;
  const RunResult result = MeasureKit({"tt"});
  EXPECT_NEAR(FindMean(result, "kit_inv", "a").effort, 1.0, kYardstick);
  EXPECT_NEAR(FindMean(result, "kit_nand2", "a").effort, 1.14, kBand);
  EXPECT_NEAR(FindMean(result, "kit_nand2", "b").effort, 1.09, 1.5 * kBand);
  EXPECT_NEAR(FindMean(result, "kit_nor2", "a").effort, 1.52, kBand);
  EXPECT_NEAR(FindMean(result, "kit_nor2", "b").effort, 1.56, 1.5 * kBand);
}

// The section of the library is what is simulated.  ss: 30 mV and 6 % weaker.
TEST(KitRunTest, SlowSectionIsSlower) {
  const RunResult result = MeasureKit({"tt", "ss"});
  ASSERT_EQ(result.calibrations.size(), 2u);
  const double slowdown =
      result.calibrations[1].tau_s.value / result.calibrations[0].tau_s.value;
  EXPECT_GT(slowdown, 1.04);
  EXPECT_LT(slowdown, 1.15);
}

struct ExitRow {
  const char* what;
  std::vector<std::string> cells_and_options;
  int code;
};

int RunProgram(const std::vector<std::string>& arguments) {
  namespace bp = boost::process;
  std::vector<std::string> all = {
      "run", "--node", KitFile("kit.json"), "--store", ":memory:"};
  all.insert(all.end(), arguments.begin(), arguments.end());
  return bp::system(std::string(GATEDYNO_BIN_DIR) + "/gatedyno",
                    bp::args(all),
                    bp::std_out > bp::null,
                    bp::std_err > bp::null,
                    bp::std_in < bp::null);
}

TEST(KitRunTest, ExitCodeTellsTheVerdict) {
  TemporaryFolder folder;
  const std::string wide = folder.Write(
      "wide.sp",
      ".subckt wide a y vdd vss\nxn y a vss vss kit_n w=42 l=0.13\n"
      "xp y a vdd vdd kit_p w=84 l=0.13\n.ends wide\n");
  const std::string gates = KitFile("gates.sp");
  const ExitRow rows[] = {
      {"all within", {gates, "--allow-g", "0.3", "--allow-p", "0.6"}, 0},
      {"some beyond", {gates, "--allow-g", "0.01"}, 1},
      {"an unknown corner", {gates, "--corner", "ff"}, 2},
      {"a width outside every bin", {wide}, 3},
  };
  for (const ExitRow& row : rows) {
    EXPECT_EQ(RunProgram(row.cells_and_options), row.code) << row.what;
  }
}

// The simulator's own reason reaches the row.
TEST(KitRunTest, WidthOutsideEveryBinIsNotMeasured) {
  TemporaryFolder folder;
  const PreparedRun run =
      Prepare(KitFile("kit.json"),
              {folder.Write("wide.sp",
                            ".subckt wide a y vdd vss\n"
                            "xn y a vss vss kit_n w=42 l=0.13\n"
                            "xp y a vdd vdd kit_p w=84 l=0.13\n.ends wide\n")});
  const RunResult result = Lab::Shared().Measure(run);
  ASSERT_EQ(result.comparisons.size(), 2u);
  for (const Comparison& row : result.comparisons) {
    EXPECT_EQ(row.verdict, Verdict::kNotMeasured);
    EXPECT_THAT(row.reason, HasSubstr("could not find a valid modelname"));
  }
}

}  // namespace
}  // namespace gatedyno
