// What is written as JSON holds what its published schema says.

#include <filesystem>
#include <string>

#include <gtest/gtest.h>
#include <nlohmann/json.hpp>

#include "harness/base/file.h"
#include "harness/node/json_schema.h"
#include "harness/report/json_report.h"
#include "harness/report/release_json.h"
#include "harness/report/versus_json.h"
#include "tests/page/runs.h"
#include "tests/report/sample_release.h"
#include "tests/report/sample_versus.h"

namespace gatedyno {
namespace {

using nlohmann::json;

// Against the schema of that name in reports/.
Status Check(const json& value, const std::string& name) {
  const std::filesystem::path folder = GATEDYNO_SOURCE_DIR "/reports";
  const std::string schema = ReadFile(folder / (name + ".schema.json")).value();
  return CheckJson(value, json::parse(schema), name + ".json");
}

void ExpectFits(const std::string& text, const std::string& name) {
  const Status fits = Check(json::parse(text), name);
  EXPECT_TRUE(fits.ok()) << fits.error().message;
}

RunResult WithAgreements() {
  RunResult result = SampleRun();
  result.facts.tolerance_rules = {
      {.where = {.cells = "nor*", .edge = Edge::kRise},
       .effort = 0.3,
       .parasitic = std::nullopt}};
  result.facts.exemptions = {
      {.where = {.cells = "nand2", .pins = "b", .edge = std::nullopt},
       .quantity = Quantity::kEffort,
       .reason = "known",
       .author = "library lead",
       .expires = "2027-03-31"}};
  result.cells.front().circuit = {
      .power = "vdd",
      .ground = "vss",
      .devices = {{.name = "mp",
                   .p_type = true,
                   .gate = "a",
                   .drain = "y",
                   .source = "vdd",
                   .width_m = 1.8e-7,
                   .length_m = 4.5e-8}},
      .stages = {{.outputs = {"y"}, .devices = {0}}}};
  return result;
}

TEST(SchemaTest, EveryResultFits) {
  for (const RunResult& result :
       {SampleRun(), HostileRun(), RunResult(), WithAgreements()}) {
    ExpectFits(JsonReport(result), "result");
  }
}

TEST(SchemaTest, EveryReleaseFits) {
  ExpectFits(ReleaseJson(SampleRelease()), "release");
  ExpectFits(ReleaseJson(ReleaseOf(RunResult())), "release");
}

TEST(SchemaTest, EveryVersusFits) {
  SampleVersus sample;
  ExpectFits(VersusJson(sample.view()), "versus");
  sample.b.calibrations.clear();
  sample.PairUp();
  ExpectFits(VersusJson(sample.view()), "versus");
}

TEST(SchemaTest, SaysWhatDoesNotFit) {
  struct Case {
    const char* pointer;
    json value;
  };
  const json good = json::parse(JsonReport(WithAgreements()));
  for (const Case& c : {Case{"/format", "gatedyno-result/2"},
                        Case{"/facts/started", nullptr},
                        Case{"/facts/exemptions/0/author", 7},
                        Case{"/cells/0/circuit/devices/0/p_type", "yes"},
                        Case{"/comparisons/0/verdict", "fine"},
                        Case{"/comparisons/0/effort/value", "1.3"},
                        Case{"/comparisons/0/points", nullptr},
                        Case{"/comparisons/0/invented", 1},
                        Case{"/jobs/failed", -1}}) {
    json bad = good;
    bad[json::json_pointer(c.pointer)] = c.value;
    EXPECT_FALSE(Check(bad, "result").ok()) << c.pointer;
  }
}

}  // namespace
}  // namespace gatedyno
