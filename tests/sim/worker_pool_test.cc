#include "harness/sim/worker_pool.h"

#include <chrono>
#include <csignal>
#include <map>
#include <optional>
#include <set>
#include <string>
#include <vector>

#include <fmt/format.h>
#include <gmock/gmock.h>
#include <gtest/gtest.h>
#include <sys/time.h>
#include <unistd.h>

#include "harness/sim/job_list.h"
#include "tests/support/leftovers.h"
#include "tests/support/temporary_folder.h"

namespace gatedyno {
namespace {

using testing::HasSubstr;

// Job labels are unique; a run's outcomes by label, each seen exactly once.
using Outcomes = std::map<std::string, Outcome>;

Job DeedJob(std::string deed, std::string label) {
  Job job;
  job.deck = std::move(deed);
  job.deck += "\n" + label;
  job.label = std::move(label);
  job.time_limit_s = 20.0;
  return job;
}

std::vector<Job> EchoJobs(int count, std::string_view deed = "echo") {
  std::vector<Job> jobs;
  jobs.reserve(static_cast<size_t>(count));
  for (int i = 0; i < count; ++i) {
    jobs.push_back(DeedJob(std::string(deed), fmt::format("job {}", i)));
  }
  return jobs;
}

class WorkerPoolTest : public testing::Test {
 protected:
  void TearDown() override {
    EXPECT_FALSE(HasChildren());
    EXPECT_EQ(OpenDescriptors(), descriptors_before_);
  }

  static PoolOptions Options(int workers) {
    PoolOptions options;
    options.workers = workers;
    options.worker_program = FAKE_WORKER;
    return options;
  }

  // Runs `jobs` on a pool of its own.
  static Outcomes Run(PoolOptions options, const std::vector<Job>& jobs) {
    Result<WorkerPool> pool = WorkerPool::Make(std::move(options));
    EXPECT_TRUE(pool.ok());
    return Run(&*pool, jobs);
  }

  static Outcomes Run(WorkerPool* pool, const std::vector<Job>& jobs) {
    Outcomes outcomes;
    JobList list(jobs);
    const Status status =
        pool->Run(list, [&](const Job& job, const Outcome& outcome) {
          EXPECT_TRUE(outcomes.emplace(job.label, outcome).second)
              << job.label << " ended twice";
          return Ok();
        });
    EXPECT_TRUE(status.ok()) << status.error().message;
    return outcomes;
  }

  static std::set<double> WorkersOf(const Outcomes& outcomes) {
    std::set<double> workers;
    for (const auto& [label, outcome] : outcomes) {
      workers.insert(outcome.values_s.at("worker"));
    }
    return workers;
  }

