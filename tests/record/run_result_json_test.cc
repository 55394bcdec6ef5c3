#include "harness/record/run_result_json.h"

#include <string>
#include <vector>

#include <gtest/gtest.h>

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
                  {"tolerances",
                   {{"effort", Tolerance().effort},
                    {"parasitic", Tolerance().parasitic}}},
                  {"program", "gatedyno 0.1.0"},
                  {"simulator", "simulator 1"},
                  {"started", "2024-01-02T03:04:05Z"}}));
  EXPECT_EQ(report["cells"][1],
            json({{"name", "nand2"},
                  {"functions", {"y = !(a & b)"}},
                  {"stages", 1},
                  {"tallest_pull_down", 2},
                  {"tallest_pull_up", 1}}));
  EXPECT_EQ(
      report["jobs"],
      json({{"wanted", 30}, {"reused", 10}, {"simulated", 20}, {"failed", 1}}));
  EXPECT_EQ(report["failed_jobs"],
            json({{{"key", "k1"},
                   {"label", "nand2 b->y h=3 typical"},
                   {"message", "Timestep \"small\""}}}));
  EXPECT_EQ(report["warnings"], json(result.warnings));
  EXPECT_EQ(report["calibrations"].size(), 1U);
  EXPECT_EQ(report["comparisons"].size(), result.comparisons.size());
}

TEST(RunResultJsonTest, AnEmptyRunHasEmptyLists) {
  const json report = RunResultToJson(RunResult());
  for (const char* list :
       {"cells", "calibrations", "comparisons", "failed_jobs", "warnings"}) {
    EXPECT_EQ(report[list], json::array()) << list;
  }
}

}  // namespace
}  // namespace gatedyno
