#include "harness/report/pace.h"

#include <limits>

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

RunProgress Progress(int reused, int simulated, int expected) {
  RunProgress progress;
  progress.jobs.reused = reused;
  progress.jobs.simulated = simulated;
  progress.expected_jobs = expected;
  return progress;
}

TEST(PaceTest, CountsOnlyWhatWasSimulated) {
  struct Case {
    RunProgress progress;
    double session_s;
    std::optional<double> jobs_per_s;
    std::optional<double> left_s;
  };
  const Case cases[] = {
      {Progress(0, 50, 100), 10.0, 5.0, 10.0},
      {Progress(900, 50, 1000), 10.0, 5.0, 10.0},
      {Progress(900, 0, 1000), 10.0, std::nullopt, 0.0},
      {Progress(0, 0, 0), 10.0, std::nullopt, 0.0},
      {Progress(0, 5, 100), 0.0, std::nullopt, 0.0},
      {Progress(0, 5, 100), -1.0, std::nullopt, 0.0},
      {Progress(10, 100, 110), 10.0, 10.0, 0.0},
      // More than was expected.
      {Progress(10, 100, 90), 10.0, 10.0, std::nullopt},
      // Not planned yet.
      {Progress(0, 100, 0), 10.0, 10.0, std::nullopt},
  };
  for (const Case& tried : cases) {
    const std::optional<double> rate =
        JobsPerSecond(tried.progress, tried.session_s);
    EXPECT_EQ(rate, tried.jobs_per_s);
    if (rate) {
      EXPECT_EQ(SecondsLeft(tried.progress, *rate), tried.left_s);
    }
  }
  EXPECT_EQ(JobsDone(Progress(900, 50, 1000)), 950);
}

TEST(PaceTest, NeverMoreJobsThanThereAre) {
  EXPECT_EQ(JobsText(Progress(2, 10, 80)), "12 of 80 jobs");
  EXPECT_EQ(JobsText(Progress(2, 10, 12)), "12 of 12 jobs");
  EXPECT_EQ(JobsText(Progress(2, 10, 11)), "12 jobs");
  EXPECT_EQ(JobsText(Progress(0, 0, 0)), "0 jobs");
}

TEST(PaceTest, DurationsHaveTwoUnits) {
  struct Case {
    double seconds;
    const char* text;
  };
  constexpr double kHuge = std::numeric_limits<double>::infinity();
  const Case cases[] = {
      {0.0, "0 s"},
      {-3.0, "0 s"},
      {0.4, "0 s"},
      {8.0, "8 s"},
      {59.4, "59 s"},
      {59.6, "1 min"},
      {60.0, "1 min"},
      {100.0, "1 min 40 s"},
      {3599.0, "59 min 59 s"},
      {3599.6, "1 h"},
      {7500.0, "2 h 5 min"},
      {86'369.0, "23 h 59 min"},
      {86'371.0, "1 d"},
      {273'600.0, "3 d 4 h"},
      {kHuge, "11574074074 d 2 h"},
  };
  for (const Case& tried : cases) {
    EXPECT_EQ(DurationText(tried.seconds), tried.text) << tried.seconds;
  }
}

TEST(PaceTest, RatesHaveTwoDigits) {
  struct Case {
    double jobs_per_s;
    const char* text;
  };
  const Case cases[] = {
      {1234.0, "1234/s"},
      {41.2, "41/s"},
      {9.96, "10/s"},
      {9.94, "9.9/s"},
      {1.0, "1.0/s"},
      {0.9, "54/min"},
      {0.05, "3.0/min"},
      {0.001, "0.1/min"},
  };
  for (const Case& tried : cases) {
    EXPECT_EQ(RateText(tried.jobs_per_s), tried.text);
  }
}

}  // namespace
}  // namespace gatedyno