  long descriptors_before_ = OpenDescriptors();
  TemporaryFolder folder_;
};

TEST_F(WorkerPoolTest, RunsEveryJobOnce) {
  const Outcomes outcomes = Run(Options(3), EchoJobs(200));
  EXPECT_EQ(outcomes.size(), 200U);
  for (const auto& [label, outcome] : outcomes) {
    EXPECT_TRUE(outcome.measured()) << label;
  }
}

TEST_F(WorkerPoolTest, NothingToDoIsDone) {
  EXPECT_TRUE(Run(Options(2), {}).empty());
}

TEST_F(WorkerPoolTest, TheNumberOfWorkersChangesNoResult) {
  const std::vector<Job> jobs = EchoJobs(50);
  const Outcomes one = Run(Options(1), jobs);
  const Outcomes two = Run(Options(2), jobs);
  ASSERT_EQ(one.size(), two.size());
  for (const auto& [label, outcome] : one) {
    EXPECT_EQ(outcome.values_s.at("value"), two.at(label).values_s.at("value"));
  }
}

TEST_F(WorkerPoolTest, UsesAllWorkersAndNoMoreThanThereAreJobs) {
  EXPECT_EQ(WorkersOf(Run(Options(3), EchoJobs(30, "doze"))).size(), 3U);
  EXPECT_EQ(WorkersOf(Run(Options(8), EchoJobs(2, "doze"))).size(), 2U);
}

TEST_F(WorkerPoolTest, KeepsItsWorkersForTheNextRun) {
  Result<WorkerPool> pool = WorkerPool::Make(Options(1));
  ASSERT_TRUE(pool.ok());
  const std::set<double> first = WorkersOf(Run(&*pool, EchoJobs(3)));
  const std::set<double> second = WorkersOf(Run(&*pool, EchoJobs(3)));
  EXPECT_EQ(first, second);
  // One that died meanwhile is replaced, and no job is blamed.
  ::kill(static_cast<pid_t>(*first.begin()), SIGKILL);
  ::usleep(50'000);
  EXPECT_NE(WorkersOf(Run(&*pool, EchoJobs(3))), first);
}

TEST_F(WorkerPoolTest, ReplacesAWorkerAfterItsShareOfJobs) {
  PoolOptions options = Options(1);
  options.jobs_per_worker = 10;
  EXPECT_EQ(WorkersOf(Run(options, EchoJobs(45))).size(), 5U);
}

TEST_F(WorkerPoolTest, ReplacesAWorkerWhoseSimulatorGaveUp) {
  std::vector<Job> jobs = EchoJobs(6);
  jobs[1] = DeedJob("leave", "leaves");
  const Outcomes outcomes = Run(Options(1), jobs);
  EXPECT_EQ(outcomes.size(), 6U);
  EXPECT_TRUE(outcomes.at("leaves").measured());
  EXPECT_EQ(WorkersOf(outcomes).size(), 2U);
}

struct DeathRow {
  std::string deed;
  std::string message;
};

// Each of these takes three workers with it; its neighbours are unharmed.
TEST_F(WorkerPoolTest, SetsAsideAJobThatKillsWorkers) {
  const DeathRow rows[] = {
      {"crash", "lost 3 workers; the last was killed by SIGSEGV"},
      {"crash with words",
       "lost 3 workers; the last was killed by SIGABRT: malloc(): corrupted "
       "top size; second line"},
      {"exit", "lost 3 workers; the last left with exit code 3"},
      {"babble",
       "lost 3 workers; the last sent rubbish: a frame of 1702129486 bytes "
       "is over the limit of 67108864"},
      {"half a frame",
       "lost 3 workers; the last sent rubbish: the stream ended after 6 of a "
       "frame's 155 bytes"},
      {"no json",
       "lost 3 workers; the last sent rubbish: not a reply: 'hello?'"},
      {"no outcome",
       "lost 3 workers; the last sent rubbish: not a reply: it holds no "
       "outcome"},
  };
  for (const int workers : {1, 2}) {
    for (const DeathRow& row : rows) {
      std::vector<Job> jobs = EchoJobs(8);
      jobs[2] = DeedJob(row.deed, "bad");
      const Outcomes outcomes = Run(Options(workers), jobs);
      ASSERT_EQ(outcomes.size(), 8U) << row.deed;
      for (const auto& [label, outcome] : outcomes) {
        EXPECT_EQ(outcome.measured(), label != "bad") << label;
      }
      EXPECT_EQ(outcomes.at("bad").ending, Ending::kCrashed) << row.deed;
      if (row.deed != "half a frame") {
        EXPECT_EQ(outcomes.at("bad").message, row.message);
      } else {  // The length holds the process number.
        EXPECT_THAT(outcomes.at("bad").message,
                    HasSubstr("the stream ended after 6 of a frame's "));
      }
    }
  }
}

TEST_F(WorkerPoolTest, OneDeathIsForgivenAndTheJobRunsAgain) {
  std::vector<Job> jobs = EchoJobs(5);
  const std::string marker = (folder_.path() / "crashed").string();
  jobs[1] = DeedJob("crash once", marker);
  const Outcomes outcomes = Run(Options(2), jobs);
  EXPECT_EQ(outcomes.size(), 5U);
  EXPECT_TRUE(outcomes.at(marker).measured());
}

TEST_F(WorkerPoolTest, ManyKillersAmongManyJobsAreAllFound) {
  std::vector<Job> jobs = EchoJobs(60);
  for (size_t i = 0; i < jobs.size(); i += 7) {
    jobs[i] = DeedJob("crash", jobs[i].label);
  }
  const Outcomes outcomes = Run(Options(3), jobs);
  ASSERT_EQ(outcomes.size(), jobs.size());
  for (size_t i = 0; i < jobs.size(); ++i) {
    EXPECT_EQ(outcomes.at(jobs[i].label).ending,
              i % 7 == 0 ? Ending::kCrashed : Ending::kMeasured);
  }
}

TEST_F(WorkerPoolTest, KillsAtTheTimeLimitAndGoesOn) {
  std::vector<Job> jobs = EchoJobs(6);
  jobs[0] = DeedJob("hang", "hangs");
  jobs[0].time_limit_s = 0.25;
  const auto start = std::chrono::steady_clock::now();
  const Outcomes outcomes = Run(Options(1), jobs);
  const auto took = std::chrono::steady_clock::now() - start;
  ASSERT_EQ(outcomes.size(), 6U);
  EXPECT_EQ(outcomes.at("hangs").ending, Ending::kTimedOut);
  EXPECT_EQ(outcomes.at("hangs").message,
            "lost 3 workers; the last was silent for 0.25 s");
  EXPECT_TRUE(outcomes.at("job 1").measured());
  EXPECT_GE(took, std::chrono::milliseconds(750));
  EXPECT_LT(took, std::chrono::seconds(5));
}

// A job's limit starts when the one before it has ended, and an answer that
// came while this program was busy is not too late.
TEST_F(WorkerPoolTest, WaitingIsNotHeldAgainstAJob) {
  std::vector<Job> jobs = EchoJobs(6, "doze");
  for (Job& job : jobs) {
    job.time_limit_s = 0.1;  // A doze takes 0.02 s.
  }
  Result<WorkerPool> pool = WorkerPool::Make(Options(1));
  ASSERT_TRUE(pool.ok());
  JobList list(jobs);
  const Status status = pool->Run(list, [](const Job&, const Outcome& outcome) {
    EXPECT_TRUE(outcome.measured()) << outcome.message;
    ::usleep(150'000);
    return Ok();
  });
  EXPECT_TRUE(status.ok());
}

TEST_F(WorkerPoolTest, AWorkerThatChattersIsHeardOut) {
  const Outcomes outcomes = Run(Options(1), {DeedJob("chatter", "c")});
  EXPECT_TRUE(outcomes.at("c").measured());
}

TEST_F(WorkerPoolTest, LargeDecksDoNotBlock) {
  std::vector<Job> jobs = EchoJobs(6);
  for (Job& job : jobs) {
    job.deck += std::string(1'000'000, '*');
  }
  EXPECT_EQ(Run(Options(2), jobs).size(), 6U);
}

// A job that is refused or hangs climbs the rungs of its settings, and the
// outcome says which one it ended on.
TEST_F(WorkerPoolTest, ARefusedJobIsTriedWithItsNextSettings) {
  Job job = DeedJob("refuse unless careful", "climbs");
  job.settings = {"quick\n", "slower\n", "careful\n"};
  Job hopeless = job;
  hopeless.label = "hopeless";
  hopeless.settings = {"quick\n", "slower\n"};
  const Outcomes outcomes = Run(Options(1), {job, hopeless});
  EXPECT_TRUE(outcomes.at("climbs").measured());
  EXPECT_EQ(outcomes.at("climbs").rung, 2);
  EXPECT_EQ(outcomes.at("hopeless").ending, Ending::kFailed);
  EXPECT_EQ(outcomes.at("hopeless").message, "refused with slower");
  EXPECT_EQ(outcomes.at("hopeless").rung, 1);
}

// Whoever kills a worker must not change a result.
TEST_F(WorkerPoolTest, AJobWhoseWorkerWasTakenAwayRunsAgainAsItWas) {
  const std::string marker = (folder_.path() / "taken").string();
  Job job = DeedJob("crash once", marker);
  job.settings = {"quick\n", "careful\n"};
  const Outcomes outcomes = Run(Options(1), {job});
  EXPECT_TRUE(outcomes.at(marker).measured());
  EXPECT_EQ(outcomes.at(marker).rung, 0);
}

// Offers a job for each outcome until there were `count`.
class FollowUps : public JobSource {
 public:
  explicit FollowUps(int count) : left_(count) {}

  std::optional<Job> Next() override {
    if (!may_offer_ || left_ == 0) {
      return std::nullopt;
    }
    may_offer_ = false;
    return DeedJob("echo", fmt::format("job {}", left_--));
  }
  void OnOutcome() { may_offer_ = true; }

 private:
  bool may_offer_ = true;
  int left_;
};

TEST_F(WorkerPoolTest, AnOutcomeMayBringMoreJobs) {
  Result<WorkerPool> pool = WorkerPool::Make(Options(2));
  ASSERT_TRUE(pool.ok());
  FollowUps jobs(12);
  int ended = 0;
  const Status status = pool->Run(jobs, [&](const Job&, const Outcome&) {
    jobs.OnOutcome();
    ++ended;
    return Ok();
  });
  EXPECT_TRUE(status.ok());
  EXPECT_EQ(ended, 12);
}

// The store is full, say: nothing more is started, and the reason comes back.
TEST_F(WorkerPoolTest, AnOutcomeThatCannotBeKeptEndsTheRun) {
  Result<WorkerPool> pool = WorkerPool::Make(Options(2));
  ASSERT_TRUE(pool.ok());
  JobList jobs(EchoJobs(100));
  int ended = 0;
  const Status status = pool->Run(jobs, [&](const Job&, const Outcome&) {
    return ++ended < 5 ? Ok() : Status(Unavailable("disk full"));
  });
  ASSERT_FALSE(status.ok());
  EXPECT_EQ(status.error().message, "disk full");
  EXPECT_LE(ended, 5 + 4);  // Two workers, two jobs each.
  // And the pool is as good as new.
  EXPECT_EQ(Run(&*pool, EchoJobs(10)).size(), 10U);
}

TEST_F(WorkerPoolTest, SaysWhichSimulatorItHas) {
  Result<WorkerPool> pool = WorkerPool::Make(Options(2));
  ASSERT_TRUE(pool.ok());
  const Result<std::string> simulator = pool->Simulator();
  ASSERT_TRUE(simulator.ok()) << simulator.error().message;
  EXPECT_EQ(*simulator, "none");
}

struct StartRow {
  std::string script;
  std::string message;
};

TEST_F(WorkerPoolTest, FailsNamingAProgramThatNeverGetsReady) {
  const StartRow rows[] = {
      {"echo libngspice.so.0: not found >&2; exit 127",
       "the worker left with exit code 127: libngspice.so.0: not found before "
       "it was ready"},
      {"kill -KILL $$", "the worker was killed by SIGKILL before it was ready"},
      {"echo Note: no compatibility mode",
       "a frame of 1702129486 bytes is over the limit of 67108864"},
      {"printf '\\016\\000\\000\\000{\"protocol\":3}'; sleep 9",
       "the worker speaks protocol 3, this program 2: install both programs "
       "from one build"},
  };
  for (const StartRow& row : rows) {
    PoolOptions options = Options(2);
    options.worker_program = folder_.WriteScript("worker", row.script);
    const std::string message =
        options.worker_program.string() + ": " + row.message;
    Result<WorkerPool> pool = WorkerPool::Make(options);
    ASSERT_TRUE(pool.ok());
    JobList jobs(EchoJobs(3));
    const Status status = pool->Run(jobs, [](const Job&, const Outcome&) {
      ADD_FAILURE() << "an outcome without a worker";
      return Ok();
    });
    ASSERT_FALSE(status.ok());
    EXPECT_EQ(status.error().kind, ErrorKind::kUnavailable);
    EXPECT_EQ(status.error().message, message);
    const Result<std::string> identity = pool->Simulator();
    ASSERT_FALSE(identity.ok());
    EXPECT_EQ(identity.error().message, message);
  }
}

TEST_F(WorkerPoolTest, FailsNamingAProgramThatDoesNotExist) {
  PoolOptions options = Options(2);
  options.worker_program = "/nowhere/gatedyno-worker";
  Result<WorkerPool> pool = WorkerPool::Make(options);
  ASSERT_TRUE(pool.ok());
  JobList jobs(EchoJobs(1));
  const Status status =
      pool->Run(jobs, [](const Job&, const Outcome&) { return Ok(); });
  ASSERT_FALSE(status.ok());
  EXPECT_EQ(status.error().message,
            "/nowhere/gatedyno-worker: cannot be started: No such file or "
            "directory");
}

TEST_F(WorkerPoolTest, AStartThatFailsNowAndThenIsTriedAgain) {
  PoolOptions options = Options(1);
  const std::string flag = (folder_.path() / "started").string();
  options.worker_program = folder_.WriteScript(
      "worker",
      fmt::format("if mkdir {}; then exit 1; fi; exec {}", flag, FAKE_WORKER));
  EXPECT_EQ(Run(options, EchoJobs(3)).size(), 3U);
}

TEST_F(WorkerPoolTest, ASignalToThisProgramInterruptsNothing) {
  struct sigaction action = {};
  struct sigaction before = {};
  action.sa_handler = [](int) {};
  ASSERT_EQ(::sigaction(SIGALRM, &action, &before), 0);
  const itimerval every_ms = {{0, 1000}, {0, 1000}};
  const itimerval never = {};
  ASSERT_EQ(::setitimer(ITIMER_REAL, &every_ms, nullptr), 0);
  EXPECT_EQ(Run(Options(2), EchoJobs(40, "doze")).size(), 40U);
  ::setitimer(ITIMER_REAL, &never, nullptr);
  ::sigaction(SIGALRM, &before, nullptr);
}

struct OptionRow {
  int workers;
  int jobs_per_worker;
  int kills_before_aside;
  std::string message;
};

TEST(PoolOptionsTest, OutOfRangeIsRefused) {
  const OptionRow rows[] = {
      {-1, 1, 1, "workers = -1: must be >= 0"},
      {1, 0, 1, "jobs_per_worker = 0: must be >= 1"},
      {1, 1, 0, "kills_before_aside = 0: must be >= 1"},
  };
  for (const OptionRow& row : rows) {
    PoolOptions options;
    options.workers = row.workers;
    options.jobs_per_worker = row.jobs_per_worker;
    options.kills_before_aside = row.kills_before_aside;
    const Result<WorkerPool> pool = WorkerPool::Make(options);
    ASSERT_FALSE(pool.ok());
    EXPECT_EQ(pool.error().message, row.message);
  }
}

}  // namespace
}  // namespace gatedyno
