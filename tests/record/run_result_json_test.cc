#include "harness/record/run_result_json.h"

#include <string>
#include <vector>

#include <gtest/gtest.h>

#include "harness/record/circuit_json.h"
#include "tests/report/sample_run.h"

namespace gatedyno {
namespace {

using nlohmann::json;

// Scripts rely on these names.
TEST(RunResultJsonTest, HasAllThatWasRun) {
  const RunResult result = SampleRun();
  const json report = RunResultToJson(result);
  EXPECT_EQ(report["format"], "gatedyno-result/1");
  EXPECT_EQ(report["facts"],
            json({{"title", "gates of an interrupt arbiter"},
                  {"node", "p45"},
                  {"node_title", "predictive 45 nm bulk, high performance"},
                  {"drive", "matched"},
                  {"fanouts", {0.5, 2, 4}},
                  {"accuracy", 0.002},
                  {"tolerances",
                   {{"effort", Tolerance().effort},
                    {"parasitic", Tolerance().parasitic},
                    {"rules", json::array()}}},
                  {"exemptions", json::array()},
                  {"program", "gatedyno 0.1.0"},
                  {"simulator", "simulator 1"},
                  {"started", "2024-01-02T03:04:05Z"}}));
  EXPECT_EQ(report["cells"][1],
            json({{"name", "nand2"},
                  {"functions", {"y = !(a & b)"}},
                  {"stages", 1},
                  {"tallest_pull_down", 2},
                  {"tallest_pull_up", 1},
                  {"circuit", CircuitToJson({})}}));
  EXPECT_EQ(
      report["jobs"],
      json({{"wanted", 30}, {"reused", 10}, {"simulated", 20}, {"failed", 1}}));
  EXPECT_EQ(report["failed_jobs"],
            json({{{"key", "k1"},
                   {"label", "nand2 b->y h=3 typical"},
                   {"message", "Timestep \"small\""}}}));
  EXPECT_EQ(report["accuracy"],
            json({{"promised", 0.002},
                  {"delays", 8},
                  {"rms", 0.00034},
                  {"largest", 0.0012},
                  {"worst", "nand2 a->y h=2 typical"},
                  {"met", true}}));
  EXPECT_EQ(report["warnings"], json(result.warnings));
  EXPECT_EQ(report["calibrations"].size(), 1U);
  EXPECT_EQ(report["comparisons"].size(), result.comparisons.size());
  json head = report;
  head.erase("comparisons");
  EXPECT_EQ(RunHeadToJson(result), head);
}

TEST(RunResultJsonTest, AnEmptyRunHasEmptyLists) {
  const json report = RunResultToJson(RunResult());
  for (const char* list :
       {"cells", "calibrations", "comparisons", "failed_jobs", "warnings"}) {
    EXPECT_EQ(report[list], json::array()) << list;
  }
}

// Through text, as in a store; all digits of a double survive.
TEST(RunResultJsonTest, EveryFieldComesBack) {
  RunResult result = SampleRun();
  result.facts.drive = Drive::kSelf;
  result.facts.tolerance = {1.0 / 3.0, 0.7};
  const std::string text = RunResultToJson(result).dump();
  const Result<RunResult> back = RunResultFromJson(json::parse(text));
  ASSERT_TRUE(back.ok()) << back.error().message;
  EXPECT_EQ(RunResultToJson(*back).dump(), text);
  EXPECT_EQ(back->facts.tolerance.effort, 1.0 / 3.0);
  EXPECT_EQ(back->cells.size(), result.cells.size());
  EXPECT_EQ(back->comparisons.size(), result.comparisons.size());
  EXPECT_EQ(back->failed_jobs.front().key, "k1");
}

TEST(RunResultJsonTest, ComesBackFromWhatAStoreKeeps) {
  const RunResult result = SampleRun();
  std::vector<std::string> rows;
  const json written = RunResultToJson(result);
  for (const json& row : written["comparisons"]) {
    rows.push_back(row.dump());
  }
  const std::string head = RunHeadToJson(result).dump();
  const Result<RunResult> back = RunResultFromTexts(head, rows);
  ASSERT_TRUE(back.ok()) << back.error().message;
  EXPECT_EQ(RunResultToJson(*back), RunResultToJson(result));
  // All in the head, as before rows were kept apart.
  const Result<RunResult> whole =
      RunResultFromTexts(RunResultToJson(result).dump(), {});
  ASSERT_TRUE(whole.ok()) << whole.error().message;
  EXPECT_EQ(RunResultToJson(*whole), RunResultToJson(result));
  const Result<RunResult> empty =
      RunResultFromTexts(RunHeadToJson(RunResult()).dump(), {});
  ASSERT_TRUE(empty.ok()) << empty.error().message;
  EXPECT_EQ(RunResultToJson(*empty), RunResultToJson(RunResult()));
}

TEST(RunResultJsonTest, SaysWhatIsWrong) {
  struct Case {
    const char* pointer;
    json value;
    ErrorKind kind;
    const char* message;
  };
  const Case cases[] = {
      {"/format",
       "gatedyno-result/2",
       ErrorKind::kBadInput,
       "not a run's result: its format is \"gatedyno-result/2\", and has to "
       "be \"gatedyno-result/1\""},
      {"/facts/drive",
       "hard",
       ErrorKind::kInternal,
       "not a run's result: unknown drive 'hard'"},
      {"/comparisons/1/verdict",
       "fine",
       ErrorKind::kInternal,
       "not a run's result: row 2: not a comparison: unknown verdict 'fine'"},
      {"/jobs/failed",
       "one",
       ErrorKind::kInternal,
       "not a run's result: [json.exception.type_error.302] type must be "
       "number, but is string"},
  };
  for (const Case& test : cases) {
    json written = RunResultToJson(SampleRun());
    written[json::json_pointer(test.pointer)] = test.value;
    const Result<RunResult> back = RunResultFromJson(written);
    ASSERT_FALSE(back.ok()) << test.pointer;
    EXPECT_EQ(back.error().message, test.message);
    EXPECT_EQ(back.error().kind, test.kind);
  }
  EXPECT_EQ(RunResultFromJson(json::array()).error().message,
            "not a run's result: its format is not said, and has to be "
            "\"gatedyno-result/1\"");
  EXPECT_EQ(RunResultFromTexts("{", {}).error().kind, ErrorKind::kInternal);
}

TEST(RunResultJsonTest, AMissingFieldIsNoResult) {
  const json whole = RunResultToJson(SampleRun());
  for (const auto& field : whole.items()) {
    json written = whole;
    written.erase(field.key());
    EXPECT_FALSE(RunResultFromJson(written).ok()) << field.key();
  }
  for (const auto& fact : whole.at("facts").items()) {
    json written = whole;
    written["facts"].erase(fact.key());
    // Not there in a result of gatedyno 0.1.
    EXPECT_EQ(RunResultFromJson(written).ok(), fact.key() == "exemptions")
        << fact.key();
  }
}

TEST(RunResultJsonTest, WhatPeopleAgreedOnComesBack) {
  RunResult result = SampleRun();
  result.facts.tolerance_rules = {
      {.where = {.cells = "nor*", .edge = Edge::kRise},
       .effort = 0.3,
       .parasitic = std::nullopt}};
  result.facts.exemptions = {
      {.where = {.cells = "nand2", .pins = "b", .edge = {}},
       .quantity = Quantity::kEffort,
       .reason = "known",
       .author = "M. Ober",
       .expires = "2027-03-31"}};
  const Result<RunResult> back = RunResultFromJson(RunResultToJson(result));
  ASSERT_TRUE(back.ok()) << back.error().message;
  EXPECT_EQ(back->facts.tolerance_rules, result.facts.tolerance_rules);
  EXPECT_EQ(back->facts.exemptions, result.facts.exemptions);
}

}  // namespace
}  // namespace gatedyno
