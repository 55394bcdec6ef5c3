// release on stores made here; no simulator.

#include <filesystem>
#include <optional>
#include <string>
#include <utility>
#include <vector>

#include <gmock/gmock.h>
#include <gtest/gtest.h>
#include <nlohmann/json.hpp>

#include "harness/base/file.h"
#include "harness/record/run_result_json.h"
#include "harness/store/store.h"
#include "tests/cli/run_command.h"
#include "tests/support/temporary_folder.h"

namespace gatedyno {
namespace {

using nlohmann::json;
using ::testing::HasSubstr;
using ::testing::StartsWith;

class ReleaseCommandTest : public testing::Test {
 protected:
  std::string Path(const std::string& name) const {
    return (folder_.path() / name).string();
  }

  std::string WritePlan(const json& more = json::object()) {
    json plan = {{"format", "gatedyno-plan/1"},
                 {"title", "the smallest gate"},
                 {"node", "p45"},
                 {"cells", {"inv"}}};
    plan.update(more);
    return folder_.Write("plan.json", plan.dump()).string();
  }

  // With `runs` runs, the first `finished` of them finished, without a job.
  std::string WriteStore(int runs, int finished) const {
    Result<Store> store = Store::Open(Path("runs.db"));
    EXPECT_TRUE(store.ok());
    for (int i = 0; i < runs; ++i) {
      const Result<RunId> run =
          store->BeginRun({.plan = "{}",
                           .node = "p45",
                           .program_version = "gatedyno 0.1.0",
                           .simulator_version = "simulator 1"});
      EXPECT_TRUE(run.ok());
      if (i < finished) {
        EXPECT_TRUE(store
                        ->FinishRun(*run,
                                    RunHeadToJson(RunResult()).dump(),
                                    [] { return std::nullopt; })
                        .ok());
      }
    }
    return Path("runs.db");
  }

  Result<ExitCode> Release(std::vector<std::string> words) {
    return RunCommandLine(ReleaseCommand(), std::move(words), &out_);
  }

  std::string out_;
  TemporaryFolder folder_;
};

TEST_F(ReleaseCommandTest, AnEmptyStoreReleasesNothing) {
  const std::string store = WriteStore(1, 1);
  const std::string plan = WritePlan();
  const Result<ExitCode> done = Release({store,
                                         "--plan",
                                         plan,
                                         "--date",
                                         "2026-12-02",
                                         "--json",
                                         Path("r.json"),
                                         "--markdown",
                                         Path("r.md")});
  ASSERT_TRUE(done.ok()) << done.error().message;
  EXPECT_EQ(*done, kSomeBeyond);
  EXPECT_THAT(out_, StartsWith("release: no\nthe smallest gate\n"));
  EXPECT_THAT(out_, HasSubstr("2 arcs: 0 within, 0 beyond, 2 not measured\n"));
  EXPECT_THAT(out_, HasSubstr("jobs of the plan are not in the store\n"));
  const json read = json::parse(ReadFile(Path("r.json")).value());
  EXPECT_EQ(read["decision"], "no");
  EXPECT_EQ(read["date"], "2026-12-02");
  EXPECT_EQ(read["simulator"], "simulator 1");
  EXPECT_EQ(read["reasons"].size(), 2U);
  EXPECT_GT(read["missing_jobs"], 0);
  EXPECT_THAT(ReadFile(Path("r.md")).value(), StartsWith("## release: no\n"));
}

// Whatever is exempt: what was never simulated is no arc that failed.
TEST_F(ReleaseCommandTest, NoExemptionMakesUpForMissingJobs) {
  const std::string store = WriteStore(1, 1);
  const std::string plan = WritePlan({{"exemptions",
                                       {{{"reason", "known"},
                                         {"author", "M. Ober"},
                                         {"expires", "2999-12-31"}}}}});
  const Result<ExitCode> done = Release({store, "--plan", plan});
  ASSERT_TRUE(done.ok()) << done.error().message;
  EXPECT_EQ(*done, kSomeBeyond);
  EXPECT_THAT(out_, HasSubstr("\nexcused\n"));
}

TEST_F(ReleaseCommandTest, SaysWhatIsWrong) {
  const std::string store = WriteStore(2, 1);
  const std::string empty = Path("empty.db");
  ASSERT_TRUE(Store::Open(empty).ok());
  const std::string plan = WritePlan();
  struct Case {
    std::vector<std::string> words;
    std::string message;
  };
  const Case cases[] = {
      {{Path("none.db"), "--plan", plan}, Path("none.db") + ": no such store"},
      {{empty, "--plan", plan},
       empty + ": has no run; gatedyno run " + plan + " --store " + empty},
      {{store, "--plan", Path("no.json")},
       Path("no.json") + ": cannot be read: No such file or directory"},
      {{store, "--plan", plan, "--date", "2026-02-29"},
       "--date 2026-02-29: expected a day of the calendar, as 2026-12-31"},
      {{store, "--plan", plan, "--baseline-run", "1"},
       "--baseline-run: name its store with --baseline"},
      {{store, "--plan", plan, "--baseline", store, "--baseline-run", "7"},
       "--baseline-run 7: " + store + " has no such run; see gatedyno status " +
           store},
      {{store, "--plan", plan, "--baseline", store, "--baseline-run", "2"},
       "--baseline-run 2: not finished; gatedyno run with the same plan goes "
       "on"},
      {{store, "--plan", plan, "--baseline", store},
       "--baseline " + store +
           ": has no finished run before its newest; see gatedyno status " +
           store},
      {{store, "--plan", plan, "--baseline", empty},
       "--baseline " + empty + ": has no finished run; see gatedyno status " +
           empty},
  };
  for (const Case& test : cases) {
    const Result<ExitCode> done = Release(test.words);
    ASSERT_FALSE(done.ok()) << test.message;
    EXPECT_EQ(done.error().kind, ErrorKind::kBadInput) << test.message;
    EXPECT_EQ(done.error().message, test.message);
    EXPECT_EQ(out_, "");
  }
}

TEST_F(ReleaseCommandTest, TheBaselineOfItsOwnStoreIsTheRunBefore) {
  const std::string store = WriteStore(3, 2);
  const Result<ExitCode> done =
      Release({store, "--plan", WritePlan(), "--baseline", store});
  ASSERT_TRUE(done.ok()) << done.error().message;
  EXPECT_THAT(
      out_,
      HasSubstr("\nmoved since the baseline\n  run 1 of runs.db: 0 arcs "
                "compared, 0 moved; "));
}

}  // namespace
}  // namespace gatedyno
