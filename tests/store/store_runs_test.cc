#include <chrono>
#include <string>
#include <thread>
#include <vector>

#include <SQLiteCpp/SQLiteCpp.h>
#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "tests/store/store_fixture.h"

namespace gatedyno {
namespace {

using testing::ElementsAre;
using testing::IsEmpty;

class StoreRunsTest : public StoreFixture {};

RunInfo Info() {
  return {.plan = R"({"node": "p45"})",
          .node = "p45",
          .program_version = "0.1.0",
          .simulator_version = "39.3"};
}

RunProgress Progress(int simulated) {
  return {.jobs = {.wanted = 80, .reused = 5, .simulated = simulated},
          .expected_jobs = 100,
          .arcs_ended = 3,
          .arcs = 20,
          .current = "nand2 a->y h=4"};
}

// Gives `rows`, one a call.
NextRow From(std::vector<std::string> rows) {
  return [rows, next = size_t{0}]() mutable {
    return next < rows.size() ? std::optional(rows[next++]) : std::nullopt;
  };
}

// Times are kept in milliseconds.
void LetTimePass() {
  std::this_thread::sleep_for(std::chrono::milliseconds(2));
}

TEST_F(StoreRunsTest, ARunFromBeginningToEnd) {
  Store store = Store::Open(Path()).value();
  const RunId run = store.BeginRun(Info()).value();
  std::vector<RunRecord> runs = store.Runs().value();
  ASSERT_EQ(runs.size(), 1U);
  EXPECT_EQ(runs[0].id, run);
  EXPECT_EQ(runs[0].info.plan, Info().plan);
  EXPECT_EQ(runs[0].info.node, "p45");
  EXPECT_EQ(runs[0].info.program_version, "0.1.0");
  EXPECT_EQ(runs[0].info.simulator_version, "39.3");
  EXPECT_FALSE(runs[0].finished.has_value());
  EXPECT_EQ(store.RunResults(run).value().has_value(), false);

  LetTimePass();
  ASSERT_TRUE(store
                  .FinishRun(run,
                             R"({"title": "arbiter"})",
                             From({R"({"arc": 1})", R"({"arc": 2})"}))
                  .ok());
  store = Store::Open(Path()).value();
  runs = store.Runs().value();
  ASSERT_TRUE(runs[0].finished.has_value());
  EXPECT_GT(*runs[0].finished, runs[0].started);
  EXPECT_EQ(runs[0].progressed, *runs[0].finished);
  const RunText text = store.RunResults(run).value().value();
  EXPECT_EQ(text.head, R"({"title": "arbiter"})");
  EXPECT_THAT(text.rows, ElementsAre(R"({"arc": 1})", R"({"arc": 2})"));
}

TEST_F(StoreRunsTest, FinishingAgainReplaces) {
  Store store = Store::Open(Path()).value();
  const RunId other = store.BeginRun(Info()).value();
  ASSERT_TRUE(store.FinishRun(other, "{}", From({"0"})).ok());
  const RunId run = store.BeginRun(Info()).value();
  const std::vector<std::vector<std::string>> endings = {
      {"1", "2", "3"}, {"4", "5"}, {}, {"6"}};
  for (const std::vector<std::string>& rows : endings) {
    const std::string head = std::to_string(rows.size());
    ASSERT_TRUE(store.FinishRun(run, head, From(rows)).ok());
    const RunText text = store.RunResults(run).value().value();
    EXPECT_EQ(text.head, head);
    EXPECT_EQ(text.rows, rows);
  }
  EXPECT_THAT(store.RunResults(other).value()->rows, ElementsAre("0"));
}

// Thirty thousand rows, the size of a library at thirty corners: each is asked
// for after the one before it has been written.
TEST_F(StoreRunsTest, RowsMayBeReadFromTheStoreItself) {
  constexpr int kRows = 30'000;
  Store store = Store::Open(Path()).value();
  ASSERT_TRUE(store.SaveOutcome(ExampleJob(1), MeasuredAs(1e-12)).ok());
  const RunId run = store.BeginRun(Info()).value();
  int asked = 0;
  const Status finished =
      store.FinishRun(run, "{}", [&]() -> std::optional<std::string> {
        if (asked == kRows) {
          return std::nullopt;
        }
        const auto found = store.FindMeasured(ExampleJob(1).key).value();
        return std::to_string(asked++) + found->message;
      });
  ASSERT_TRUE(finished.ok()) << finished.error().message;
  const RunText text = store.RunResults(run).value().value();
  ASSERT_EQ(text.rows.size(), static_cast<size_t>(kRows));
  EXPECT_EQ(text.rows.front(), "0");
  EXPECT_EQ(text.rows.back(), std::to_string(kRows - 1));
}

TEST_F(StoreRunsTest, WhatCannotBeFinishedStaysAsItWas) {
  Store store =
      Store::Open(Path(), {.busy_timeout = std::chrono::milliseconds(50)})
          .value();
  const RunId run = store.BeginRun(Info()).value();
  ASSERT_TRUE(store.FinishRun(run, "first", From({"1"})).ok());
  int asked = 0;
  const NextRow failing = [&]() -> std::optional<std::string> {
    if (++asked == 3) {
      throw SQLite::Exception("no third row");
    }
    return "another";
  };
  EXPECT_FALSE(store.FinishRun(run, "second", failing).ok());
  const RunText text = store.RunResults(run).value().value();
  EXPECT_EQ(text.head, "first");
  EXPECT_THAT(text.rows, ElementsAre("1"));
}

TEST_F(StoreRunsTest, ProgressIsSeenByWhoLooksOn) {
  Store store = Store::Open(Path()).value();
  const RunId run = store.BeginRun(Info()).value();
  Store onlooker = Store::Open(Path(), {.read_only = true}).value();
  RunRecord seen = onlooker.Runs().value().at(0);
  EXPECT_FALSE(seen.progress.has_value());
  EXPECT_EQ(seen.progressed, seen.started);
  EXPECT_EQ(seen.session_started, seen.started);

  LetTimePass();
  ASSERT_TRUE(store.NoteProgress(run, Progress(30)).ok());
  ASSERT_TRUE(store.NoteProgress(run, Progress(31)).ok());
  seen = onlooker.Runs().value().at(0);
  EXPECT_GT(seen.progressed, seen.started);
  ASSERT_TRUE(seen.progress.has_value());
  EXPECT_EQ(seen.progress->jobs.wanted, 80);
  EXPECT_EQ(seen.progress->jobs.reused, 5);
  EXPECT_EQ(seen.progress->jobs.simulated, 31);
  EXPECT_EQ(seen.progress->expected_jobs, 100);
  EXPECT_EQ(seen.progress->arcs_ended, 3);
  EXPECT_EQ(seen.progress->arcs, 20);
  EXPECT_EQ(seen.progress->current, "nand2 a->y h=4");

  LetTimePass();
  ASSERT_TRUE(store.ResumeRun(run).ok());
  const RunRecord resumed = onlooker.Runs().value().at(0);
  EXPECT_EQ(resumed.started, seen.started);
  EXPECT_GT(resumed.session_started, seen.progressed);
  EXPECT_EQ(resumed.progressed, resumed.session_started);
}

TEST_F(StoreRunsTest, FindsTheRunToGoOnWith) {
  Store store = Store::Open(Path()).value();
  EXPECT_FALSE(store.FindUnfinished(Info()).value().has_value());
  const RunId older = store.BeginRun(Info()).value();
  const RunId newer = store.BeginRun(Info()).value();
  std::string RunInfo::*const kFields[] = {&RunInfo::plan,
                                           &RunInfo::node,
                                           &RunInfo::program_version,
                                           &RunInfo::simulator_version};
  for (std::string RunInfo::*const field : kFields) {
    RunInfo differs = Info();
    differs.*field += " ";
    EXPECT_FALSE(store.FindUnfinished(differs).value().has_value());
    ASSERT_TRUE(store.BeginRun(differs).ok());
  }
  ASSERT_TRUE(store.NoteProgress(newer, Progress(7)).ok());
  const RunRecord found = store.FindUnfinished(Info()).value().value();
  EXPECT_EQ(found.id, newer);
  EXPECT_EQ(found.info.plan, Info().plan);
  EXPECT_EQ(found.progress->jobs.simulated, 7);

  ASSERT_TRUE(store.FinishRun(newer, "{}", From({})).ok());
  EXPECT_EQ(store.FindUnfinished(Info()).value()->id, older);
  ASSERT_TRUE(store.FinishRun(older, "{}", From({})).ok());
  EXPECT_FALSE(store.FindUnfinished(Info()).value().has_value());
}

TEST_F(StoreRunsTest, ThereIsNoSuchRun) {
  Store store = Store::Open(Path()).value();
  const std::string message = Path().string() + ": there is no run 7";
  EXPECT_EQ(store.FinishRun(7, "{}", From({"1"})).error().message, message);
  EXPECT_EQ(store.ResumeRun(7).error().message, message);
  EXPECT_EQ(store.NoteProgress(7, Progress(1)).error().message, message);
  EXPECT_EQ(store.RunResults(7).error().message, message);
  EXPECT_THAT(store.Runs().value(), IsEmpty());
}

TEST_F(StoreRunsTest, SaysWhichRunCannotBeRead) {
  Store store = Store::Open(Path()).value();
  const RunId run = store.BeginRun(Info()).value();
  ASSERT_TRUE(store.NoteProgress(run, Progress(1)).ok());
  SQLite::Database(Path().string(), SQLite::OPEN_READWRITE)
      .exec("UPDATE run SET progress = '[]'");
  const std::string begin = Path().string() + ": run 1: not a run's progress: ";
  const auto runs = store.Runs();
  ASSERT_FALSE(runs.ok());
  EXPECT_EQ(runs.error().message.find(begin), 0U) << runs.error().message;
  EXPECT_FALSE(store.FindUnfinished(Info()).ok());
}

}  // namespace
}  // namespace gatedyno
