#include "harness/store/store.h"

#include <atomic>
#include <chrono>
#include <cmath>
#include <limits>
#include <string>
#include <thread>
#include <vector>

#include <SQLiteCpp/SQLiteCpp.h>
#include <gtest/gtest.h>

#include "tests/store/store_fixture.h"

namespace gatedyno {
namespace {

using std::chrono::milliseconds;

class StoreTest : public StoreFixture {};

TEST_F(StoreTest, FindsWhatWasMeasured) {
  Store store = Store::Open(Path()).value();
  // A number that needs all 17 digits.
  const Outcome outcome = MeasuredAs(1.0 / 3.0 * 1e-11);
  ASSERT_TRUE(store.SaveOutcome(ExampleJob(4), outcome).ok());
  for (const bool reopened : {false, true}) {
    SCOPED_TRACE(reopened);
    if (reopened) {
      store = Store::Open(Path()).value();
    }
    const auto found = store.FindMeasured(ExampleJob(4).key).value();
    ASSERT_TRUE(found.has_value());
    EXPECT_EQ(found->ending, Ending::kMeasured);
    EXPECT_EQ(found->values_s, outcome.values_s);
    EXPECT_EQ(found->simulator_s, 0.004);
    EXPECT_EQ(store.FindMeasured(ExampleJob(5).key).value(), std::nullopt);
  }
}

TEST_F(StoreTest, KeepsTheDeckOfEveryEnding) {
  constexpr std::chrono::minutes kAMinute(1);
  struct Case {
    Outcome outcome;
    bool found_as_measured;
  };
  const Case cases[] = {
      {MeasuredAs(1e-12), true},
      {EndedAs(Ending::kFailed, "timestep too small"), false},
      {EndedAs(Ending::kTimedOut, "worker killed after 30 s"), false},
      {EndedAs(Ending::kCrashed, "signal 11"), false},
  };
  Store store = Store::Open(Path()).value();
  for (int i = 0; i < 4; ++i) {
    SCOPED_TRACE(i);
    const Job job = ExampleJob(i);
    ASSERT_TRUE(store.SaveOutcome(job, cases[i].outcome).ok());
    EXPECT_EQ(store.FindMeasured(job.key).value().has_value(),
              cases[i].found_as_measured);
    const auto kept = store.FindJob(job.key).value();
    ASSERT_TRUE(kept.has_value());
    EXPECT_EQ(kept->job, job);
    ASSERT_TRUE(kept->outcome.has_value());
    EXPECT_EQ(kept->outcome->ending, cases[i].outcome.ending);
    EXPECT_EQ(kept->outcome->message, cases[i].outcome.message);
    EXPECT_EQ(kept->outcome->rung, cases[i].outcome.rung);
    const auto ended =
        std::chrono::system_clock::time_point(milliseconds(kept->ended));
    EXPECT_LT(std::chrono::system_clock::now() - ended, kAMinute);
    EXPECT_GT(std::chrono::system_clock::now() - ended, -kAMinute);
  }
  EXPECT_EQ(store.FindJob("no such key").value().has_value(), false);
}

TEST_F(StoreTest, ALaterOutcomeReplacesAnEarlierUnlessMeasured) {
  struct Case {
    const char* what;
    Outcome first;
    Outcome second;
    Ending kept;
  };
  const Case cases[] = {
      {"retried with success",
       EndedAs(Ending::kCrashed, "signal 9"),
       MeasuredAs(2e-12),
       Ending::kMeasured},
      {"failed again",
       EndedAs(Ending::kCrashed, "signal 9"),
       EndedAs(Ending::kTimedOut, "worker killed after 30 s"),
       Ending::kTimedOut},
      {"never undone",
       MeasuredAs(2e-12),
       EndedAs(Ending::kCrashed, "signal 9"),
       Ending::kMeasured},
      {"never changed",
       MeasuredAs(2e-12),
       MeasuredAs(3e-12),
       Ending::kMeasured},
  };
  Store store = Store::Open(Path()).value();
  int number = 0;
  for (const Case& test : cases) {
    SCOPED_TRACE(test.what);
    const Job job = ExampleJob(++number);
    ASSERT_TRUE(store.SaveOutcome(job, test.first).ok());
    ASSERT_TRUE(store.SaveOutcome(job, test.second).ok());
    const auto kept = store.FindJob(job.key).value();
    EXPECT_EQ(kept->outcome->ending, test.kept);
    if (test.kept == Ending::kMeasured) {
      EXPECT_EQ(kept->outcome->values_s.at("delay"), 2e-12);
    }
  }
}

TEST_F(StoreTest, RefusesAMeasurementThatIsNoNumber) {
  Store store = Store::Open(Path()).value();
  const Status saved = store.SaveOutcome(
      ExampleJob(4), MeasuredAs(std::numeric_limits<double>::quiet_NaN()));
  ASSERT_FALSE(saved.ok());
  EXPECT_EQ(saved.error().message,
            "nand2 a->y h=4 typical: 'delay' was measured as nan");
  EXPECT_FALSE(store.FindJob(ExampleJob(4).key).value().has_value());
}

TEST_F(StoreTest, ASecondWriterWaitsAndSaysSo) {
  Store store =
      Store::Open(Path(), {.busy_timeout = milliseconds(200)}).value();
  SQLite::Database other(Path().string(), SQLite::OPEN_READWRITE);
  other.exec("BEGIN IMMEDIATE");
  const auto start = std::chrono::steady_clock::now();
  const Status saved = store.SaveOutcome(ExampleJob(1), MeasuredAs(1e-12));
  EXPECT_GE(std::chrono::steady_clock::now() - start, milliseconds(150));
  ASSERT_FALSE(saved.ok());
  EXPECT_EQ(saved.error().kind, ErrorKind::kUnavailable);
  EXPECT_EQ(saved.error().message,
            Path().string() + ": database is locked (waited 0.2 s)");
  EXPECT_EQ(store.trouble(), StoreTrouble::kLocked);
  // Reading goes on, and so does writing once the other is done.
  EXPECT_TRUE(store.FindMeasured(ExampleJob(1).key).ok());
  other.exec("COMMIT");
  EXPECT_TRUE(store.SaveOutcome(ExampleJob(1), MeasuredAs(1e-12)).ok());
}

TEST_F(StoreTest, AnotherReadsWhileOneWrites) {
  constexpr int kJobs = 500;
  Store writer = Store::Open(Path()).value();
  std::atomic<int> written{0};
  std::thread reading([&] {
    Store reader = Store::Open(Path(), {.create = false}).value();
    for (int i = 0; i < kJobs;) {
      if (i >= written.load()) {
        std::this_thread::yield();
        continue;
      }
      const auto found = reader.FindMeasured(ExampleJob(i).key);
      ASSERT_TRUE(found.ok()) << found.error().message;
      ASSERT_TRUE(found->has_value()) << "not seen after it was saved: " << i;
      ++i;
    }
  });
  for (int i = 0; i < kJobs; ++i) {
    const Status saved = writer.SaveOutcome(ExampleJob(i), MeasuredAs(1e-12));
    EXPECT_TRUE(saved.ok());
    written.store(i + 1);
  }
  reading.join();
}

TEST_F(StoreTest, ManyMayOpenANewFileAtOnce) {
  constexpr int kOpeners = 8;
  std::vector<std::thread> openers;
  openers.reserve(kOpeners);
  std::atomic<int> good{0};
  for (int i = 0; i < kOpeners; ++i) {
    openers.emplace_back([&, i] {
      Result<Store> store = Store::Open(Path());
      ASSERT_TRUE(store.ok()) << store.error().message;
      const Status saved = store->SaveOutcome(ExampleJob(i), MeasuredAs(1e-12));
      ASSERT_TRUE(saved.ok()) << saved.error().message;
      ++good;
    });
  }
  for (std::thread& opener : openers) {
    opener.join();
  }
  EXPECT_EQ(good.load(), kOpeners);
}

TEST_F(StoreTest, AStoreInMemoryLeavesNoFile) {
  Store store = Store::Open(":memory:").value();
  ASSERT_TRUE(store.SaveOutcome(ExampleJob(4), MeasuredAs(1e-12)).ok());
  EXPECT_TRUE(store.FindMeasured(ExampleJob(4).key).value().has_value());
  EXPECT_FALSE(std::filesystem::exists(":memory:"));
}

TEST_F(StoreTest, SaysWhyItCannotOpen) {
  const std::string file = Path().string();
  Result<Store> missing = Store::Open(Path(), {.create = false});
  ASSERT_FALSE(missing.ok());
  EXPECT_EQ(missing.error().message, file + ": no such store");
  EXPECT_FALSE(std::filesystem::exists(Path()));

  Result<Store> folder = Store::Open(folder_);
  ASSERT_FALSE(folder.ok());
  EXPECT_EQ(folder.error().message,
            folder_.string() + ": unable to open database file");
  EXPECT_EQ(folder.error().kind, ErrorKind::kUnavailable);
}

TEST_F(StoreTest, SaysWhichJobCannotBeRead) {
  Store store = Store::Open(Path()).value();
  const Job job = ExampleJob(1);
  ASSERT_TRUE(store.SaveOutcome(job, MeasuredAs(1e-12)).ok());
  SQLite::Database other(Path().string(), SQLite::OPEN_READWRITE);
  other.exec("UPDATE job SET outcome = '[]'");
  const auto found = store.FindMeasured(job.key);
  ASSERT_FALSE(found.ok());
  EXPECT_EQ(found.error().kind, ErrorKind::kInternal);
  EXPECT_EQ(found.error().message.find(Path().string() + ": job " + job.key +
                                       ": not a job's outcome: "),
            0U);
}

TEST_F(StoreTest, ABatchIsKeptAsItsOutcomesWouldBe) {
  Store store = Store::Open(Path()).value();
  ASSERT_TRUE(store.SaveOutcome(ExampleJob(1), MeasuredAs(1e-12)).ok());
  ASSERT_TRUE(
      store.SaveOutcome(ExampleJob(2), EndedAs(Ending::kCrashed, "signal 9"))
          .ok());
  const std::vector<StoredOutcome> merged = {
      {ExampleJob(1), EndedAs(Ending::kTimedOut, "after 30 s")},
      {ExampleJob(2), MeasuredAs(2e-12)},
      {ExampleJob(3), MeasuredAs(3e-12)},
      {ExampleJob(3), MeasuredAs(4e-12)},
  };
  ASSERT_TRUE(store.SaveOutcomes(merged).ok());
  for (int i = 1; i <= 3; ++i) {
    const auto found = store.FindMeasured(ExampleJob(i).key).value();
    ASSERT_TRUE(found.has_value()) << i;
    EXPECT_EQ(found->values_s.at("delay"), i * 1e-12);
  }
  EXPECT_TRUE(store.SaveOutcomes({}).ok());
}

TEST_F(StoreTest, ABatchIsKeptWholeOrNotAtAll) {
  Store store = Store::Open(Path()).value();
  const std::vector<StoredOutcome> batch = {
      {ExampleJob(1), MeasuredAs(1e-12)},
      {ExampleJob(2), MeasuredAs(std::numeric_limits<double>::infinity())},
  };
  const Status saved = store.SaveOutcomes(batch);
  ASSERT_FALSE(saved.ok());
  EXPECT_EQ(saved.error().message,
            "nand2 a->y h=2 typical: 'delay' was measured as inf");
  EXPECT_EQ(store.trouble(), StoreTrouble::kOther);
  EXPECT_FALSE(store.FindJob(ExampleJob(1).key).value().has_value());
  EXPECT_TRUE(store.SaveOutcomes({batch.data(), 1}).ok());
}

TEST_F(StoreTest, KeysAreFoundByTheirBeginning) {
  struct Case {
    std::string prefix;
    size_t limit;
    std::vector<std::string> keys;
  };
  const Case cases[] = {
      {"ab", 10, {"ab", "ab01", "ab02", "abff"}},
      {"ab0", 10, {"ab01", "ab02"}},
      {"ab01", 10, {"ab01"}},
      {"ab", 2, {"ab", "ab01"}},
      {"ac", 10, {"ac00"}},
      {"ad", 10, {}},
      {"AB", 10, {}},
      {"a%", 10, {}},
      {"a*", 10, {}},
      {"", 10, {"0001", "ab", "ab01", "ab02", "abff", "ac00"}},
      {"", 0, {}},
  };
  Store store = Store::Open(Path()).value();
  for (const char* key : {"ab02", "ac00", "ab", "abff", "0001", "ab01"}) {
    Job job = ExampleJob(1);
    job.key = key;
    ASSERT_TRUE(store.SaveOutcome(job, MeasuredAs(1e-12)).ok());
  }
  for (const Case& tried : cases) {
    EXPECT_EQ(store.KeysLike(tried.prefix, tried.limit).value(), tried.keys)
        << tried.prefix;
  }
}

}  // namespace
}  // namespace gatedyno
