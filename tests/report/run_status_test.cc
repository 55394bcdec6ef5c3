#include "harness/report/run_status.h"

#include <vector>

#include <gtest/gtest.h>

#include "tests/report/store_view.h"

namespace gatedyno {
namespace {

std::vector<RunState> StatesOf(const StoreView& view) {
  std::vector<RunState> states;
  for (const RunStatus& status : StatusOfRuns(view)) {
    states.push_back(status.state);
  }
  return states;
}

using States = std::vector<RunState>;

TEST(RunStatusTest, TheLockIsOfTheNewestSession) {
  StoreView view = ViewOfThree();
  EXPECT_EQ(
      StatesOf(view),
      (States{RunState::kFinished, RunState::kStopped, RunState::kRunning}));
  // An older run is gone on with while a newer one waits.
  view.runs[1].session_started = kEvening;
  EXPECT_EQ(
      StatesOf(view),
      (States{RunState::kFinished, RunState::kRunning, RunState::kStopped}));
  view.locked = false;
  EXPECT_EQ(
      StatesOf(view),
      (States{RunState::kFinished, RunState::kStopped, RunState::kStopped}));
  // Just begun, or just finished: not in the file yet, or no longer.
  view.locked = true;
  view.runs = {view.runs[0]};
  EXPECT_EQ(StatesOf(view), States{RunState::kFinished});
}

TEST(RunStatusTest, PaceIsOfTheSession) {
  // 1180 jobs in 590 s, the last note 10 s ago; 3420 jobs are left.
  const StoreView view = ViewOfThree();
  const RunStatus running = StatusOfRuns(view)[2];
  ASSERT_TRUE(running.jobs_per_s.has_value());
  EXPECT_DOUBLE_EQ(*running.jobs_per_s, 2.0);
  ASSERT_TRUE(running.left_s.has_value());
  EXPECT_DOUBLE_EQ(*running.left_s, 3420 / 2.0 - 10.0);

  const RunStatus finished = StatusOfRuns(view)[0];
  ASSERT_TRUE(finished.jobs_per_s.has_value());
  EXPECT_DOUBLE_EQ(*finished.jobs_per_s, 2.0);
  EXPECT_FALSE(finished.left_s.has_value());
}

TEST(RunStatusTest, NoPaceWithoutAJobOfThisSession) {
  struct Case {
    const char* what;
    void (*change)(RunRecord& run);
  };
  const Case cases[] = {
      {"nothing noted", [](RunRecord& run) { run.progress.reset(); }},
      {"all taken from the store",
       [](RunRecord& run) { run.progress->jobs.simulated = 0; }},
      // Its counts are of the session before.
      {"just gone on with",
       [](RunRecord& run) { run.progressed = run.session_started; }},
  };
  for (const Case& tried : cases) {
    StoreView view = ViewOfThree();
    tried.change(view.runs[2]);
    const RunStatus status = StatusOfRuns(view)[2];
    EXPECT_FALSE(status.jobs_per_s.has_value()) << tried.what;
    EXPECT_FALSE(status.left_s.has_value()) << tried.what;
  }
}

TEST(RunStatusTest, ARunThatIsLateHasNothingLeft) {
  StoreView view = ViewOfThree();
  view.now += 600 * kMinute;
  EXPECT_EQ(StatusOfRuns(view)[2].left_s, 0.0);
  // Clocks may be set back.
  view.now = view.runs[2].progressed - kMinute;
  EXPECT_EQ(StatusOfRuns(view)[2].left_s, 3420 / 2.0);
}

TEST(RunStatusTest, TitlesOfAnyPlan) {
  struct Case {
    const char* plan;
    const char* title;
  };
  constexpr Case kCases[] = {
      {R"({"title": "arbiter"})", "arbiter"},
      {R"({"title": 7})", ""},
      {R"({"node": "p45"})", ""},
      {"[]", ""},
      {"", ""},
      {"{", ""},
  };
  for (const Case& tried : kCases) {
    StoreView view = ViewOfThree();
    view.runs[0].info.plan = tried.plan;
    EXPECT_EQ(StatusOfRuns(view)[0].title, tried.title) << tried.plan;
  }
}

}  // namespace
}  // namespace gatedyno
