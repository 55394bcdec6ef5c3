// The farm over a Slurm of one script, which also tells every lie a real one is
// known to tell.

#include "harness/farm/slurm_farm.h"

#include <chrono>
#include <csignal>

#include <gmock/gmock.h>
#include <gtest/gtest.h>
#include <sys/wait.h>

#include "harness/base/file.h"
#include "tests/farm/fake_slurm.h"
#include "tests/farm/farm_bench.h"
#include "tests/support/temporary_folder.h"

namespace gatedyno {
namespace {

using std::chrono::milliseconds;
using std::chrono::seconds;
using testing::Contains;
using testing::IsEmpty;
using testing::MatchesRegex;
using testing::UnorderedElementsAre;

constexpr int kForever = 1'000'000;

class SlurmFarmTest : public testing::Test {
 protected:
  FarmOptions Options() const {
    FarmOptions options;
    options.folder = folder_.path() / "farm";
    options.program = FARM_TASK;
    options.worker_program = FAKE_WORKER;
    options.simulator = "none";
    options.jobs_per_task = 10;
    options.workers_per_task = 2;
    options.publish_every = milliseconds(60);
    options.poll_interval = milliseconds(30);
    options.settle = milliseconds(0);
    return options;
  }

  Status Run(const FarmOptions& options, const std::vector<Job>& jobs) {
    JobList list(jobs);
    return Run(options, list, collector_.Taker());
  }

  static Status Run(const FarmOptions& options,
                    JobSource& jobs,
                    const SimRunner::OnOutcome& on_outcome) {
    Result<SlurmFarm> farm = SlurmFarm::Make(options);
    EXPECT_TRUE(farm.ok()) << farm.error().message;
    return farm->Run(jobs, on_outcome);
  }

  void ExpectAllAsAPoolHasThem(const std::vector<Job>& jobs) {
    EXPECT_EQ(collector_.said(), SaidByPool(jobs, FAKE_WORKER));
  }

  // No round is left; only logs and the lock's file may be.
  void ExpectNoRounds() const {
    for (const std::string& name : NamesIn(folder_.path() / "farm")) {
      EXPECT_FALSE(name.starts_with("round-")) << name;
    }
  }

  std::vector<std::string> Logs() const {
    return NamesIn(folder_.path() / "farm" / "logs");
  }

  TemporaryFolder folder_;
  ScratchPlace scratch_;
  FakeSlurm slurm_;
  Collector collector_;
};

TEST_F(SlurmFarmTest, RunsEveryJobOnceAndCleansUp) {
  const std::vector<Job> jobs = DeedJobs(35, "echo");
  const Status ran = Run(Options(), jobs);
  ASSERT_TRUE(ran.ok()) << ran.error().message;
  ExpectAllAsAPoolHasThem(jobs);
  EXPECT_EQ(slurm_.arrays_submitted(), 1);
  EXPECT_THAT(slurm_.Arguments(1), Contains("--array=0-3"));
  EXPECT_THAT(slurm_.Arguments(1), Contains("--cpus-per-task=2"));
  ExpectNoRounds();
  EXPECT_THAT(Logs(), IsEmpty());
}

TEST_F(SlurmFarmTest, NothingToDoNeedsNoTask) {
  EXPECT_TRUE(Run(Options(), {}).ok());
  EXPECT_EQ(slurm_.arrays_submitted(), 0);
}

TEST_F(SlurmFarmTest, OneArrayIsNoLargerThanSlurmTakes) {
  slurm_.SetMaxArraySize(2);
  FarmOptions options = Options();
  options.jobs_per_task = 4;
  const std::vector<Job> jobs = DeedJobs(18, "echo");
  ASSERT_TRUE(Run(options, jobs).ok());
  ExpectAllAsAPoolHasThem(jobs);
  EXPECT_EQ(slurm_.arrays_submitted(), 3);  // 2 x 4, 2 x 4, 2 jobs.
}

// Offers a second job only once the first has ended, and so on.
class Chain : public JobSource {
 public:
  explicit Chain(std::vector<Job> jobs) : jobs_(std::move(jobs)) {}

  std::optional<Job> Next() override {
    return given_ < jobs_.size() && given_ == ended_
               ? std::optional(jobs_[given_++])
               : std::nullopt;
  }
  void End() { ++ended_; }

