#include <string>
#include <vector>

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "tests/store/store_fixture.h"

namespace gatedyno {
namespace {

using testing::ElementsAre;
using testing::IsEmpty;

class StoreRunsTest : public StoreFixture {};

RunInfo Info() {
  return {.plan = R"({"node": "p45"})",
          .node = "p45",
          .program_version = "0.1.0",
          .simulator_version = "39.3"};
}

TEST_F(StoreRunsTest, ARunFromBeginningToEnd) {
  Store store = Store::Open(Path()).value();
  const RunId run = store.BeginRun(Info()).value();
  std::vector<RunRecord> runs = store.Runs().value();
  ASSERT_EQ(runs.size(), 1U);
  EXPECT_EQ(runs[0].id, run);
  EXPECT_EQ(runs[0].info.plan, Info().plan);
  EXPECT_EQ(runs[0].info.node, "p45");
  EXPECT_EQ(runs[0].info.program_version, "0.1.0");
  EXPECT_EQ(runs[0].info.simulator_version, "39.3");
  EXPECT_FALSE(runs[0].finished.has_value());
  EXPECT_EQ(store.RunResults(run).value(), std::nullopt);

  ASSERT_TRUE(store.FinishRun(run, R"([{"verdict": "within"}])").ok());
  store = Store::Open(Path()).value();
  runs = store.Runs().value();
  ASSERT_TRUE(runs[0].finished.has_value());
  EXPECT_GE(*runs[0].finished, runs[0].started);
  EXPECT_EQ(store.RunResults(run).value(), R"([{"verdict": "within"}])");
}

TEST_F(StoreRunsTest, RunsShareJobs) {
  Store store = Store::Open(Path()).value();
  const std::vector<Job> first = {ExampleJob(1), ExampleJob(2)};
  const std::vector<Job> second = {ExampleJob(2), ExampleJob(3)};
  const RunId run1 = store.BeginRun(Info()).value();
  const RunId run2 = store.BeginRun(Info()).value();
  EXPECT_NE(run1, run2);
  ASSERT_TRUE(store.AddJobs(run1, first).ok());
  ASSERT_TRUE(store.AddJobs(run2, second).ok());
  ASSERT_TRUE(
      store.AddJobs(run2, second).ok());  // A resumed run says it again.
  EXPECT_THAT(store.RunJobKeys(run1).value(),
              ElementsAre(ExampleJob(1).key, ExampleJob(2).key));
  EXPECT_THAT(store.RunJobKeys(run2).value(),
              ElementsAre(ExampleJob(2).key, ExampleJob(3).key));
}

TEST_F(StoreRunsTest, AJobNotedHasNoOutcomeYet) {
  Store store = Store::Open(Path()).value();
  const RunId run = store.BeginRun(Info()).value();
  const std::vector<Job> jobs = {ExampleJob(1)};
  ASSERT_TRUE(store.AddJobs(run, jobs).ok());
  EXPECT_FALSE(store.FindMeasured(jobs[0].key).value().has_value());
  const auto noted = store.FindJob(jobs[0].key).value();
  ASSERT_TRUE(noted.has_value());
  EXPECT_EQ(noted->job.deck, jobs[0].deck);
  EXPECT_FALSE(noted->outcome.has_value());
  ASSERT_TRUE(store.SaveOutcome(jobs[0], MeasuredAs(1e-12)).ok());
  EXPECT_TRUE(store.FindMeasured(jobs[0].key).value().has_value());
}

TEST_F(StoreRunsTest, ThereIsNoSuchRun) {
  Store store = Store::Open(Path()).value();
  const std::string message = Path().string() + ": there is no run 7";
  const std::vector<Job> jobs = {ExampleJob(1)};
  EXPECT_EQ(store.AddJobs(7, jobs).error().message, message);
  EXPECT_EQ(store.FinishRun(7, "[]").error().message, message);
  EXPECT_EQ(store.RunJobKeys(7).error().message, message);
  EXPECT_EQ(store.RunResults(7).error().message, message);
  EXPECT_THAT(store.Runs().value(), IsEmpty());
  EXPECT_FALSE(store.FindJob(jobs[0].key).value().has_value());
}

}  // namespace
}  // namespace gatedyno
