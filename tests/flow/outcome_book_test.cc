#include "harness/flow/outcome_book.h"

#include <string>
#include <vector>

#include <gtest/gtest.h>

#include "harness/sim/table_runner.h"

namespace gatedyno {
namespace {

Job JobOf(const std::string& key) {
  Job job;
  job.key = key;
  job.label = "label " + key;
  job.deck = "* deck " + key + "\n.end\n";
  return job;
}

std::vector<Job> JobsOf(const std::vector<std::string>& keys) {
  std::vector<Job> jobs;
  for (const std::string& key : keys) {
    jobs.push_back(JobOf(key));
  }
  return jobs;
}

Outcome Failed(const std::string& message) {
  Outcome outcome;
  outcome.message = message;
  return outcome;
}

// Measures every job but those whose key begins with "bad".
TableRunner TestRunner() {
  return TableRunner([](const Job& job) {
    return job.key.starts_with("bad") ? Failed("timestep too small")
                                      : MeasuredOutcome({{"delay", 1e-12}});
  });
}

Store MemoryStore() {
  Result<Store> store = Store::Open(":memory:");
  EXPECT_TRUE(store.ok()) << store.error().message;
  return *std::move(store);
}

void ExpectCounts(const OutcomeBook& book,
                  int wanted,
                  int reused,
                  int simulated,
                  int failed) {
  EXPECT_EQ(book.counts().wanted, wanted);
  EXPECT_EQ(book.counts().reused, reused);
  EXPECT_EQ(book.counts().simulated, simulated);
  EXPECT_EQ(book.counts().failed, failed);
}

RunId BeginRun(Store& store) {
  const Result<RunId> run = store.BeginRun({});
  EXPECT_TRUE(run.ok()) << run.error().message;
  return *run;
}

TEST(OutcomeBookTest, SimulatesEachKeyOnce) {
  TableRunner runner = TestRunner();
  Store store = MemoryStore();
  std::vector<int> progress;
  OutcomeBook book(
      &runner, &store, BeginRun(store), [&](const JobCounts& counts) {
        progress.push_back(counts.simulated);
      });
  ASSERT_TRUE(book.Finish(JobsOf({"a", "b", "a"})).ok());
  ASSERT_TRUE(book.Finish(JobsOf({"b", "c"})).ok());
  EXPECT_EQ(runner.asked().size(), 3U);
  ExpectCounts(book, 3, 0, 3, 0);
  EXPECT_EQ(progress, (std::vector<int>{1, 2, 3}));
  EXPECT_EQ(book.OutcomeOf("c").values_s.at("delay"), 1e-12);
}

TEST(OutcomeBookTest, TakesFromTheStoreWhatIsMeasured) {
  Store store = MemoryStore();
  TableRunner first = TestRunner();
  OutcomeBook before(&first, &store, BeginRun(store), [](const JobCounts&) {});
  ASSERT_TRUE(before.Finish(JobsOf({"a", "bad"})).ok());

  TableRunner second = TestRunner();
  OutcomeBook book(&second, &store, BeginRun(store), [](const JobCounts&) {});
  ASSERT_TRUE(book.Finish(JobsOf({"a", "bad", "b"})).ok());
  // What failed is tried again.
  ASSERT_EQ(second.asked().size(), 2U);
  EXPECT_EQ(second.asked()[0].key, "bad");
  EXPECT_EQ(second.asked()[1].key, "b");
  ExpectCounts(book, 3, 1, 2, 1);
  EXPECT_TRUE(book.OutcomeOf("a").measured());
}

TEST(OutcomeBookTest, KeepsFailuresWithTheirDeck) {
  TableRunner runner = TestRunner();
  Store store = MemoryStore();
  OutcomeBook book(&runner, &store, BeginRun(store), [](const JobCounts&) {});
  ASSERT_TRUE(book.Finish(JobsOf({"a", "bad1", "bad2"})).ok());
  ExpectCounts(book, 3, 0, 3, 2);
  ASSERT_EQ(book.failed().size(), 2U);
  EXPECT_EQ(book.failed()[1].key, "bad2");
  EXPECT_EQ(book.failed()[1].label, "label bad2");
  EXPECT_EQ(book.failed()[1].message, "timestep too small");
  const auto kept = store.FindJob("bad1");
  ASSERT_TRUE(kept.ok() && kept->has_value());
  EXPECT_EQ((*kept)->job.deck, JobOf("bad1").deck);
}

TEST(OutcomeBookTest, StoreKnowsTheRunsJobs) {
  TableRunner runner = TestRunner();
  Store store = MemoryStore();
  const RunId run = BeginRun(store);
  OutcomeBook book(&runner, &store, run, [](const JobCounts&) {});
  ASSERT_TRUE(book.Finish(JobsOf({"a", "bad", "a"})).ok());
  ASSERT_TRUE(book.Finish(JobsOf({"b", "a"})).ok());
  const auto keys = store.RunJobKeys(run);
  ASSERT_TRUE(keys.ok()) << keys.error().message;
  EXPECT_EQ(*keys, (std::vector<std::string>{"a", "bad", "b"}));
}

// Ends after `jobs` of them, as a pool does that is told to stop.
class StoppedRunner : public SimRunner {
 public:
  explicit StoppedRunner(size_t jobs) : jobs_(jobs) {}
  Status Run(std::span<const Job> jobs, const OnOutcome& on_outcome) override {
    for (const Job& job : jobs.first(std::min(jobs_, jobs.size()))) {
      on_outcome(job, MeasuredOutcome({{"delay", 1e-12}}));
    }
    return Ok();
  }

 private:
  size_t jobs_;
};

TEST(OutcomeBookTest, SaysWhereItStoppedAndKeepsTheRest) {
  Store store = MemoryStore();
  StoppedRunner runner(2);
  OutcomeBook book(&runner, &store, BeginRun(store), [](const JobCounts&) {});
  const Status stopped = book.Finish(JobsOf({"a", "b", "c", "d"}));
  ASSERT_FALSE(stopped.ok());
  EXPECT_EQ(stopped.error().kind, ErrorKind::kUnavailable);
  EXPECT_EQ(stopped.error().message,
            "stopped before 'label c'; what was measured is kept");
  EXPECT_TRUE(store.FindMeasured("b")->has_value());
}

class NoRunner : public SimRunner {
 public:
  Status Run(std::span<const Job> /*jobs*/,
             const OnOutcome& /*on_outcome*/) override {
    return Unavailable("no worker starts");
  }
};

TEST(OutcomeBookTest, PassesOnThatNothingCanBeRun) {
  Store store = MemoryStore();
  NoRunner runner;
  OutcomeBook book(&runner, &store, BeginRun(store), [](const JobCounts&) {});
  const Status failed = book.Finish(JobsOf({"a"}));
  ASSERT_FALSE(failed.ok());
  EXPECT_EQ(failed.error().message, "no worker starts");
}

}  // namespace
}  // namespace gatedyno
