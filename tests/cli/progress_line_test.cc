#include "harness/cli/progress_line.h"

#include <chrono>
#include <optional>
#include <string>
#include <vector>

#include <gmock/gmock.h>
#include <gtest/gtest.h>

namespace gatedyno {
namespace {

using std::chrono::milliseconds;
using std::chrono::seconds;
using ::testing::ElementsAre;
using ::testing::IsEmpty;

constexpr const char* kWipe = "\r\x1b[K";

// A terminal, or a log where it has no columns, and a clock that stands still.
class ProgressLineTest : public testing::Test {
 protected:
  ProgressOutput Output() {
    return {
        .columns = [this] { return columns_; },
        .write = [this](std::string_view text) { lines_.emplace_back(text); },
        .now = [this] { return now_; }};
  }

  std::optional<size_t> columns_ = 200;
  std::chrono::steady_clock::time_point now_{seconds(1000)};
  std::vector<std::string> lines_;
};

RunProgress Progress(int reused, int simulated, int failed = 0) {
  return {.jobs = {.wanted = 50,
                   .reused = reused,
                   .simulated = simulated,
                   .failed = failed},
          .expected_jobs = 100,
          .arcs_ended = 0,
          .arcs = 10,
          .current = "nand2 a->y h=4 typical"};
}

TEST_F(ProgressLineTest, SaysHowFarFastAndLong) {
  struct Case {
    const char* what;
    RunProgress progress;
    const char* text;
  };
  RunProgress nothing;
  nothing.expected_jobs = 7;
  const Case cases[] = {
      {"nothing yet", nothing, "0 of 7 jobs, 0 failed"},
      {"on the way",
       Progress(0, 20, 3),
       "20 of 100 jobs, 2.0/s, 40 s left, 3 failed, nand2 a->y h=4 typical"},
      {"what was there does not make it fast",
       Progress(60, 20),
       "80 of 100 jobs, 2.0/s, 10 s left, 0 failed, nand2 a->y h=4 typical"},
      {"nothing simulated",
       Progress(60, 0),
       "60 of 100 jobs, 0 failed, nand2 a->y h=4 typical"},
      {"more than expected",
       Progress(0, 120),
       "120 jobs, 12/s, 0 failed, nand2 a->y h=4 typical"},
  };
  for (const Case& tried : cases) {
    SCOPED_TRACE(tried.what);
    lines_.clear();
    ProgressLine line(Output());
    now_ += seconds(10);
    line.Show(tried.progress);
    EXPECT_THAT(lines_, ElementsAre(kWipe + std::string(tried.text)));
  }
}

TEST_F(ProgressLineTest, ATerminalChangesTenTimesASecond) {
  constexpr int kCalls = 1000;  // One a millisecond.
  {
    ProgressLine line(Output());
    for (int i = 0; i < kCalls; ++i) {
      now_ += milliseconds(1);
      line.Show(Progress(0, i));
    }
    EXPECT_EQ(lines_.size(), 10U);
  }
  EXPECT_EQ(lines_.back(), kWipe);
}

TEST_F(ProgressLineTest, ATerminalIsAsWideAsItIsNow) {
  ProgressLine line(Output());
  RunProgress progress = Progress(0, 0);
  progress.current = "bell\a";
  for (const size_t columns : {11U, 15U, 40U, 1U}) {
    columns_ = columns;
    now_ += seconds(1);
    line.Show(progress);
  }
  EXPECT_THAT(lines_,
              ElementsAre(kWipe + std::string("0 of 100 j"),
                          kWipe + std::string("0 of 100 jobs,"),
                          kWipe + std::string("0 of 100 jobs, 0 failed, bell?"),
                          kWipe));
}

TEST_F(ProgressLineTest, ALogGetsALineEveryHalfMinuteAndOneAtTheEnd) {
  columns_.reset();
  {
    ProgressLine line(Output());
    for (int i = 1; i <= 75; ++i) {
      now_ += seconds(1);
      line.Show(Progress(0, i));
    }
  }
  EXPECT_THAT(lines_,
              ElementsAre("30 of 100 jobs, 1.0/s, 1 min 10 s left, 0 failed, "
                          "nand2 a->y h=4 typical\n",
                          "60 of 100 jobs, 1.0/s, 40 s left, 0 failed, nand2 "
                          "a->y h=4 typical\n",
                          "75 of 100 jobs, 1.0/s, 25 s left, 0 failed, nand2 "
                          "a->y h=4 typical\n"));
}

TEST_F(ProgressLineTest, NoLogLineIsThereTwice) {
  columns_.reset();
  {
    ProgressLine line(Output());
    now_ += seconds(30);
    line.Show(Progress(0, 100));
  }
  EXPECT_EQ(lines_.size(), 1U);
}

TEST_F(ProgressLineTest, ARunOfSecondsLeavesNothingInALog) {
  columns_.reset();
  {
    ProgressLine line(Output());
    now_ += seconds(29);
    line.Show(Progress(0, 100));
  }
  EXPECT_THAT(lines_, IsEmpty());
}

TEST_F(ProgressLineTest, NothingShownIsNothingToWipe) {
  { const ProgressLine line(Output()); }
  EXPECT_THAT(lines_, IsEmpty());
}

}  // namespace
}  // namespace gatedyno
