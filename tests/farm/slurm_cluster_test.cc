// The farm on a real Slurm: two nodes on this machine, started for this
// program. Whatever befalls the tasks, the outcomes are those of a machine of
// our own, bit for bit.

#include <chrono>
#include <csignal>
#include <cstdlib>
#include <fstream>
#include <iostream>
#include <memory>

#include <fmt/format.h>
#include <gmock/gmock.h>
#include <gtest/gtest.h>
#include <sys/wait.h>

#include "harness/farm/command.h"
#include "harness/farm/slurm_farm.h"
#include "tests/farm/farm_bench.h"
#include "tests/support/temporary_folder.h"

namespace gatedyno {
namespace {

using std::chrono::milliseconds;
using std::chrono::seconds;

constexpr const char* kSupport = GATEDYNO_SOURCE_DIR "/tests/support/";
constexpr seconds kLong(60);

std::string Ask(const std::string& program,
                const std::vector<std::string>& arguments) {
  const auto end = RunCommand(program, arguments, kLong);
  EXPECT_TRUE(end.ok()) << end.error().message;
  return end.ok() ? end->output : "";
}

class Cluster : public testing::Environment {
 public:
  void SetUp() override {
    // Slurm's sockets need a short path.
    folder_ = "/tmp/gatedyno-slurm-XXXXXX";
    ASSERT_NE(::mkdtemp(folder_.data()), nullptr);
    Start();
  }
  void TearDown() override {
    if (skipped_.empty()) {
      EXPECT_THAT(
          Ask("bash", {kSupport + std::string("stop-slurm.sh"), folder_}),
          testing::HasSubstr("STOPPED"));
    }
    std::error_code ignored;
    std::filesystem::remove_all(folder_, ignored);
  }

  // Also starts what died.
  static void Start() {
    const auto end =
        RunCommand("bash",
                   {kSupport + std::string("start-slurm.sh"), folder_, "2"},
                   kLong);
    ASSERT_TRUE(end.ok()) << end.error().message;
    constexpr int kSkip = 77;
    if (end->exit_code == kSkip) {
      skipped_ = end->output;
      std::cout << skipped_;
      return;
    }
    ASSERT_EQ(end->exit_code, 0) << end->complaints;
    ::setenv("SLURM_CONF", (folder_ + "/etc/slurm.conf").c_str(), 1);
  }

  static void KillNode(const std::string& node) {
    Ask("bash", {kSupport + std::string("stop-slurm.sh"), folder_, node});
  }

  static const std::string& skipped() { return skipped_; }

 private:
  static inline std::string folder_;
  static inline std::string skipped_;
};

const auto* const kCluster = testing::AddGlobalTestEnvironment(new Cluster);

class SlurmClusterTest : public testing::Test {
 protected:
  void SetUp() override {
    if (!Cluster::skipped().empty()) {
      GTEST_SKIP() << Cluster::skipped();
    }
  }

  FarmOptions Options() const {
    FarmOptions options;
    options.folder = folder_.path() / "farm";
    options.program = FARM_TASK;
    options.worker_program = FAKE_WORKER;
    options.jobs_per_task = 50;
    options.workers_per_task = 1;
    options.publish_every = milliseconds(200);
    options.poll_interval = milliseconds(100);
    options.settle = milliseconds(300);
    return options;
  }

  // Runs `jobs`, and `meanwhile` once when the first outcome has come.
  void Run(
      const FarmOptions& options,
      const std::vector<Job>& jobs,
      const std::function<void()>& meanwhile = [] {}) {
    Result<SlurmFarm> farm = SlurmFarm::Make(options);
    ASSERT_TRUE(farm.ok());
    JobList list(jobs);
    const auto take = collector_.Taker();
    bool first = true;
    const auto start = std::chrono::steady_clock::now();
    const Status ran =
        farm->Run(list, [&](const Job& job, const Outcome& outcome) {
          if (std::exchange(first, false)) {
            meanwhile();
          }
          return take(job, outcome);
        });
    ASSERT_TRUE(ran.ok()) << ran.error().message;
    const std::chrono::duration<double> took =
        std::chrono::steady_clock::now() - start;
    RecordProperty("seconds", fmt::format("{:.1f}", took.count()));
    std::cout << fmt::format(
        "  {:.1f} s for {} jobs\n", took.count(), jobs.size());
  }

  void ExpectAllAsAPoolHasThem(const std::vector<Job>& jobs) {
    EXPECT_EQ(collector_.said(), SaidByPool(jobs, FAKE_WORKER));
    // A task on a node that died goes on "completing" until the node is missed.
    EXPECT_EQ(Ask("squeue", {"--noheader", "--states=PENDING,RUNNING"}), "");
  }

  // One task that runs there, as Slurm numbers it; empty if none does.
  static std::string RunningOn(const std::string& node) {
    std::string id =
        Ask("squeue", {"-h", "-r", "-t", "R", "-w", node, "-o", "%i"});
    return id.substr(0, id.find('\n'));
  }

