#include "harness/farm/task.h"

#include <atomic>
#include <chrono>
#include <thread>

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "harness/farm/merge.h"
#include "harness/farm/outbox.h"
#include "harness/farm/round_draft.h"
#include "harness/sim/protocol.h"
#include "tests/farm/farm_bench.h"
#include "tests/support/temporary_folder.h"

namespace gatedyno {
namespace {

class TaskTest : public testing::Test {
 protected:
  void MakeShare(const std::vector<Job>& jobs) {
    RoundDraft draft(round_, jobs.size());
    for (const Job& job : jobs) {
      ASSERT_TRUE(draft.Add(*JobText(job)).ok());
    }
    ASSERT_TRUE(draft.Close().ok());
  }

  TaskOptions Options() const {
    TaskOptions options;
    options.folder = farm_.path();
    options.round = round_.name();
    options.workers = 2;
    options.worker_program = FAKE_WORKER;
    options.simulator = "none";  // What the fake worker has.
    return options;
  }

  // All that is published of share 0.
  AllSaid Published() const {
    Collector collector;
    std::vector<std::filesystem::path> results;
    const auto names = round_.Results();
    for (const ResultName& result : *names) {
      results.push_back(result.path);
    }
    std::vector<bool> delivered;
    EXPECT_TRUE(
        MergeShare(round_.ShareFile(0), results, collector.Taker(), &delivered)
            .ok());
    return collector.said();
  }

  TemporaryFolder farm_;
  RoundFolder round_ = *RoundFolder::Make(farm_.path());
};

TEST_F(TaskTest, PublishesWhatAPoolWouldGive) {
  std::vector<Job> jobs = DeedJobs(10, "echo");
  jobs.push_back(DeedJob("crash", 1));
  MakeShare(jobs);
  const auto end = RunTask(Options());
  ASSERT_TRUE(end.ok()) << end.error().message;
  EXPECT_EQ(*end, TaskEnd::kComplete);
  EXPECT_EQ(Published(), SaidByPool(jobs, FAKE_WORKER));
  EXPECT_EQ(CountResults(farm_.path()), 1);
}

TEST_F(TaskTest, SkipsWhatAnotherTaskHasPublished) {
  const std::vector<Job> jobs = DeedJobs(6, "echo");
  MakeShare(jobs);
  {
    const TemporaryFolder scratch;
    Outbox other(round_, 0, scratch.path());
    Outcome odd;
    odd.ending = Ending::kMeasured;
    odd.values_s = {{"value", -1.0}};
    ASSERT_TRUE(other.Add(jobs[1], odd).ok());
    ASSERT_TRUE(other.Publish().ok());
  }
  // Another process, or the two results would have one name.
  const std::filesystem::path mine = round_.NewResult(0, 1);
  std::filesystem::rename(mine, round_.path() / "share-0.other-1-1.result");
  ASSERT_TRUE(RunTask(Options()).ok());
  const AllSaid said = Published();
  EXPECT_EQ(said.size(), 6U);
  EXPECT_EQ(said.at(jobs[1].label).value, -1.0);
  // With nothing left to do no worker is needed.
  TaskOptions idle = Options();
  idle.worker_program = "/nowhere";
  idle.simulator.clear();
  const auto again = RunTask(idle);
  ASSERT_TRUE(again.ok()) << again.error().message;
  EXPECT_EQ(*again, TaskEnd::kComplete);
}

TEST_F(TaskTest, PublishesNowAndThen) {
  MakeShare(DeedJobs(60));
  TaskOptions options = Options();
  options.publish_every = std::chrono::milliseconds(100);
  ASSERT_TRUE(RunTask(options).ok());
  EXPECT_GE(CountResults(farm_.path()), 3);
  EXPECT_EQ(Published().size(), 60U);
}

TEST_F(TaskTest, ToldToStopItPublishesAndBeginsNothingMore) {
  MakeShare(DeedJobs(200));
  TaskOptions options = Options();
  const auto stop_at =
      std::chrono::steady_clock::now() + std::chrono::milliseconds(400);
  options.should_stop = [&] {
    return std::chrono::steady_clock::now() >= stop_at;
  };
  const auto end = RunTask(options);
  ASSERT_TRUE(end.ok());
  EXPECT_EQ(*end, TaskEnd::kStopped);
  EXPECT_GT(Published().size(), 2U);
  EXPECT_LT(Published().size(), 100U);
}

// A job that hangs does not keep what was done before from being published.
TEST_F(TaskTest, ToldToStopItPublishesWhileAJobIsStillAtWork) {
  std::vector<Job> jobs = DeedJobs(5, "echo");
  Job hanging = DeedJob("hang", 0);
  hanging.time_limit_s = 2.0;
  jobs.push_back(hanging);
  jobs.push_back(DeedJob("echo", 99));
  MakeShare(jobs);
  TaskOptions options = Options();
  options.workers = 1;
  std::atomic<bool> stop = false;
  options.should_stop = [&] { return stop.load(); };
  std::atomic<int> early = 0;
  std::jthread watcher([&] {
    ::usleep(500'000);
    stop = true;
    ::usleep(500'000);
    early = CountResults(farm_.path());
  });
  const auto end = RunTask(options);
  watcher.join();
  ASSERT_TRUE(end.ok());
  EXPECT_EQ(early, 1);
  EXPECT_GE(Published().size(), 6U);
}

TEST_F(TaskTest, SaysWhatIsWrong) {
  const auto none = RunTask(Options());
  ASSERT_FALSE(none.ok());
  EXPECT_EQ(none.error().message,
            round_.ShareFile(0).string() +
                ": cannot be read: No such file or directory; do this node and "
                "the one that runs gatedyno share the folder " +
                farm_.path().string() + "?");
  MakeShare(DeedJobs(2));
  TaskOptions options = Options();
  options.worker_program = "/nowhere/worker";
  const auto workerless = RunTask(options);
  ASSERT_FALSE(workerless.ok());
  EXPECT_EQ(workerless.error().message,
            "/nowhere/worker: cannot be started: No such file or directory");
  TaskOptions other = Options();
  other.simulator = "ngspice-39";
  const auto stranger = RunTask(other);
  ASSERT_FALSE(stranger.ok());
  EXPECT_EQ(stranger.error().message,
            "the simulator of this node is none, that of the run ngspice-39: "
            "install the same on all nodes");
}

}  // namespace
}  // namespace gatedyno
