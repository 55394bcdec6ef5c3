#include "harness/deck/stage_job.h"

#include <sstream>
#include <string>

#include <gtest/gtest.h>

#include "harness/deck/deck_text.h"
#include "tests/deck/test_bench.h"
#include "tests/support/cell_builder.h"
#include "tests/support/golden.h"

namespace gatedyno {
namespace {

std::string MaskedDeck(const Job& job) {
  const std::string folder =
      NodeP45().processes[0].models[0].path.parent_path().string();
  return Masked(DeckText(job, 0), folder, "MODELS");
}

struct Golden {
  const char* file;
  const char* cell;
  const char* pin;
  Edge edge;
  double fanout;
  Drive drive;
};
constexpr Golden kGolden[] = {
    {"inv_a_fall_h4.sp", "inv", "a", Edge::kFall, 4.0, Drive::kMatched},
    {"nand2_b_rise_h3.sp", "nand2", "b", Edge::kRise, 3.0, Drive::kMatched},
    {"nand2_b_rise_h3_self.sp", "nand2", "b", Edge::kRise, 3.0, Drive::kSelf},
    {"aoi21_c_fall_h2.sp", "aoi21", "c", Edge::kFall, 2.0, Drive::kMatched},
};

TEST(StageJobTest, GoldenDecks) {
  for (const Golden& golden : kGolden) {
    const Cell cell = BuiltInCell(golden.cell, NodeP45());
    const StageTest test =
        TestOf(cell, golden.pin, golden.edge, golden.fanout, golden.drive);
    ExpectGolden(golden.file, MaskedDeck(StageJob(BenchOf(NodeP45()), test)));
  }
}

std::string KeyOf(const Bench& bench, const StageTest& test) {
  return StageJob(bench, test).key;
}

// One simulation serves both edges of an unskewed arc.
TEST(StageJobTest, EdgesOfEqualEffortAreOneJob) {
  const Bench bench = BenchOf(NodeP45());
  const Cell nand2 = BuiltInCell("nand2", NodeP45());
  EXPECT_EQ(KeyOf(bench, TestOf(nand2, "a", Edge::kRise, 4)),
            KeyOf(bench, TestOf(nand2, "a", Edge::kFall, 4)));
  const Cell skewed = BuiltInCell("inv_hi", NodeP45());
  EXPECT_NE(KeyOf(bench, TestOf(skewed, "a", Edge::kRise, 4)),
            KeyOf(bench, TestOf(skewed, "a", Edge::kFall, 4)));
  // Driven by itself the cell's efforts have no say in the circuit, but in the
  // time the deck runs.
  const StageTest rise = TestOf(skewed, "a", Edge::kRise, 4, Drive::kSelf);
  EXPECT_NE(StageJob(bench, rise).deck,
            StageJob(bench, TestOf(skewed, "a", Edge::kRise, 4)).deck);
}

TEST(StageJobTest, KeyFollowsAllThatDecidesTheOutcome) {
  const Cell cell = BuiltInCell("nand2", NodeP45());
  const StageTest test = TestOf(cell, "a", Edge::kRise, 4);
  const std::string key = KeyOf(BenchOf(NodeP45()), test);

  Bench bench = BenchOf(NodeP45());
  bench.models_fingerprint = "other models";
  EXPECT_NE(KeyOf(bench, test), key);
  bench = BenchOf(NodeP45());
  bench.simulator = "simulator 2";
  EXPECT_NE(KeyOf(bench, test), key);
  bench = BenchOf(NodeP45());
  ++bench.rung;
  EXPECT_NE(KeyOf(bench, test), key);
  bench = BenchOf(NodeP45());
  bench.corner.temperature_c = 125;
  EXPECT_NE(KeyOf(bench, test), key);
  bench = BenchOf(NodeP45());
  bench.corner.supply_v = 0.9;
  EXPECT_NE(KeyOf(bench, test), key);
  bench = BenchOf(NodeP45());
  bench.corner.process = "slow";
  EXPECT_NE(KeyOf(bench, test), key);
  EXPECT_NE(KeyOf(BenchOf(NodeP45()), TestOf(cell, "a", Edge::kRise, 3)), key);
  EXPECT_NE(KeyOf(BenchOf(NodeP45()), TestOf(cell, "b", Edge::kRise, 4)), key);
}

TEST(StageJobTest, KeyIgnoresWhereTheModelsAre) {
  ProcessNode moved = NodeP45();
  for (Process& process : moved.processes) {
    process.models[0].path = "/elsewhere/p45.sp";
  }
  const Cell cell = BuiltInCell("nand2", NodeP45());
  const StageTest test = TestOf(cell, "a", Edge::kRise, 4);
  const Job here = StageJob(BenchOf(NodeP45()), test);
  const Job there = StageJob(BenchOf(moved), test);
  EXPECT_EQ(here.key, there.key);
  EXPECT_NE(here.deck, there.deck);
}

TEST(StageJobTest, KeyIgnoresWhatTheCellIsCalled) {
  Cell cell = BuiltInCell("nand2", NodeP45());
  const std::string key =
      KeyOf(BenchOf(NodeP45()), TestOf(cell, "a", Edge::kRise, 4));
  for (Mosfet& mosfet : cell.mosfets) {
    mosfet.name = "x9." + mosfet.name;
  }
  EXPECT_EQ(KeyOf(BenchOf(NodeP45()), TestOf(cell, "a", Edge::kRise, 4)), key);
}

// Far above what a deck takes, and none of its outcome's business.
TEST(StageJobTest, TimeLimitFollowsTheDevicesOrTheBench) {
  const Cell cell = BuiltInCell("nand2", NodeP45());
  const StageTest test = TestOf(cell, "a", Edge::kRise, 4);
  const Job estimated = StageJob(BenchOf(NodeP45()), test);
  EXPECT_DOUBLE_EQ(estimated.time_limit_s, 30.0 + 0.2 * 5 * 4);
  Bench bench = BenchOf(NodeP45());
  bench.time_limit_s = 2.5;
  const Job given = StageJob(bench, test);
  EXPECT_EQ(given.time_limit_s, 2.5);
  EXPECT_EQ(given.key, estimated.key);
}

TEST(StageJobTest, LabelSaysWhichJob) {
  const Cell cell = BuiltInCell("nand2", NodeP45());
  EXPECT_EQ(
      StageJob(BenchOf(NodeP45()), TestOf(cell, "a", Edge::kRise, 2.5)).label,
      "nand2 a->y h=2.5 typical");
}

// Two stages: the first drives a fixed load inside the cell, and that is what
// the driving stages match.
TEST(StageJobTest, DriverMatchesTheFirstStage) {
  Estimate estimate;
  estimate.effort = 1.5;
  EXPECT_EQ(DriverEffort(estimate, 4.0), 6.0);
  estimate.fixed_first_effort = 2.0;
  EXPECT_EQ(DriverEffort(estimate, 4.0), 2.0);
}

struct Name {
  const char* cell;
  const char* input;
  const char* side;
  const char* output;
};
constexpr Name kHostileNames[] = {
    {"x\n.control\nshell ls\n.endc", "a", "b", "y"},
    {"x\r\n.include \"/etc/passwd\"", "a\n.exec ls", "b\n+ x", "y\n*#shell"},
    {"\"; shell ls", "#a", "$b", "y'`ls`"},
    {"\xc3\xa9\xe2\x80\xa8", "{a}", "b=1\tc", "y\\"},
    {"#shell ls", ".a", ".b", ".control"},
};

// Device lines and commands, without the comments.
std::string WithoutRemarks(const std::string& deck) {
  std::istringstream in(deck);
  std::string kept;
  for (std::string line; std::getline(in, line);) {
    kept += line.starts_with("* ") ? "" : line + "\n";
  }
  return kept;
}

Cell NandNamed(const Name& name) {
  Cell cell = CellBuilder(name.cell)
                  .Pins({name.input, name.side, name.output, "vdd", "vss"})
                  .P("p1", name.output, name.input, "vdd", 2)
                  .P("p2", name.output, name.side, "vdd", 2)
                  .N("n1", name.output, name.input, "inner", 2)
                  .N("n2", "inner", name.side, "vss", 2)
                  .Build();
  for (Mosfet& mosfet : cell.mosfets) {
    mosfet.model = mosfet.polarity == Polarity::kN ? "nfet" : "pfet";
    mosfet.name = name.cell;
  }
  cell.nets.back() = name.cell;
  return cell;
}

std::string DeckOf(const Name& name) {
  const Cell cell = NandNamed(name);
  const ArcEstimate arc =
      FindArc(MustEstimate(cell), name.input, Edge::kRise, name.output);
  return StageJob(BenchOf(NodeP45()),
                  {.cell = &cell,
                   .arc = arc.arc,
                   .estimate = arc.estimate,
                   .fanout = 3.0,
                   .time_unit_s = kTimeUnit_s})
      .deck;
}

TEST(StageJobTest, NamesOfACellStayInRemarks) {
  const std::string harmless = DeckOf({"nand", "a", "b", "y"});
  for (const Name& hostile : kHostileNames) {
    const std::string deck = DeckOf(hostile);
    EXPECT_EQ(WithoutRemarks(deck), WithoutRemarks(harmless)) << hostile.cell;
    EXPECT_EQ(deck.find("*#"), std::string::npos);
    for (const char c : deck) {
      EXPECT_TRUE(c == '\n' || (c >= ' ' && c <= '~')) << hostile.cell;
    }
  }
}

TEST(DeckTextTest, RemarksKeepOnlyHarmlessCharacters) {
  EXPECT_EQ(DeckRemark("a->y rise, h=2.5 +-_"), "a->y rise, h=2.5 +-_");
  EXPECT_EQ(DeckRemark("a\n.b\"'`$;*#{}()\\/\x7f\xc3\xa9"),
            "a_.b" + std::string(16, '_'));
}

TEST(DeckTextTest, NumbersHaveNineDigits) {
  EXPECT_EQ(DeckNumber(1.0), "1");
  EXPECT_EQ(DeckNumber(1.0 / 3.0), "0.333333333");
  EXPECT_EQ(DeckNumber(45e-9), "4.5e-08");
}

}  // namespace
}  // namespace gatedyno