  TemporaryFolder folder_;
  ScratchPlace scratch_;
  Collector collector_;
};

TEST_F(SlurmClusterTest, AnArrayRunsToItsEnd) {
  const std::vector<Job> jobs = DeedJobs(200);
  Run(Options(), jobs);
  ExpectAllAsAPoolHasThem(jobs);
}

TEST_F(SlurmClusterTest, ATaskKilledBySlurmIsMadeUpFor) {
  const std::vector<Job> jobs = DeedJobs(300);
  FarmOptions options = Options();
  options.jobs_per_task = 150;
  Run(options, jobs, [] {
    const std::string victim = RunningOn("node1");
    ASSERT_FALSE(victim.empty());
    Ask("scancel", {"--signal=KILL", "--full", victim});
  });
  ExpectAllAsAPoolHasThem(jobs);
}

TEST_F(SlurmClusterTest, ATaskWhoseProcessIsKilledIsMadeUpFor) {
  const std::vector<Job> jobs = DeedJobs(300);
  FarmOptions options = Options();
  options.jobs_per_task = 150;
  Run(options, jobs, [&] {
    const std::string victims =
        Ask("pgrep", {"-f", fmt::format("task {}", options.folder.string())});
    const pid_t victim = std::atoi(victims.c_str());
    ASSERT_GT(victim, 0);
    EXPECT_EQ(::kill(victim, SIGKILL), 0);
  });
  ExpectAllAsAPoolHasThem(jobs);
}

TEST_F(SlurmClusterTest, ANodeThatDiesMidArrayIsMadeUpFor) {
  const std::vector<Job> jobs = DeedJobs(1000);
  FarmOptions options = Options();
  options.jobs_per_task = 250;  // Two tasks on each node.
  Run(options, jobs, [] {
    ASSERT_FALSE(RunningOn("node2").empty());
    Cluster::KillNode("node2");
  });
  ExpectAllAsAPoolHasThem(jobs);
  // Slurm itself gave the tasks to another node.
  EXPECT_NE(Ask("scontrol", {"show", "job"}).find("Restarts=1"),
            std::string::npos);
  Cluster::Start();
}

// An RC step, to be measured at several places.
Job RcJob(int number) {
  Job job;
  job.label = fmt::format("rc {}", number);
  job.deck = fmt::format(
      "rc {}\nvin in 0 pulse(0 1 1n 1f 1f 1 2)\nr1 in out {}k\nc1 out 0 1p\n"
      ".options reltol=1e-5 chgtol=1e-18 trtol=1 num_threads=1\n"
      ".tran 5p 30n 0 5p\n.end\n",
      number,
      1.0 + 0.1 * number);
  job.key = Fingerprint(job.deck);
  job.stop_s = 30e-9;
  job.intervals = {
      {"value", {"in", 0.5, Edge::kRise, 1}, {"out", 0.5, Edge::kRise, 1}}};
  return job;
}

// The installed programs, simulator and all.
TEST_F(SlurmClusterTest, TheProgramsThemselvesGiveTheSameNumbers) {
  std::vector<Job> jobs;
  constexpr int kJobs = 40;
  for (int i = 0; i < kJobs; ++i) {
    jobs.push_back(RcJob(i));
  }
  FarmOptions options = Options();
  options.program = GATEDYNO_BIN_DIR "/gatedyno";
  options.worker_program.clear();
  options.workers_per_task = 0;
  options.jobs_per_task = 15;
  Run(options, jobs);
  const AllSaid by_pool = SaidByPool(jobs, GATEDYNO_BIN_DIR "/gatedyno-worker");
  EXPECT_EQ(collector_.said(), by_pool);
  for (const auto& [label, said] : by_pool) {
    EXPECT_EQ(said.ending, Ending::kMeasured) << label << ": " << said.message;
    EXPECT_GT(said.value, 0.0) << label;
  }
}

// One minute is the shortest limit Slurm knows, and its early notice then comes
// at its next look around, within half a minute.
TEST_F(SlurmClusterTest, ATaskOutOfTimeIsMadeUpFor) {
  const std::vector<Job> jobs = DeedJobs(1600);
  FarmOptions options = Options();
  options.jobs_per_task = 1600;
  options.sbatch_arguments = {"--time=1"};
  options.publish_every = seconds(3600);  // Only when told to stop.
  Run(options, jobs);
  ExpectAllAsAPoolHasThem(jobs);
  // The log of the task that did not come to its end.
  EXPECT_EQ(NamesIn(options.folder / "logs").size(), 2U);
}

TEST_F(SlurmClusterTest, ARunThatIsKilledIsTakenUpByTheNext) {
  const std::vector<Job> jobs = DeedJobs(800);
  FarmOptions options = Options();
  options.jobs_per_task = 200;
  const pid_t child = ::fork();
  if (child == 0) {
    Result<SlurmFarm> farm = SlurmFarm::Make(options);
    JobList list(jobs);
    const Status ran =
        farm->Run(list, [](const Job&, const Outcome&) { return Ok(); });
    ::_exit(ran.ok() ? 0 : 1);
  }
  EXPECT_TRUE(
      WaitFor([&] { return CountResults(options.folder) >= 3; }, seconds(20)));
  ::kill(child, SIGKILL);
  ::waitpid(child, nullptr, 0);
  Result<SlurmFarm> farm = SlurmFarm::Make(options);
  ASSERT_TRUE(farm.ok());
  const Status recovered = farm->Recover(collector_.Taker());
  ASSERT_TRUE(recovered.ok()) << recovered.error().message;
  EXPECT_GT(collector_.count(), 0U);
  EXPECT_LT(collector_.count(), jobs.size());
  Run(options, Without(jobs, collector_.said()));
  ExpectAllAsAPoolHasThem(jobs);
}

}  // namespace
}  // namespace gatedyno
