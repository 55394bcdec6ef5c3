// gatedyno run, with the simulator.

#include <fstream>
#include <string>

#include <gmock/gmock.h>
#include <gtest/gtest.h>
#include <nlohmann/json.hpp>

#include "tests/cli/program.h"
#include "tests/support/ngspice_batch.h"

namespace gatedyno {
namespace {

using nlohmann::json;
using ::testing::ContainsRegex;
using ::testing::HasSubstr;
using ::testing::IsSupersetOf;

std::vector<std::string> KeysOf(const json& object) {
  std::vector<std::string> keys;
  for (const auto& [key, unused] : object.items()) {
    keys.push_back(key);
  }
  return keys;
}

TEST(RunProgramTest, MeasuresOnceAndReportsInEveryForm) {
  const Program program;
  const std::vector<std::string> arguments = {"run",
                                              "inv",
                                              "nand2",
                                              "--store",
                                              "my store.db",
                                              "--json",
                                              "out/run.json",
                                              "--csv",
                                              "out/run.csv"};
  const Ended first = program.Run(arguments);
  EXPECT_EQ(first.exit_code, 0) << first.out << first.err;
  EXPECT_EQ(first.err, "");
  EXPECT_THAT(first.out, HasSubstr("6 arcs: 6 within, 0 beyond, 0 not "));
  EXPECT_THAT(first.out,
              ContainsRegex("[0-9]+ jobs: [0-9]+ simulated, 0 taken from "
                            "stores, 0 failed\n"));

  const Ended second = program.Run(arguments);
  EXPECT_EQ(second.exit_code, 0);
  EXPECT_THAT(second.out,
              ContainsRegex("[0-9]+ jobs: 0 simulated, [0-9]+ taken from "
                            "stores, 0 failed\n"));
  // The same figures, to the last digit shown.
  EXPECT_EQ(second.out.substr(0, second.out.find(" jobs: ")),
            first.out.substr(0, first.out.find(" jobs: ")));

  const json report = json::parse(program.Read("out/run.json"));
  EXPECT_EQ(report["format"], "gatedyno-result/1");
  EXPECT_THAT(KeysOf(report["facts"]),
              IsSupersetOf({"title",
                            "node",
                            "drive",
                            "fanouts",
                            "tolerances",
                            "program",
                            "simulator",
                            "started"}));
  ASSERT_EQ(report["comparisons"].size(), 6U);
  EXPECT_THAT(KeysOf(report["comparisons"][0]),
              IsSupersetOf({"arc",
                            "corner",
                            "estimate",
                            "points",
                            "line",
                            "effort",
                            "parasitic",
                            "verdict",
                            "reason"}));
  EXPECT_EQ(report["jobs"]["reused"], report["jobs"]["wanted"]);
  EXPECT_TRUE(report["accuracy"]["met"]);
  const std::string csv = program.Read("out/run.csv");
  EXPECT_EQ(std::count(csv.begin(), csv.end(), '\n'), 7);
}

TEST(RunProgramTest, ExitCodeOneWhereSomeAreBeyond) {
  const Ended ended = Program().Run({"run",
                                     "nand2",
                                     "--store",
                                     ":memory:",
                                     "--fanouts",
                                     "1,2,4",
                                     "--allow-g",
                                     "0.001"});
  EXPECT_EQ(ended.exit_code, 1) << ended.err;
  EXPECT_THAT(ended.out, HasSubstr(" beyond\n"));
}

// A node whose cards lack the PMOS.
TEST(RunProgramTest, ExitCodeThreeWhereJobsFail) {
  const Program program;
  std::ifstream in(GATEDYNO_SOURCE_DIR "/models/p45.json");
  json node = json::parse(in);
  node["devices"][1]["model"] = "no_such_card";
  program.Write("node.json", node.dump());
  std::filesystem::copy(GATEDYNO_SOURCE_DIR "/models/p45.sp",
                        program.path() / "p45.sp");
  const Ended ended = program.Run({"run", "inv", "--node", "node.json"});
  EXPECT_EQ(ended.exit_code, 3) << ended.out << ended.err;
  EXPECT_THAT(ended.out,
              HasSubstr("2 arcs: 0 within, 0 beyond, 2 not measured\n"));
  EXPECT_THAT(ended.out,
              HasSubstr("the reference inverter was not measured: h=1: "
                        "failed: "));
  EXPECT_THAT(ended.out,
              HasSubstr("failed: reference inverter a->y h=1 typical: "));
  EXPECT_THAT(ended.out,
              HasSubstr("3 jobs: 3 simulated, 0 taken from "
                        "stores, 3 failed\n"));
}

TEST(RunProgramTest, PlanNodeAndCellsLieBesideEachOther) {
  const Program program;
  std::ifstream in(GATEDYNO_SOURCE_DIR "/models/p45.json");
  program.Write("my plans/my node.json", json::parse(in).dump());
  std::filesystem::copy(GATEDYNO_SOURCE_DIR "/models/p45.sp",
                        program.path() / "my plans/p45.sp");
  program.Write("my plans/my cell.sp",
                ".subckt own a y vdd vss\n"
                "mp y a vdd vdd pfet w=180n\n"
                "mn y a vss vss nfet w=90n\n"
                ".ends\n");
  program.Write("my plans/my plan.json",
                json({{"format", "gatedyno-plan/1"},
                      {"node", "my node.json"},
                      {"fanouts", {1, 2, 3}},
                      {"cells", {"my cell.sp"}}})
                    .dump());
  const Ended ended = program.Run({"run", "my plans/my plan.json"});
  EXPECT_EQ(ended.exit_code, 0) << ended.out << ended.err;
  EXPECT_TRUE(ended.out.starts_with("my plan\n")) << ended.out;
  EXPECT_THAT(ended.out, HasSubstr("2 arcs: 2 within"));
}

TEST(RunProgramTest, FileNamesMayBeNoUtf8) {
  const Program program;
  const std::string cell = "caf\xe9.sp";
  program.Write(cell,
                ".subckt own a y vdd vss\n"
                "mp y a vdd vdd pfet w=180n\n"
                "mn y a vss vss nfet w=90n\n"
                ".ends\n");
  const Ended ended =
      program.Run({"run", cell, "--fanouts", "1,2,3", "--json", "run.json"});
  EXPECT_EQ(ended.exit_code, 0) << ended.out << ended.err;
  EXPECT_EQ(json::parse(program.Read("run.json"))["cells"][0]["name"], "own");
}

// Without the worker nothing can be measured, but estimates are made.
TEST(RunProgramTest, ExitCodeFourWithoutAWorker) {
  const Program place;
  std::filesystem::create_directories(place.path() / "bin");
  std::filesystem::create_directories(place.path() / "share/gatedyno");
  std::filesystem::copy(GATEDYNO_BIN_DIR "/gatedyno",
                        place.path() / "bin/gatedyno");
  for (const char* data : {"models", "decks"}) {
    std::filesystem::create_directory_symlink(
        std::filesystem::path(GATEDYNO_SOURCE_DIR) / data,
        place.path() / "share/gatedyno" / data);
  }
  const Program program((place.path() / "bin/gatedyno").string());
  EXPECT_EQ(program.Run({"estimate", "inv"}).exit_code, 0);
  const Ended ended = program.Run({"run", "inv"});
  EXPECT_EQ(ended.exit_code, 4);
  EXPECT_EQ(ended.out, "");
  EXPECT_TRUE(ended.err.starts_with(
      "gatedyno: " + (place.path() / "bin/gatedyno-worker").string() + ": "))
      << ended.err;
}

// The netlist's names are paths, options and commands.
TEST(RunProgramTest, DecksStayInTheirFolderWhateverCellsAreCalled) {
  const Program program;
  program.Write("hostile.sp",
                ".subckt ../../up -in<0> y/z vdd vss\n"
                "mp y/z -in<0> vdd vdd pfet w=180n\n"
                "mn y/z -in<0> vss vss nfet w=90n\n"
                ".ends\n");
  const Ended ended = program.Run(
      {"deck", "hostile.sp", "--fanouts", "1,2", "-o", "deep/er/out"});
  EXPECT_EQ(ended.exit_code, 0) << ended.err;
  EXPECT_EQ(ended.out, "4 decks in deep/er/out\n");
  std::vector<std::string> files;
  for (const auto& entry :
       std::filesystem::recursive_directory_iterator(program.path())) {
    if (entry.is_regular_file()) {
      files.push_back(
          std::filesystem::relative(entry.path(), program.path()).string());
    }
  }
  EXPECT_THAT(files,
              ::testing::UnorderedElementsAre(
                  "hostile.sp",
                  "deep/er/out/_._.._up_-in_0__y_z_rise_h1_typical.sp",
                  "deep/er/out/_._.._up_-in_0__y_z_rise_h2_typical.sp",
                  "deep/er/out/_._.._up_-in_0__y_z_fall_h1_typical.sp",
                  "deep/er/out/_._.._up_-in_0__y_z_fall_h2_typical.sp"));
}

// What the run measured is what a plain simulator measures on the deck.
TEST(RunProgramTest, DecksRunUnchangedUnderAPlainSimulator) {
  const Program program;
  const std::vector<std::string> plan = {"nor2", "--fanouts", "2,4"};
  std::vector<std::string> arguments = {"deck", "-o", "decks"};
  arguments.insert(arguments.end(), plan.begin(), plan.end());
  ASSERT_EQ(program.Run(arguments).exit_code, 0);
  arguments = {"run", "--store", ":memory:", "--json", "run.json"};
  arguments.insert(arguments.end(), plan.begin(), plan.end());
  program.Run(arguments);
  const json report = json::parse(program.Read("run.json"));
  // The plain simulator draws straight lines between its time points, the
  // worker cubics; tests/measured/exported_deck_test.cc has the rest.
  constexpr double kRelative = 4e-3;
  int compared = 0;
  for (const json& row : report["comparisons"]) {
    if (row["arc"]["pin"] != "b") {
      continue;
    }
    const std::string edge = row["arc"]["edge"];
    const Result<BatchMeasures> measured =
        RunBatch(program.Read("decks/nor2_b_y_" + edge + "_0_h4_typical.sp"));
    ASSERT_TRUE(measured.ok()) << measured.error().message;
    const double delay_s = row["points"][1]["delay_s"];
    EXPECT_NEAR(measured->at("delay_" + edge), delay_s, kRelative * delay_s);
    ++compared;
  }
  EXPECT_EQ(compared, 2);
}

}  // namespace
}  // namespace gatedyno
