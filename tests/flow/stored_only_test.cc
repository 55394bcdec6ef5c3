#include "harness/flow/stored_only.h"

#include <map>
#include <string>
#include <vector>

#include <gtest/gtest.h>

#include "harness/flow/characterize.h"
#include "harness/flow/work_desk.h"
#include "harness/sim/job_list.h"
#include "harness/sim/table_runner.h"

namespace gatedyno {
namespace {

constexpr const char* kSimulator = "formula 1";

Store MemoryStore() {
  Result<Store> store = Store::Open(":memory:");
  EXPECT_TRUE(store.ok()) << store.error().message;
  return *std::move(store);
}

Job JobOf(const std::string& key) {
  Job job;
  job.key = key;
  job.label = key;
  job.deck = "* deck\n.end\n";
  return job;
}

TEST(StoredOnlyTest, AJobEndsAsItDidInTheStore) {
  Store store = MemoryStore();
  Outcome timed_out;
  timed_out.ending = Ending::kTimedOut;
  timed_out.message = "after 60 s";
  ASSERT_TRUE(
      store.SaveOutcome(JobOf("a"), MeasuredOutcome({{"delay", 1e-12}})).ok());
  ASSERT_TRUE(store.SaveOutcome(JobOf("b"), timed_out).ok());
  StoredOnly runner(&store);
  JobList jobs({JobOf("a"), JobOf("b"), JobOf("c")});
  std::map<std::string, Outcome> ends;
  ASSERT_TRUE(runner
                  .Run(jobs,
                       [&](const Job& job, const Outcome& outcome) {
                         ends[job.key] = outcome;
                         return Ok();
                       })
                  .ok());
  EXPECT_EQ(runner.missing(), 1);
  EXPECT_EQ(ends.at("a").values_s.at("delay"), 1e-12);
  EXPECT_EQ(ends.at("b").ending, Ending::kTimedOut);
  EXPECT_EQ(ends.at("b").message, "after 60 s");
  EXPECT_EQ(ends.at("c").ending, Ending::kFailed);
  EXPECT_EQ(ends.at("c").message, "not in the store");
  EXPECT_FALSE(store.FindJob("c")->has_value());
}

TEST(StoredOnlyTest, EndsWithWhoeverTakesTheOutcomes) {
  Store store = MemoryStore();
  StoredOnly runner(&store);
  JobList jobs({JobOf("a"), JobOf("b")});
  const Status ended = runner.Run(jobs, [](const Job&, const Outcome&) {
    return Status(Unavailable("no more"));
  });
  ASSERT_FALSE(ended.ok());
  EXPECT_EQ(ended.error().message, "no more");
  EXPECT_EQ(runner.missing(), 1);
}

PreparedRun Prepared(const std::vector<std::string>& cells,
                     const std::vector<double>& fanouts = {}) {
  Plan plan;
  plan.node = "p45";
  plan.cells = cells;
  plan.fanouts = fanouts;
  Result<PreparedRun> run = PrepareRun(plan);
  EXPECT_TRUE(run.ok()) << run.error().message;
  return *std::move(run);
}

// A straight line of every arc, in seconds: "inv a->y h=4 typical".
Outcome Straight(const Job& job) {
  const size_t at = job.label.find(" h=") + std::string(" h=").size();
  const double delay = 2e-12 * (std::stod(job.label.substr(at)) + 1.0);
  return MeasuredOutcome({{"delay_rise", delay},
                          {"delay_fall", delay},
                          {"input_rise", 5e-12},
                          {"input_fall", 5e-12},
                          {"output_rise", 6e-12},
                          {"output_fall", 6e-12}});
}

RunResult Simulate(const PreparedRun& run, Store* store) {
  TableRunner runner(Straight);
  WorkDesk desk(&runner, store, {});
  Result<RunResult> result = Characterize(run, kSimulator, &desk);
  EXPECT_TRUE(result.ok()) << result.error().message;
  return *std::move(result);
}

TEST(CharacterizeFromStoreTest, GivesWhatTheRunGave) {
  Store store = MemoryStore();
  const PreparedRun run = Prepared({"inv", "nand2"});
  const RunResult simulated = Simulate(run, &store);
  const Result<FromStore> again =
      CharacterizeFromStore(run, kSimulator, &store);
  ASSERT_TRUE(again.ok()) << again.error().message;
  EXPECT_EQ(again->missing_jobs, 0);
  EXPECT_EQ(again->result.jobs.wanted, simulated.jobs.wanted);
  EXPECT_EQ(again->result.jobs.reused, simulated.jobs.wanted);
  EXPECT_EQ(again->result.jobs.simulated, 0);
  ASSERT_EQ(again->result.comparisons.size(), simulated.comparisons.size());
  for (size_t i = 0; i < simulated.comparisons.size(); ++i) {
    EXPECT_EQ(again->result.comparisons[i].effort.value,
              simulated.comparisons[i].effort.value);
    EXPECT_EQ(again->result.comparisons[i].verdict,
              simulated.comparisons[i].verdict);
  }
}

TEST(CharacterizeFromStoreTest, WhatTheStoreDoesNotHaveIsNotMeasured) {
  Store store = MemoryStore();
  Simulate(Prepared({"inv"}), &store);
  const Result<FromStore> more =
      CharacterizeFromStore(Prepared({"inv", "nand2"}), kSimulator, &store);
  ASSERT_TRUE(more.ok()) << more.error().message;
  EXPECT_GE(more->missing_jobs, 6);  // Three fanouts of two pins.
  for (const Comparison& row : more->result.comparisons) {
    const bool known = row.arc.cell == "inv";
    EXPECT_EQ(row.verdict == Verdict::kNotMeasured, !known) << row.arc.cell;
    EXPECT_EQ(row.reason,
              known ? "" : "h=1: failed: not in the store (and 2 more)");
  }
}

TEST(CharacterizeFromStoreTest, AnotherSimulatorIsAnotherJob) {
  Store store = MemoryStore();
  const PreparedRun run = Prepared({"inv"});
  Simulate(run, &store);
  const Result<FromStore> other =
      CharacterizeFromStore(run, "formula 2", &store);
  ASSERT_TRUE(other.ok()) << other.error().message;
  EXPECT_GT(other->missing_jobs, 0);
  EXPECT_EQ(other->result.jobs.reused, 0);
}

}  // namespace
}  // namespace gatedyno
