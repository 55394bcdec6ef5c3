#include "harness/record/run_progress_json.h"

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

using nlohmann::json;

json Example() {
  return {{"jobs",
           {{"wanted", 80}, {"reused", 20}, {"simulated", 31}, {"failed", 2}}},
          {"expected_jobs", 120},
          {"arcs_ended", 9},
          {"arcs", 24},
          {"current", "maj3_rep c->y h=6 slow_hot"}};
}

TEST(RunProgressJsonTest, ThereAndBack) {
  const Result<RunProgress> progress = RunProgressFromJson(Example());
  ASSERT_TRUE(progress.ok()) << progress.error().message;
  EXPECT_EQ(progress->jobs.wanted, 80);
  EXPECT_EQ(progress->jobs.reused, 20);
  EXPECT_EQ(progress->jobs.simulated, 31);
  EXPECT_EQ(progress->jobs.failed, 2);
  EXPECT_EQ(progress->expected_jobs, 120);
  EXPECT_EQ(progress->arcs_ended, 9);
  EXPECT_EQ(progress->arcs, 24);
  EXPECT_EQ(progress->current, "maj3_rep c->y h=6 slow_hot");
  EXPECT_EQ(RunProgressToJson(*progress), Example());
}

TEST(RunProgressJsonTest, EveryFieldMustBeThereAndOfItsType) {
  const json whole = Example();
  for (const auto& [field, unused] : whole.items()) {
    json without = whole;
    without.erase(field);
    EXPECT_FALSE(RunProgressFromJson(without).ok()) << field;
    json mistyped = whole;
    mistyped[field] = json::array();
    EXPECT_FALSE(RunProgressFromJson(mistyped).ok()) << field;
  }
  for (const char* text : {"null", "[]", "7", "\"x\""}) {
    const Result<RunProgress> read = RunProgressFromJson(json::parse(text));
    ASSERT_FALSE(read.ok()) << text;
    EXPECT_EQ(read.error().kind, ErrorKind::kInternal);
    EXPECT_EQ(read.error().message.find("not a run's progress: "), 0U);
  }
}

}  // namespace
}  // namespace gatedyno
