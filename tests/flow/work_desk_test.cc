#include "harness/flow/work_desk.h"

#include <map>
#include <string>
#include <vector>

#include <gtest/gtest.h>

#include "harness/sim/table_runner.h"
#include "tests/support/temporary_folder.h"

namespace gatedyno {
namespace {

Job JobOf(const std::string& key) {
  Job job;
  job.key = key;
  job.label = "label " + key;
  job.deck = "* deck " + key + "\n.end\n";
  return job;
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

// Asks for one key after the other, and counts the ends of each.
class Asker {
 public:
  Asker(WorkDesk* desk, std::vector<std::string> keys)
      : desk_(desk), keys_(std::move(keys)) {}

  Status Work() {
    return desk_->Work([this] {
      if (next_ == keys_.size()) {
        return false;
      }
      const std::string key = keys_[next_++];
      desk_->Ask(JobOf(key), [this, key](const Outcome& outcome) {
        ++ends_[key];
        last_ = outcome;
      });
      return true;
    });
  }

  const std::map<std::string, int>& ends() const { return ends_; }
  const Outcome& last() const { return last_; }

 private:
  WorkDesk* desk_;
  std::vector<std::string> keys_;
  size_t next_ = 0;
  std::map<std::string, int> ends_;
  Outcome last_;
};

void ExpectCounts(
    WorkDesk& desk, int wanted, int reused, int simulated, int failed) {
  const JobCounts& jobs = desk.progress().jobs;
  EXPECT_EQ(jobs.wanted, wanted);
  EXPECT_EQ(jobs.reused, reused);
  EXPECT_EQ(jobs.simulated, simulated);
  EXPECT_EQ(jobs.failed, failed);
}

TEST(WorkDeskTest, SimulatesEachKeyOnceAndTellsWhoeverAsked) {
  TableRunner runner = TestRunner();
  Store store = MemoryStore();
  std::vector<int> progress;
  WorkDesk desk(&runner, &store, {.on_progress = [&](const RunProgress& now) {
    progress.push_back(now.jobs.simulated);
  }});
  Asker asker(&desk, {"a", "b", "a", "bad", "bad"});
  ASSERT_TRUE(asker.Work().ok());
  EXPECT_EQ(asker.ends(),
            (std::map<std::string, int>{{"a", 2}, {"b", 1}, {"bad", 2}}));
  EXPECT_EQ(runner.asked().size(), 3U);
  ExpectCounts(desk, 3, 0, 3, 1);
  EXPECT_EQ(progress, (std::vector<int>{1, 2, 3}));
  EXPECT_EQ(desk.progress().current, "label bad");
}

TEST(WorkDeskTest, TakesFromTheStoreWhatIsMeasured) {
  Store store = MemoryStore();
  TableRunner first = TestRunner();
  WorkDesk before(&first, &store, {});
  ASSERT_TRUE(Asker(&before, {"a", "bad"}).Work().ok());

  TableRunner second = TestRunner();
  WorkDesk desk(&second, &store, {});
  ASSERT_TRUE(Asker(&desk, {"a", "bad", "b"}).Work().ok());
  // What failed is tried again.
  ASSERT_EQ(second.asked().size(), 2U);
  EXPECT_EQ(second.asked()[0].key, "bad");
  EXPECT_EQ(second.asked()[1].key, "b");
  ExpectCounts(desk, 3, 1, 2, 1);
}

TEST(WorkDeskTest, TakesFromOtherStoresAndKeepsWhatItTook) {
  Store other = MemoryStore();
  TableRunner first = TestRunner();
  WorkDesk before(&first, &other, {});
  ASSERT_TRUE(Asker(&before, {"a"}).Work().ok());

  Store store = MemoryStore();
  TableRunner second = TestRunner();
  WorkDesk desk(&second, &store, {.reuse = {&other}});
  ASSERT_TRUE(Asker(&desk, {"a", "b"}).Work().ok());
  ExpectCounts(desk, 2, 1, 1, 0);
  EXPECT_TRUE(store.FindMeasured("a")->has_value());
  EXPECT_FALSE(other.FindMeasured("b")->has_value());
}

TEST(WorkDeskTest, KeepsFailuresWithTheirDeck) {
  TableRunner runner = TestRunner();
  Store store = MemoryStore();
  WorkDesk desk(&runner, &store, {});
  Asker asker(&desk, {"a", "bad1", "bad2"});
  ASSERT_TRUE(asker.Work().ok());
  ExpectCounts(desk, 3, 0, 3, 2);
  EXPECT_EQ(asker.last().message, "timestep too small");
  ASSERT_EQ(desk.failed().size(), 2U);
  EXPECT_EQ(desk.failed()[1].key, "bad2");
  EXPECT_EQ(desk.failed()[1].label, "label bad2");
  EXPECT_EQ(desk.failed()[1].message, "timestep too small");
  const auto kept = store.FindJob("bad1");
  ASSERT_TRUE(kept.ok() && kept->has_value());
  EXPECT_EQ((*kept)->job.deck, JobOf("bad1").deck);
}

TEST(WorkDeskTest, AnEndMayAskForMore) {
  TableRunner runner = TestRunner();
  Store store = MemoryStore();
  WorkDesk desk(&runner, &store, {});
  int ended = 0;
  std::function<void(int)> ask = [&](int left) {
    desk.Ask(JobOf(std::to_string(left)), [&, left](const Outcome&) {
      ++ended;
      if (left > 0) {
        ask(left - 1);
      }
    });
  };
  bool asked = false;
  ASSERT_TRUE(desk.Work([&] {
                    if (!asked) {
                      ask(4);
                    }
                    return !std::exchange(asked, true);
                  })
                  .ok());
  EXPECT_EQ(ended, 5);
}

TEST(WorkDeskTest, StopsBetweenJobsAndKeepsWhatEnded) {
  TableRunner runner = TestRunner();
  Store store = MemoryStore();
  WorkDesk* looked_at = nullptr;
  WorkDesk desk(&runner, &store, {.should_stop = [&] {
    return looked_at->progress().jobs.simulated == 2;
  }});
  looked_at = &desk;
  const Status stopped = Asker(&desk, {"a", "b", "c", "d"}).Work();
  ASSERT_FALSE(stopped.ok());
  EXPECT_EQ(stopped.error().kind, ErrorKind::kUnavailable);
  EXPECT_EQ(stopped.error().message, "stopped; what was measured is kept");
  EXPECT_TRUE(store.FindMeasured("b")->has_value());
  EXPECT_FALSE(store.FindMeasured("c")->has_value());
}

class NoRunner : public SimRunner {
 public:
  Status Run(JobSource& /*jobs*/, const OnOutcome& /*on_outcome*/) override {
    return Unavailable("no worker starts");
  }
};

TEST(WorkDeskTest, PassesOnThatNothingCanBeRun) {
  Store store = MemoryStore();
  NoRunner runner;
  WorkDesk desk(&runner, &store, {});
  const Status failed = Asker(&desk, {"a"}).Work();
  ASSERT_FALSE(failed.ok());
  EXPECT_EQ(failed.error().message, "no worker starts");
}

// A farm may bring an outcome twice, or one that a dead program asked for.
class GenerousRunner : public SimRunner {
 public:
  Status Run(JobSource& jobs, const OnOutcome& on_outcome) override {
    const Outcome outcome = MeasuredOutcome({{"delay", 1e-12}});
    while (const std::optional<Job> job = jobs.Next()) {
      for (const Job& brought : {*job, *job, JobOf("unasked")}) {
        if (Status kept = on_outcome(brought, outcome); !kept.ok()) {
          return kept;
        }
      }
    }
    return Ok();
  }
};

TEST(WorkDeskTest, AnOutcomeCountsOnce) {
  Store store = MemoryStore();
  GenerousRunner runner;
  WorkDesk desk(&runner, &store, {});
  Asker asker(&desk, {"a", "b"});
  ASSERT_TRUE(asker.Work().ok());
  EXPECT_EQ(asker.ends(), (std::map<std::string, int>{{"a", 1}, {"b", 1}}));
  ExpectCounts(desk, 2, 0, 2, 0);
  // What nobody asked for yet is not lost.
  EXPECT_TRUE(store.FindMeasured("unasked")->has_value());
}

TEST(WorkDeskTest, ReadOnlySavesNothing) {
  TableRunner runner = TestRunner();
  Store store = MemoryStore();
  Store other = MemoryStore();
  ASSERT_TRUE(
      other.SaveOutcome(JobOf("c"), MeasuredOutcome({{"delay", 3e-12}})).ok());
  WorkDesk desk(&runner, &store, {.read_only = true, .reuse = {&other}});
  Asker asker(&desk, {"a", "bad", "c"});
  ASSERT_TRUE(asker.Work().ok());
  EXPECT_EQ(asker.ends(),
            (std::map<std::string, int>{{"a", 1}, {"bad", 1}, {"c", 1}}));
  ExpectCounts(desk, 3, 1, 2, 1);
  for (const char* key : {"a", "bad", "c"}) {
    EXPECT_FALSE(store.FindJob(key)->has_value()) << key;
  }
}

}  // namespace
}  // namespace gatedyno
