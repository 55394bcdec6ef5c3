// versus on stores made here; no simulator.

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
#include "tests/report/sample_versus.h"
#include "tests/support/temporary_folder.h"

namespace gatedyno {
namespace {

using ::testing::HasSubstr;
using ::testing::StartsWith;

class VersusCommandTest : public testing::Test {
 protected:
  std::string Path(const std::string& name) const {
    return (folder_.path() / name).string();
  }

  // A finished run.
  void Save(const std::string& name, const RunResult& result) {
    Result<Store> store = Store::Open(Path(name));
    ASSERT_TRUE(store.ok());
    const RunId run = store
                          ->BeginRun({.plan = "{}",
                                      .node = result.facts.node,
                                      .program_version = "gatedyno 0.1.0",
                                      .simulator_version = "simulator 1"})
                          .value();
    ASSERT_TRUE(FinishRun(run, result, &*store).ok());
  }

  Result<ExitCode> Versus(std::vector<std::string> words) {
    return RunCommandLine(VersusCommand(), std::move(words), &out_);
  }

  std::string out_;
  TemporaryFolder folder_;
};

TEST_F(VersusCommandTest, WritesEveryFormat) {
  const SampleVersus sample;
  Save("a.db", sample.a);
  Save("b.db", sample.b);
  const std::vector<std::string> words = {Path("a.db"),
                                          Path("b.db"),
                                          "-o",
                                          Path("v.html"),
                                          "--json",
                                          Path("v.json"),
                                          "--csv",
                                          Path("v.csv")};
  EXPECT_EQ(Versus(words).value(), kAllWithin);
  EXPECT_THAT(out_,
              HasSubstr("node p45, run 1 of a.db, begun "
                        "2026-12-01T08:00:00Z\nB: "));
  EXPECT_THAT(out_, HasSubstr("4 arcs in both: 2 changed, "));
  EXPECT_THAT(out_,
              HasSubstr("written: " + Path("v.html") + "\nwritten: " +
                        Path("v.json") + "\nwritten: " + Path("v.csv") + "\n"));
  EXPECT_THAT(*ReadFile(Path("v.html")), StartsWith("<!DOCTYPE html>\n"));
  EXPECT_THAT(*ReadFile(Path("v.json")), StartsWith("{\n \"a\": {"));
  EXPECT_THAT(*ReadFile(Path("v.csv")), StartsWith("cell,pin,output,edge,"));
}

// Three runs; the third has no nor.
TEST_F(VersusCommandTest, ChoosesRuns) {
  const SampleVersus sample;
  RunResult third = sample.b;
  third.facts.title = "third";
  for (const RunResult& run : {sample.a, sample.b, third}) {
    Save("runs.db", run);
  }
  Save("other.db", sample.a);
  struct Case {
    std::vector<std::string> words;
    const char* a;
    const char* b;
  };
  const Case cases[] = {
      {{Path("runs.db")}, "run 2 of runs.db", "run 3 of runs.db"},
      {{Path("runs.db"), Path("runs.db")},
       "run 2 of runs.db",
       "run 3 of runs.db"},
      {{Path("runs.db"), "--runs", "3,1"},
       "run 3 of runs.db",
       "run 1 of runs.db"},
      {{Path("other.db"), Path("runs.db")},
       "run 1 of other.db",
       "run 3 of runs.db"},
      {{Path("other.db"), Path("runs.db"), "--runs", "1,2"},
       "run 1 of other.db",
       "run 2 of runs.db"},
      {{Path("other.db"), "--corners", "typical,slow_hot"},
       "run 1 of other.db",
       "run 1 of other.db"},
  };
  for (const Case& test : cases) {
    EXPECT_EQ(Versus(test.words).value(), kAllWithin);
    const size_t second = out_.find("\nB: ");
    EXPECT_THAT(out_.substr(0, second), HasSubstr(test.a));
    EXPECT_THAT(out_.substr(second), HasSubstr(test.b));
  }
  EXPECT_THAT(out_, HasSubstr("corner typical to slow_hot\n"));
}

TEST_F(VersusCommandTest, SaysWhatIsWrong) {
  SampleVersus sample;
  Save("a.db", sample.a);
  RunResult elsewhere = sample.b;
  for (Comparison& row : elsewhere.comparisons) {
    row.corner = "tt_1v2";
  }
  Save("elsewhere.db", elsewhere);
  RunResult others = sample.b;
  others.cells = {{"xor2", {"y = a ^ b"}, 1, 2, 2}};
  others.comparisons.resize(1);
  others.comparisons[0].arc.cell = "xor2";
  Save("others.db", others);
  Save("empty.db", RunResult());
  struct Case {
    std::vector<std::string> words;
    std::string message;
  };
  const Case cases[] = {
      {{Path("a.db")},
       Path("a.db") +
           ": has 1 finished run, and two are needed to compare; --corners "
           "X,Y compares corners of one"},
      {{Path("none.db"), Path("a.db")}, Path("none.db") + ": no such store"},
      {{Path("a.db"), Path("others.db"), "--runs", "1,7"},
       "--runs 7: " + Path("others.db") +
           " has no such run; see gatedyno status " + Path("others.db")},
      {{Path("a.db"), Path("elsewhere.db")},
       "no corner is in both: A has typical, slow_hot, B has tt_1v2; "
       "--corners X,Y compares X of A with Y of B"},
      {{Path("a.db"), Path("empty.db")},
       "no corner is in both: A has typical, slow_hot, B has none; --corners "
       "X,Y compares X of A with Y of B"},
      {{Path("a.db"), Path("others.db"), "--corners", "typical,fast"},
       "--corners: run 1 of others.db has no corner fast; has typical"},
      {{Path("a.db"), Path("others.db")},
       "no arc is in both at the corners compared: A has cells inv, nand2; B "
       "has cells xor2"},
  };
  for (const Case& test : cases) {
    const Result<ExitCode> done = Versus(test.words);
    ASSERT_FALSE(done.ok()) << test.message;
    EXPECT_EQ(done.error().kind, ErrorKind::kBadInput);
    EXPECT_EQ(done.error().message, test.message);
    EXPECT_EQ(out_, "");
  }
}

}  // namespace
}  // namespace gatedyno
