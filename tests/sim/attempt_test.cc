#include "harness/sim/attempt.h"

#include <string>
#include <vector>

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

constexpr int kLossesBeforeAside = 3;

Job JobWithRungs(size_t rungs) {
  Job job;
  job.settings.assign(rungs, ".options\n");
  return job;
}

struct Row {
  std::string what;
  Mishap mishap;
  // Of each attempt made, the first included; the last one is not repeated.
  std::vector<size_t> rungs;
};

// Four rungs, and the same mishap every time.
TEST(NextAttemptTest, ClimbsAsTheMishapAsks) {
  const Row rows[] = {
      {"words: up to the last rung", Mishap::kRefused, {0, 1, 2, 3}},
      {"its own fault: up, and aside after three", Mishap::kCrashed, {0, 1, 2}},
      {"silent: once more first", Mishap::kSilent, {0, 0, 1}},
      {"from outside: never up", Mishap::kTakenAway, {0, 0, 0}},
  };
  for (const Row& row : rows) {
    std::vector<size_t> rungs;
    std::optional<Attempt> attempt = Attempt{.job = JobWithRungs(4)};
    while (attempt) {
      rungs.push_back(attempt->rung);
      attempt = NextAttempt(*attempt, row.mishap, kLossesBeforeAside);
    }
    EXPECT_EQ(rungs, row.rungs) << row.what;
  }
}

TEST(NextAttemptTest, ACrashOnTheLastRungIsTriedAgainThere) {
  const Attempt first{.job = JobWithRungs(1)};
  const auto second = NextAttempt(first, Mishap::kCrashed, kLossesBeforeAside);
  ASSERT_TRUE(second.has_value());
  EXPECT_EQ(second->rung, 0U);
  EXPECT_EQ(second->losses, 1);
}

TEST(NextAttemptTest, AJobWithoutSettingsHasOneRung) {
  const Attempt only{.job = Job()};
  EXPECT_FALSE(
      NextAttempt(only, Mishap::kRefused, kLossesBeforeAside).has_value());
}

}  // namespace
}  // namespace gatedyno
