// The built worker program, through the pool and by hand.

#include <csignal>
#include <filesystem>
#include <fstream>
#include <map>
#include <string>
#include <thread>
#include <vector>

#include <boost/process.hpp>
#include <fmt/format.h>
#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "harness/sim/job_list.h"
#include "harness/sim/worker_pool.h"
#include "tests/support/leftovers.h"
#include "tests/support/temporary_folder.h"

namespace gatedyno {
namespace {

namespace bp = boost::process;
using testing::MatchesRegex;

const std::string& Program() {
  static const auto& program =
      *new std::string(GATEDYNO_BIN_DIR "/gatedyno-worker");
  return program;
}

Job RcJob(double ohm) {
  Job job;
  job.label = fmt::format("rc {} ohm", ohm);
  job.deck = fmt::format(
      "one rc\nvin in 0 pulse(0 1 0.1n 1f 1f 1 2)\nr1 in out {}\n"
      "c1 out 0 1p\n.tran 10p 10n\n.end\n",
      ohm);
  job.intervals = {
      {"delay", {"in", 0.5, Edge::kRise, 1}, {"out", 0.5, Edge::kRise, 1}}};
  job.stop_s = 10e-9;
  return job;
}

Job WithBody(std::string label, const std::string& body) {
  Job job = RcJob(1000.0);
  job.label = std::move(label);
  job.deck.insert(job.deck.find(".tran"), body);
  return job;
}

std::vector<Job> RcJobs(int count) {
  std::vector<Job> jobs;
  jobs.reserve(static_cast<size_t>(count));
  for (int i = 0; i < count; ++i) {
    jobs.push_back(RcJob(500.0 + 10.0 * i));
  }
  return jobs;
}

PoolOptions Options(int workers) {
  PoolOptions options;
  options.workers = workers;
  options.worker_program = Program();
  return options;
}

std::map<std::string, Outcome> RunAll(const PoolOptions& options,
                                      const std::vector<Job>& jobs) {
  Result<WorkerPool> pool = WorkerPool::Make(options);
  EXPECT_TRUE(pool.ok());
  std::map<std::string, Outcome> outcomes;
  JobList list(jobs);
  const Status status =
      pool->Run(list, [&](const Job& job, const Outcome& outcome) {
        outcomes[job.label] = outcome;
        return Ok();
      });
  EXPECT_TRUE(status.ok()) << status.error().message;
  return outcomes;
}

TEST(WorkerProgramTest, SaysItsVersionAndTheSimulators) {
  bp::ipstream printed;
  EXPECT_EQ(bp::system(Program(), "--version", bp::std_out > printed), 0);
  std::string line;
  std::getline(printed, line);
  EXPECT_THAT(line,
              MatchesRegex("gatedyno-worker [0-9.]+ \\(ngspice-.*, built "
                           ".*\\)"));
  Result<WorkerPool> pool = WorkerPool::Make(Options(1));
  ASSERT_TRUE(pool.ok()) << pool.error().message;
  const Result<std::string> simulator = pool->Simulator();
  ASSERT_TRUE(simulator.ok()) << simulator.error().message;
  EXPECT_THAT(line, testing::EndsWith(" (" + *simulator + ")"));
}

TEST(WorkerProgramTest, RefusesOptionsItDoesNotHave) {
  bp::ipstream complaint;
  EXPECT_EQ(bp::system(Program(), "--frob", bp::std_err > complaint), 2);
  std::string line;
  std::getline(complaint, line);
  EXPECT_EQ(line, "gatedyno-worker: --frob: no such option");
}

TEST(WorkerProgramTest, TheNumberOfWorkersChangesNoBit) {
  const long descriptors = OpenDescriptors();
  const std::vector<Job> jobs = RcJobs(12);
  const auto one = RunAll(Options(1), jobs);
  const auto two = RunAll(Options(2), jobs);
  ASSERT_EQ(one.size(), jobs.size());
  for (const auto& [label, outcome] : one) {
    ASSERT_TRUE(outcome.measured()) << outcome.message;
    EXPECT_GT(outcome.simulator_s, 0.0);
    EXPECT_EQ(outcome.values_s, two.at(label).values_s) << label;
  }
  EXPECT_FALSE(HasChildren());
  EXPECT_EQ(OpenDescriptors(), descriptors);
}

// Both make the library ask to be unloaded; the process is of no more use.
TEST(WorkerProgramTest, ASimulatorThatGivesUpCostsOnlyItsOwnJob) {
  std::vector<Job> jobs = RcJobs(6);
  jobs[1] = WithBody("expression", ".param a={b*2}\n");
  jobs[3] = WithBody("quits", ".control\nquit\n.endc\n");
  const auto outcomes = RunAll(Options(1), jobs);
  ASSERT_EQ(outcomes.size(), jobs.size());
  EXPECT_EQ(outcomes.at("expression").ending, Ending::kFailed);
  EXPECT_THAT(
      outcomes.at("expression").message,
      MatchesRegex("Netlist line no. 5: Undefined parameter \\[b\\].*"));
  EXPECT_EQ(outcomes.at("quits").ending, Ending::kFailed);
  EXPECT_EQ(outcomes.at("quits").message, "the deck makes the simulator quit");
  for (const size_t good : {0U, 2U, 4U, 5U}) {
    EXPECT_TRUE(outcomes.at(jobs[good].label).measured());
  }
}

// A deck may print to the standard output past the library's callbacks.
TEST(WorkerProgramTest, WhatADeckPrintsDoesNotReachTheProtocol) {
  const std::vector<Job> jobs = {
      WithBody("prints", ".control\nshell echo rubbish\n.endc\n"), RcJob(1.0)};
  const auto outcomes = RunAll(Options(1), jobs);
  EXPECT_TRUE(outcomes.at("prints").measured())
      << outcomes.at("prints").message;
  EXPECT_TRUE(outcomes.at(jobs[1].label).measured());
}

// The first child of `parent`, once there is one.
pid_t FirstChild(pid_t parent) {
  const std::string children =
      fmt::format("/proc/{0}/task/{0}/children", parent);
  pid_t child = 0;
  while (child == 0) {
    ::usleep(1'000);
    std::ifstream(children) >> child;
  }
  return child;
}

TEST(WorkerProgramTest, AKillInTheMiddleOfAJobIsForgiven) {
  std::vector<Job> jobs = RcJobs(4);
  Job& slow = jobs[0];  // About a second of work.
  slow.deck.replace(
      slow.deck.find(".tran"), std::string::npos, ".tran 10p 2u 0 10p\n.end\n");
  slow.stop_s = 2e-6;
  pid_t killed = 0;
  std::thread killer([&] {
    killed = FirstChild(::getpid());
    ::usleep(200'000);
    ::kill(killed, SIGKILL);
  });
  const auto outcomes = RunAll(Options(1), jobs);
  killer.join();
  EXPECT_NE(killed, 0);
  for (const Job& job : jobs) {
    EXPECT_TRUE(outcomes.at(job.label).measured()) << job.label;
  }
}

TEST(WorkerProgramTest, ALongRunIsKilledAtItsLimit) {
  Job job = RcJob(1000.0);
  job.label = "long";
  const size_t analysis = job.deck.find(".tran");
  job.deck.replace(analysis, std::string::npos, ".tran 1f 1m 0 1f\n.end\n");
  job.time_limit_s = 0.5;
  const auto outcomes = RunAll(Options(1), {job, RcJob(1.0)});
  EXPECT_EQ(outcomes.at("long").ending, Ending::kTimedOut);
  EXPECT_EQ(outcomes.at("long").message,
            "lost 3 workers; the last was silent for 0.5 s");
  EXPECT_TRUE(outcomes.at(RcJob(1.0).label).measured());
}

TEST(WorkerProgramTest, AJobTooLargeForItsMemoryFailsAlone) {
  Job job = RcJob(1000.0);
  job.label = "large";
  job.deck.replace(
      job.deck.find(".tran"), std::string::npos, ".tran 1p 1m 0 1p\n.end\n");
  PoolOptions options = Options(1);
  options.memory_limit_bytes = std::uint64_t{256} << 20U;
  const auto outcomes = RunAll(options, {job, RcJob(1.0)});
  EXPECT_EQ(outcomes.at("large").ending, Ending::kFailed);
  EXPECT_EQ(outcomes.at("large").message,
            "malloc: Internal Error: can't allocate 8000000800 bytes.");
  EXPECT_TRUE(outcomes.at(RcJob(1.0).label).measured());
}

// Somebody's start-up file would change results unseen.
TEST(WorkerProgramTest, NoStartUpFileIsRead) {
  TemporaryFolder folder;
  const auto marker = folder.path() / "read";
  folder.Write(".spiceinit", fmt::format("shell touch {}\n", marker.string()));
  bp::ipstream printed;
  EXPECT_EQ(bp::system(Program(),
                       "--version",
                       bp::start_dir = folder.path().string(),
                       bp::std_out > printed),
            0);
  EXPECT_FALSE(std::filesystem::exists(marker));
}

TEST(WorkerProgramTest, DiesWithTheProgramThatStartedIt) {
  TemporaryFolder folder;
  // A shell that starts a worker and waits.  The worker holds its own input
  // open, so that only the shell's death can end it.
  const auto script = folder.WriteScript(
      "parent",
      fmt::format("mkfifo {0}/jobs\n{1} <>{0}/jobs >{0}/replies &\nwait\n",
                  folder.path().string(),
                  Program()));
  bp::child parent(script.string());
  const auto replies = folder.path() / "replies";
  const auto is_ready = [&] {  // It has said hello.
    std::error_code failed;
    return std::filesystem::file_size(replies, failed) > 0 && !failed;
  };
  while (!is_ready()) {
    ::usleep(1'000);
  }
  const pid_t worker = FirstChild(parent.id());
  ::kill(parent.id(), SIGKILL);
  parent.wait();
  const std::filesystem::path process = fmt::format("/proc/{}", worker);
  for (int i = 0; i < 5'000 && std::filesystem::exists(process); ++i) {
    ::usleep(1'000);
  }
  EXPECT_FALSE(std::filesystem::exists(process));
  ::kill(worker, SIGKILL);
}

}  // namespace
}  // namespace gatedyno
