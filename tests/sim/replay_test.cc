#include "harness/sim/replay.h"

#include <string>
#include <utility>
#include <vector>

#include <gtest/gtest.h>

#include "harness/sim/table_runner.h"

namespace gatedyno {
namespace {

Job JobOf(const std::string& key) {
  Job job;
  job.key = key;
  job.deck = "title\n.end\n";
  job.settings = {".options a\n", ".options b\n", ".options c\n"};
  job.time_limit_s = 2.0;
  return job;
}

TEST(ReplayTest, OnlyOneRungIsLeftAndItsTime) {
  struct Case {
    size_t rung;
    const char* settings;
    double time_limit_s;  // Three times as long a rung.
  };
  const Case cases[] = {{0, ".options a\n", 2.0},
                        {1, ".options b\n", 6.0},
                        {2, ".options c\n", 18.0}};
  for (const Case& test : cases) {
    const Job alone = OnlyRung(JobOf("k"), test.rung);
    EXPECT_EQ(RungCount(alone), 1U);
    EXPECT_EQ(alone.settings, std::vector<std::string>{test.settings});
    EXPECT_EQ(alone.time_limit_s, test.time_limit_s);
    EXPECT_EQ(DeckText(alone, 0), DeckText(JobOf("k"), test.rung));
  }
}

TEST(ReplayTest, ADeckThatBringsItsOwnSettingsStaysAsItIs) {
  Job job = JobOf("k");
  job.settings.clear();
  EXPECT_EQ(OnlyRung(job, 0), job);
}

// Gives the outcomes in the opposite order.
class BackwardsRunner : public SimRunner {
 public:
  Status Run(JobSource& jobs, const OnOutcome& on_outcome) override {
    std::vector<Job> all;
    while (std::optional<Job> job = jobs.Next()) {
      all.insert(all.begin(), *std::move(job));
    }
    for (const Job& job : all) {
      Outcome outcome;
      outcome.message = job.key;
      if (Status kept = on_outcome(job, outcome); !kept.ok()) {
        return kept;
      }
    }
    return Ok();
  }
};

TEST(ReplayTest, OutcomesStandInTheOrderOfTheJobs) {
  BackwardsRunner runner;
  const Result<std::vector<Outcome>> again =
      SimulateAgain({JobOf("c"), JobOf("a"), JobOf("b")}, &runner);
  ASSERT_TRUE(again.ok());
  ASSERT_EQ(again->size(), 3U);
  EXPECT_EQ((*again)[0].message, "c");
  EXPECT_EQ((*again)[1].message, "a");
  EXPECT_EQ((*again)[2].message, "b");
}

class NoRunner : public SimRunner {
 public:
  Status Run(JobSource& /*jobs*/, const OnOutcome& /*on_outcome*/) override {
    return Unavailable("no worker starts");
  }
};

TEST(ReplayTest, PassesOnThatNothingCanBeRun) {
  NoRunner runner;
  const Result<std::vector<Outcome>> again =
      SimulateAgain({JobOf("a")}, &runner);
  ASSERT_FALSE(again.ok());
  EXPECT_EQ(again.error().message, "no worker starts");
}

}  // namespace
}  // namespace gatedyno
