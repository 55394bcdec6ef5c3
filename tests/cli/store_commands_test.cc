// status and replay on stores made here; no simulator.

#include <algorithm>
#include <filesystem>
#include <optional>
#include <string>
#include <vector>

#include <fmt/format.h>
#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "harness/base/file.h"
#include "harness/cli/commands.h"
#include "harness/store/run_lock.h"
#include "harness/store/store.h"
#include "tests/support/temporary_folder.h"

namespace gatedyno {
namespace {

using ::testing::HasSubstr;

struct Done {
  Result<ExitCode> exit_code;
  std::string out;
};

// As main() runs it.
Done RunCommandLine(const Command& command, std::vector<std::string> words) {
  CLI::App app;
  const Action action = command.add(app);
  std::reverse(words.begin(), words.end());  // What CLI11 wants.
  app.parse(words);
  ::testing::internal::CaptureStdout();
  const Result<ExitCode> exit_code = action();
  return {exit_code, ::testing::internal::GetCapturedStdout()};
}

class StoreCommandsTest : public testing::Test {
 protected:
  std::string Path() const { return (folder_.path() / "runs.db").string(); }

  std::string Key(char digit) const { return "ab" + std::string(30, digit); }

  void SaveFailed(const std::string& key) {
    Job job;
    job.key = key;
    job.label = "nand2 a->y h=4 typical";
    job.deck = "* title\n.end\n";
    job.settings = {".options a\n", ".options b\n"};
    const Outcome outcome{.ending = Ending::kFailed,
                          .values_s = {},
                          .message = "timestep too small",
                          .simulator_s = 0.0,
                          .rung = 1};
    ASSERT_TRUE(Store::Open(Path())->SaveOutcome(job, outcome).ok());
  }

  Done Status(std::vector<std::string> words) {
    return RunCommandLine(StatusCommand(), std::move(words));
  }
  Done Replay(std::vector<std::string> words) {
    return RunCommandLine(ReplayCommand(), std::move(words));
  }

  TemporaryFolder folder_;
};

TEST_F(StoreCommandsTest, StatusFollowsTheLock) {
  Store store = Store::Open(Path()).value();
  RunInfo info;
  info.plan = R"({"title": "arbiter"})";
  const RunId run = store.BeginRun(info).value();
  {
    const RunLock lock = LockRuns(Path()).value();
    const Done running = Status({Path()});
    EXPECT_EQ(running.exit_code.value(), kAllWithin);
    EXPECT_THAT(running.out, HasSubstr("run 1: arbiter, running\n"));
  }
  const Done stopped = Status({Path()});
  EXPECT_THAT(stopped.out, HasSubstr("run 1: arbiter, stopped\n"));
  EXPECT_THAT(stopped.out, HasSubstr("to go on: 'gatedyno run' with"));
  ASSERT_TRUE(store.FinishRun(run, "{}", [] { return std::nullopt; }).ok());
  EXPECT_THAT(Status({Path()}).out, HasSubstr("run 1: arbiter, finished\n"));
  EXPECT_THAT(Status({Path(), "--json"}).out,
              HasSubstr("\"state\": \"finished\""));
}

TEST_F(StoreCommandsTest, NoStoreIsMade) {
  for (const Done& done :
       {Status({Path()}), Replay({"ab", "--store", Path()})}) {
    ASSERT_FALSE(done.exit_code.ok());
    EXPECT_EQ(ExitCodeOf(done.exit_code.error()), kBadUsage);
    EXPECT_EQ(done.exit_code.error().message, Path() + ": no such store");
    EXPECT_EQ(done.out, "");
  }
  EXPECT_TRUE(std::filesystem::is_empty(folder_.path()));
}

TEST_F(StoreCommandsTest, ReplayWritesTheDeckOfARung) {
  struct Case {
    std::vector<std::string> rung;
    const char* line;
    const char* deck;
  };
  const Case cases[] = {
      {{}, "deck of rung 1 in ", "* title\n.options b\n.end\n"},
      {{"--rung", "0"}, "deck of rung 0 in ", "* title\n.options a\n.end\n"},
      {{"--rung", "1"}, "deck of rung 1 in ", "* title\n.options b\n.end\n"},
  };
  SaveFailed(Key('0'));
  const std::string file = (folder_.path() / "out/a.sp").string();
  for (const Case& tried : cases) {
    std::vector<std::string> words = {
        "AB00", "--store", Path(), "--deck", file};
    words.insert(words.end(), tried.rung.begin(), tried.rung.end());
    const Done done = Replay(words);
    ASSERT_TRUE(done.exit_code.ok()) << done.exit_code.error().message;
    EXPECT_EQ(*done.exit_code, kAllWithin);
    EXPECT_THAT(done.out, HasSubstr("nand2 a->y h=4 typical\n  key ab0000"));
    EXPECT_THAT(done.out, HasSubstr("\n  failed at rung 1, "));
    EXPECT_THAT(done.out, HasSubstr(" UTC: timestep too small\n"));
    EXPECT_THAT(done.out, HasSubstr(tried.line + file + "\n"));
    EXPECT_EQ(ReadFile(file).value(), tried.deck);
  }
}

TEST_F(StoreCommandsTest, ReplaySaysWhatIsWrong) {
  struct Case {
    std::vector<std::string> words;
    std::string message;
  };
  SaveFailed(Key('0'));
  SaveFailed(Key('1'));
  const Case cases[] = {
      {{"ac"}, Path() + ": no job's key begins with 'ac'"},
      {{"ab"},
       fmt::format("{}: the keys of several jobs begin with 'ab': {}, {}; give "
                   "more of it",
                   Path(),
                   Key('0'),
                   Key('1'))},
      {{"ab0", "--rung", "2"}, "--rung: 2: the job's rungs are 0 to 1"},
      {{"ab0", "--rung", "-1"}, "--rung: -1: the job's rungs are 0 to 1"},
  };
  for (const Case& tried : cases) {
    std::vector<std::string> words = tried.words;
    words.insert(words.end(), {"--store", Path()});
    const Done done = Replay(words);
    ASSERT_FALSE(done.exit_code.ok());
    EXPECT_EQ(done.exit_code.error().kind, ErrorKind::kBadInput);
    EXPECT_EQ(done.exit_code.error().message, tried.message);
    EXPECT_EQ(done.out, "");
  }
}

TEST_F(StoreCommandsTest, ReplayListsEightCandidatesAtMost) {
  for (const char digit : std::string("0123456789")) {
    SaveFailed(Key(digit));
  }
  const Done done = Replay({"a", "--store", Path()});
  ASSERT_FALSE(done.exit_code.ok());
  EXPECT_THAT(done.exit_code.error().message,
              HasSubstr(Key('7') + " and more; give more of it"));
}

}  // namespace
}  // namespace gatedyno