 private:
  std::vector<Job> jobs_;
  size_t given_ = 0;
  size_t ended_ = 0;
};

TEST_F(SlurmFarmTest, WhatAnOutcomeMakesNecessaryIsTheNextRound) {
  Chain chain(DeedJobs(3, "echo"));
  const auto take = collector_.Taker();
  const Status ran =
      Run(Options(), chain, [&](const Job& job, const Outcome& outcome) {
        chain.End();
        return take(job, outcome);
      });
  ASSERT_TRUE(ran.ok()) << ran.error().message;
  EXPECT_EQ(collector_.count(), 3U);
  EXPECT_EQ(slurm_.arrays_submitted(), 3);
}

TEST_F(SlurmFarmTest, AKilledTaskIsMadeUpForWithoutWhatItPublished) {
  const std::vector<Job> jobs = DeedJobs(120);
  FarmOptions options = Options();
  options.jobs_per_task = 60;
  options.workers_per_task = 1;
  const auto take = collector_.Taker();
  bool killed = false;
  size_t published_by_then = 0;
  JobList list(jobs);
  const Status ran =
      Run(options, list, [&](const Job& job, const Outcome& outcome) {
        if (!killed) {
          killed = true;
          published_by_then =
              static_cast<size_t>(CountResults(folder_.path() / "farm"));
          for (const pid_t task : slurm_.Tasks()) {
            ::kill(task, SIGKILL);
          }
        }
        return take(job, outcome);
      });
  ASSERT_TRUE(ran.ok()) << ran.error().message;
  EXPECT_GT(published_by_then, 0U);
  ExpectAllAsAPoolHasThem(jobs);
  EXPECT_EQ(slurm_.arrays_submitted(), 2);
  ExpectNoRounds();
}

struct LieRow {
  std::string lie;
  int times;
  int least_arrays;
};

// Slurm may forget tasks that run, lose sight of its controller, hold a task
// it could not start, and keep in its queue what has long ended.
TEST_F(SlurmFarmTest, NoLieOfSlurmsCostsOrDoublesAnOutcome) {
  const LieRow rows[] = {
      {"forgets", 2, 2},
      {"squeue-fails", 4, 1},
      {"held", 1, 2},
      {"never-ends", kForever, 1},
  };
  const std::vector<Job> jobs = DeedJobs(40);
  const AllSaid expected = SaidByPool(jobs, FAKE_WORKER);
  for (const LieRow& row : rows) {
    const FakeSlurm* const again = &slurm_;
    const int before = again->arrays_submitted();
    collector_ = Collector();
    slurm_.Lie(row.lie, row.times);
    const Status ran = Run(Options(), jobs);
    ASSERT_TRUE(ran.ok()) << row.lie << ": " << ran.error().message;
    EXPECT_EQ(collector_.said(), expected) << row.lie;
    EXPECT_GE(again->arrays_submitted() - before, row.least_arrays) << row.lie;
    ExpectNoRounds();
  }
}

TEST_F(SlurmFarmTest, AControllerThatStaysSilentEndsTheRun) {
  slurm_.Lie("squeue-fails", kForever);
  FarmOptions options = Options();
  options.patience = milliseconds(300);
  const std::string words =
      "squeue failed with exit code 1: slurm_load_jobs error: Unable to "
      "contact slurm controller (for 0.3 s now)";
  const Status ran = Run(options, DeedJobs(200));
  ASSERT_FALSE(ran.ok());
  EXPECT_EQ(ran.error().message, words);
  EXPECT_GT(collector_.count(), 0U);  // What was published is not lost.
}

TEST_F(SlurmFarmTest, AShareThatComesBackEmptyThreeTimesEndsTheRun) {
  FarmOptions options = Options();
  options.worker_program = "/nowhere/worker";
  const Status ran = Run(options, DeedJobs(3));
  ASSERT_FALSE(ran.ok());
  EXPECT_EQ(slurm_.arrays_submitted(), 3);
  ASSERT_EQ(Logs().size(), 3U);
  EXPECT_THAT(
      ran.error().message,
      MatchesRegex(".*/farm/round-[0-9a-f]*: 3 tasks in a row ended without a "
                   "result for share 0; the last, 3_0, said in "
                   ".*/farm/logs/round-[0-9a-f]*-share-0-3.log: gatedyno: "
                   "/nowhere/worker: cannot be started: No such file or "
                   "directory"));
}

TEST_F(SlurmFarmTest, RefusalsAreToldInSlurmsWords) {
  slurm_.Lie("sbatch-refuses", 1);
  const Status ran = Run(Options(), DeedJobs(3));
  ASSERT_FALSE(ran.ok());
  EXPECT_EQ(ran.error().message,
            "sbatch failed with exit code 1: sbatch: error: invalid partition "
            "specified: fast");
}

TEST_F(SlurmFarmTest, StopCancelsAndTakesInWhatWasPublished) {
  FarmOptions options = Options();
  options.publish_every = seconds(3600);  // Only when told to stop.
  options.jobs_per_task = 500;
  const auto stop_at = std::chrono::steady_clock::now() + seconds(1);
  options.should_stop = [&] {
    return std::chrono::steady_clock::now() >= stop_at;
  };
  const Status ran = Run(options, DeedJobs(1000));
  ASSERT_TRUE(ran.ok()) << ran.error().message;
  EXPECT_GT(collector_.count(), 0U);
  EXPECT_LT(collector_.count(), 500U);
  EXPECT_THAT(slurm_.Tasks(), IsEmpty());
  ExpectNoRounds();
}

TEST_F(SlurmFarmTest, WhatTheTakerRefusesEndsTheRun) {
  int calls = 0;
  JobList list(DeedJobs(50));
  const Status ran =
      Run(Options(), list, [&](const Job&, const Outcome&) -> Status {
        ++calls;
        return Unavailable("runs.db: disk full");
      });
  ASSERT_FALSE(ran.ok());
  EXPECT_EQ(ran.error().message, "runs.db: disk full");
  EXPECT_EQ(calls, 1);
  EXPECT_THAT(slurm_.Tasks(), IsEmpty());
  // Nothing is lost: the next run has it all.
  ASSERT_TRUE(Run(Options(), {}).ok());
  EXPECT_GT(collector_.count(), 0U);
  ExpectNoRounds();
}

// A child runs the farm and is killed; its tasks go on by themselves.
TEST_F(SlurmFarmTest, AKilledRunIsTakenUpByTheNext) {
  const std::vector<Job> jobs = DeedJobs(200);
  FarmOptions options = Options();
  options.jobs_per_task = 100;
  const pid_t child = ::fork();
  if (child == 0) {
    JobList list(jobs);
    const Status ran =
        Run(options, list, [](const Job&, const Outcome&) { return Ok(); });
    ::_exit(ran.ok() ? 0 : 1);
  }
  EXPECT_TRUE(
      WaitFor([&] { return CountResults(options.folder) >= 3; }, seconds(20)));
  ::kill(child, SIGKILL);
  ::waitpid(child, nullptr, 0);
  EXPECT_FALSE(slurm_.Tasks().empty());

  Result<SlurmFarm> farm = SlurmFarm::Make(options);
  ASSERT_TRUE(farm.ok());
  const Status recovered = farm->Recover(collector_.Taker());
  ASSERT_TRUE(recovered.ok()) << recovered.error().message;
  EXPECT_THAT(slurm_.Tasks(), IsEmpty());
  EXPECT_GT(collector_.count(), 0U);
  EXPECT_LT(collector_.count(), 200U);
  ExpectNoRounds();
  ASSERT_TRUE(Run(options, Without(jobs, collector_.said())).ok());
  ExpectAllAsAPoolHasThem(jobs);
}

TEST_F(SlurmFarmTest, TwoRunsDoNotShareAFolder) {
  JobList inner(DeedJobs(1));
  JobList list(DeedJobs(1));
  std::string message;
  ASSERT_TRUE(Run(Options(), list, [&](const Job&, const Outcome&) {
                const Status second =
                    Run(Options(), inner, [](const Job&, const Outcome&) {
                      return Ok();
                    });
                message = second.ok() ? "" : second.error().message;
                return Ok();
              }).ok());
  EXPECT_THAT(message,
              MatchesRegex(".*/farm: two runs cannot share a farm's folder: "
                           ".*/farm/farm: in use by the run of process .*"));
}

struct OptionRow {
  std::function<void(FarmOptions*)> set;
  std::string message;
};

TEST_F(SlurmFarmTest, OptionsOutOfRangeAreRefused) {
  const OptionRow rows[] = {
      {[](FarmOptions* o) { o->jobs_per_task = 0; },
       "jobs_per_task = 0: must be >= 1"},
      {[](FarmOptions* o) { o->workers_per_task = -1; },
       "workers_per_task = -1: must be >= 0"},
      {[](FarmOptions* o) { o->fruitless_tasks = 0; },
       "fruitless_tasks = 0: must be >= 1"},
      {[](FarmOptions* o) { o->folder = "/proc/farm"; },
       "/proc/farm: the farm's folder cannot be made: No such file or "
       "directory"},
  };
  for (const OptionRow& row : rows) {
    FarmOptions options = Options();
    row.set(&options);
    const auto farm = SlurmFarm::Make(options);
    ASSERT_FALSE(farm.ok()) << row.message;
    EXPECT_EQ(farm.error().message, row.message);
  }
}

}  // namespace
}  // namespace gatedyno
