// report on stores made here; no simulator.

#include <filesystem>
#include <optional>
#include <string>
#include <utility>
#include <vector>

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "harness/base/file.h"
#include "harness/store/finish_run.h"
#include "harness/store/store.h"
#include "tests/cli/run_command.h"
#include "tests/report/sample_run.h"
#include "tests/support/temporary_folder.h"

namespace gatedyno {
namespace {

using ::testing::HasSubstr;
using ::testing::StartsWith;

class ReportCommandTest : public testing::Test {
 protected:
  std::string Path(const std::string& name = "runs.db") const {
    return (folder_.path() / name).string();
  }

  RunId Begin() {
    return Store::Open(Path())
        ->BeginRun({.plan = "{\"node\": \"p45\"}",
                    .node = "p45",
                    .program_version = "gatedyno 0.1.0",
                    .simulator_version = "simulator 1"})
        .value();
  }

  void Finish(RunId run, const RunResult& result) {
    Store store = Store::Open(Path()).value();
    ASSERT_TRUE(FinishRun(run, result, &store).ok());
  }

  Result<ExitCode> Report(std::vector<std::string> words) {
    words.insert(words.begin(), Path());
    return RunCommandLine(ReportCommand(), std::move(words), &out_);
  }

  std::string out_;
  TemporaryFolder folder_;
};

TEST_F(ReportCommandTest, WritesEveryFormat) {
  Finish(Begin(), SampleRun());
  struct Case {
    const char* option;
    const char* file;
    const char* start;
  };
  const Case cases[] = {
      {"-o", "a.html", "<!DOCTYPE html>\n"},
      {"--json", "a.json", "{\n \"accuracy\": {"},
      {"--csv", "a.csv", "corner,cell,pin,"},
      {"--junit", "a.xml", "<?xml version=\"1.0\" encoding=\"UTF-8\"?>\n"},
      {"--markdown", "a.md", "## `gates of an interrupt arbiter`\n"},
  };
  std::vector<std::string> words;
  std::string said =
      "run 1: 2 of 7 arcs, in 2 of 3 cells, lie beyond what is allowed (g 25 "
      "%, p 35 % of the hand number); 3 arcs were not measured.\n";
  for (const Case& test : cases) {
    words.insert(words.end(), {test.option, Path(test.file)});
    said += "written: " + Path(test.file) + "\n";
  }
  EXPECT_EQ(Report(words).value(), kAllWithin);
  EXPECT_EQ(out_, said);
  for (const Case& test : cases) {
    EXPECT_THAT(ReadFile(Path(test.file)).value(), StartsWith(test.start));
  }
}

TEST_F(ReportCommandTest, TakesTheNewestFinishedRunOrTheOneNamed) {
  RunResult second = SampleRun();
  second.facts.title = "second";
  Finish(Begin(), SampleRun());
  Finish(Begin(), second);
  Begin();
  EXPECT_TRUE(Report({"-o", Path("a.html")}).ok());
  EXPECT_THAT(out_, StartsWith("run 2: "));
  EXPECT_THAT(ReadFile(Path("a.html")).value(), HasSubstr("<h1>second</h1>"));
  EXPECT_TRUE(Report({"-o", Path("a.html"), "--run", "1"}).ok());
  EXPECT_THAT(out_, StartsWith("run 1: "));
  EXPECT_THAT(ReadFile(Path("a.html")).value(),
              HasSubstr("<dd>runs.db, run 1</dd>"));
}

TEST_F(ReportCommandTest, SaysWhatIsWrong) {
  struct Case {
    std::vector<std::string> words;
    std::string message;
  };
  Begin();
  const Case cases[] = {
      {{}, Path() + ": has no finished run; see gatedyno status " + Path()},
      {{"--run", "1"},
       "--run 1: not finished; gatedyno run with the same plan goes on"},
      {{"--run", "7"},
       "--run 7: " + Path() + " has no such run; see gatedyno status " +
           Path()},
      {{"--waves", "5"},
       "--waves: waveforms are part of the page; name its file with --page"},
      {{"--waves", "0", "-o", Path("a.html")},
       "--waves 0: expected 1 or more arcs"},
      {{"--waves", "-3", "-o", Path("a.html")},
       "--waves -3: expected 1 or more arcs"},
  };
  for (const Case& test : cases) {
    const Result<ExitCode> done = Report(test.words);
    ASSERT_FALSE(done.ok());
    EXPECT_EQ(done.error().kind, ErrorKind::kBadInput);
    EXPECT_EQ(done.error().message, test.message);
    EXPECT_EQ(out_, "");
  }
}

TEST_F(ReportCommandTest, ARunThatCannotBeReadIsNamed) {
  const RunId run = Begin();
  ASSERT_TRUE(Store::Open(Path())
                  ->FinishRun(run,
                              "{\"format\": \"gatedyno-result/9\"}",
                              [] { return std::nullopt; })
                  .ok());
  const Result<ExitCode> done = Report({});
  ASSERT_FALSE(done.ok());
  EXPECT_EQ(done.error().message,
            Path() +
                ": run 1: not a run's result: its format is "
                "\"gatedyno-result/9\", and has to be \"gatedyno-result/1\"");
}

TEST(ReportCommandNoStoreTest, NoStoreIsMade) {
  const TemporaryFolder folder;
  const std::string path = (folder.path() / "none.db").string();
  CLI::App app;
  const Action action = ReportCommand().add(app);
  app.parse(std::vector<std::string>{path});
  const Result<ExitCode> done = action();
  ASSERT_FALSE(done.ok());
  EXPECT_EQ(done.error().message, path + ": no such store");
  EXPECT_TRUE(std::filesystem::is_empty(folder.path()));
}

}  // namespace
}  // namespace gatedyno
