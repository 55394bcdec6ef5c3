// Jobs for a farm of fake workers, and what must come of them.

#ifndef GATEDYNO_TESTS_FARM_FARM_BENCH_H_
#define GATEDYNO_TESTS_FARM_FARM_BENCH_H_

#include <chrono>
#include <cstdlib>
#include <deque>
#include <filesystem>
#include <functional>
#include <map>
#include <optional>
#include <string>
#include <utility>
#include <vector>

#include <fmt/format.h>
#include <gtest/gtest.h>
#include <unistd.h>

#include "harness/base/fingerprint.h"
#include "harness/farm/slurm_farm.h"
#include "harness/sim/job_list.h"
#include "harness/sim/worker_pool.h"
#include "tests/support/temporary_folder.h"

namespace gatedyno {

inline Job DeedJob(const std::string& deed, int number) {
  Job job;
  job.label = fmt::format("{} {}", deed, number);
  job.deck = fmt::format("{}\n{}", deed, number);
  job.key = Fingerprint(job.deck);
  job.time_limit_s = 20.0;
  return job;
}

// A doze takes 0.02 s.
inline std::vector<Job> DeedJobs(int count, const std::string& deed = "doze") {
  std::vector<Job> jobs;
  for (int i = 0; i < count; ++i) {
    jobs.push_back(DeedJob(deed, i));
  }
  return jobs;
}

// What an outcome says of its job, and not of the worker that had it.
struct Said {
  Ending ending = Ending::kFailed;
  double value = 0.0;
  std::string message;

  bool operator==(const Said&) const = default;
};

// By label.
using AllSaid = std::map<std::string, Said>;

inline Said WhatWasSaid(const Outcome& outcome) {
  const auto value = outcome.values_s.find("value");
  return {outcome.ending,
          value == outcome.values_s.end() ? 0.0 : value->second,
          outcome.message};
}

// Takes outcomes, each label once.
class Collector {
 public:
  SimRunner::OnOutcome Taker() {
    return [this](const Job& job, const Outcome& outcome) {
      EXPECT_TRUE(said_.emplace(job.label, WhatWasSaid(outcome)).second)
          << job.label << " ended twice";
      return Ok();
    };
  }
  size_t count() const { return said_.size(); }
  const AllSaid& said() const { return said_; }

 private:
  AllSaid said_;
};

// The same jobs on a machine of our own: what a farm must come to.
inline AllSaid SaidByPool(const std::vector<Job>& jobs,
                          const std::filesystem::path& worker) {
  PoolOptions options;
  options.workers = 16;  // Dozing takes no processor.
  options.worker_program = worker;
  Result<WorkerPool> pool = WorkerPool::Make(options);
  EXPECT_TRUE(pool.ok());
  Collector collector;
  JobList list(jobs);
  const Status ran = pool->Run(list, collector.Taker());
  EXPECT_TRUE(ran.ok()) << ran.error().message;
  return collector.said();
}

// The jobs of a list that have no outcome yet: what a source with a store
// behind it offers in a second run.
inline std::vector<Job> Without(const std::vector<Job>& jobs,
                                const AllSaid& said) {
  std::vector<Job> rest;
  for (const Job& job : jobs) {
    if (!said.contains(job.label)) {
      rest.push_back(job);
    }
  }
  return rest;
}

inline std::vector<std::string> NamesIn(const std::filesystem::path& folder) {
  std::vector<std::string> names;
  std::error_code none;
  for (const auto& entry : std::filesystem::directory_iterator(folder, none)) {
    names.push_back(entry.path().filename().string());
  }
  return names;
}

// Where scratch folders are made while one lives: a task that is killed leaves
// its own behind.
class ScratchPlace {
 public:
  ScratchPlace() { ::setenv("TMPDIR", folder_.path().c_str(), 1); }
  ~ScratchPlace() { ::unsetenv("TMPDIR"); }
  ScratchPlace(const ScratchPlace&) = delete;
  ScratchPlace& operator=(const ScratchPlace&) = delete;

  size_t entries() const { return NamesIn(folder_.path()).size(); }

 private:
  TemporaryFolder folder_;
};

inline bool WaitFor(const std::function<bool()>& what,
                    std::chrono::seconds limit) {
  const auto end = std::chrono::steady_clock::now() + limit;
  while (!what()) {
    if (std::chrono::steady_clock::now() > end) {
      return false;
    }
    ::usleep(10'000);
  }
  return true;
}

// Result files in the farm's folder now.
inline int CountResults(const std::filesystem::path& folder) {
  int count = 0;
  std::error_code ended;
  for (std::filesystem::recursive_directory_iterator entry(folder, ended);
       !ended && entry != std::filesystem::recursive_directory_iterator();
       entry.increment(ended)) {
    count += entry->path().extension() == ".result" ? 1 : 0;
  }
  return count;
}

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_FARM_FARM_BENCH_H_
