// Workers and the program itself are killed, stopped and hurried; the points
// are those of an undisturbed night.

#include <chrono>
#include <csignal>
#include <random>
#include <thread>

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "tests/faults/night.h"

namespace gatedyno {
namespace {

using std::chrono::milliseconds;
using testing::HasSubstr;

void Pause(milliseconds time) {
  std::this_thread::sleep_for(time);
}

// More often than every second, so that a short night has many.
TEST(KilledTest, AWorkerNowAndThen) {
  constexpr milliseconds kBetween(300);
  const TemporaryFolder folder;
  const auto store = folder.path() / "night.db";
  int killed = 0;
  {
    Night night(store);
    while (night.running()) {
      Pause(kBetween);
      const std::vector<pid_t> workers = night.Workers();
      if (!workers.empty()) {
        const size_t victim = static_cast<size_t>(killed) % workers.size();
        killed += ::kill(workers[victim], SIGKILL) == 0 ? 1 : 0;
      }
    }
    EXPECT_LE(night.Wait(), 1) << night.Words();
  }
  EXPECT_GE(killed, 3);
  EXPECT_EQ(PointsIn(store), Undisturbed());
}

TEST(KilledTest, TheProgramAtTwentyRandomMoments) {
  constexpr int kKills = 20;
  constexpr unsigned kSeed = 1903;  // Any; printed with a failure.
  std::mt19937 random(kSeed);
  std::uniform_int_distribution<int> moment_ms(20, 350);
  const TemporaryFolder folder;
  const auto store = folder.path() / "night.db";
  for (int i = 0; i < kKills; ++i) {
    Night night(store);
    Pause(milliseconds(moment_ms(random)));
    ::kill(night.pid(), SIGKILL);
    night.Wait();
  }
  Night last(store);
  EXPECT_LE(last.Wait(), 1) << last.Words();
  EXPECT_EQ(PointsIn(store), Undisturbed()) << "seed " << kSeed;
}

// A stopped process says nothing: after the time limit it is replaced.
TEST(KilledTest, AWorkerThatHangs) {
  const TemporaryFolder folder;
  const auto store = folder.path() / "night.db";
  Night night(store, {"--time-limit", "1"});
  Pause(milliseconds(500));
  const std::vector<pid_t> workers = night.Workers();
  ASSERT_FALSE(workers.empty());
  ASSERT_EQ(::kill(workers.front(), SIGSTOP), 0);
  EXPECT_LE(night.Wait(), 1) << night.Words();
  EXPECT_EQ(PointsIn(store), Undisturbed());
}

TEST(KilledTest, OneInterruptStopsInOrderAndTheSameCommandGoesOn) {
  constexpr int kStoppedExit = 5;
  const TemporaryFolder folder;
  const auto store = folder.path() / "night.db";
  {
    Night night(store);
    Pause(milliseconds(700));
    ASSERT_EQ(::kill(night.pid(), SIGINT), 0);
    EXPECT_EQ(night.Wait(), kStoppedExit);
    EXPECT_THAT(night.Words(),
                HasSubstr("gatedyno: stopping once the jobs in flight have "
                          "ended; again to stop at once\n"));
    EXPECT_THAT(night.Words(), HasSubstr("and the same command goes on\n"));
  }
  const size_t kept = PointsIn(store).size();
  EXPECT_GT(kept, 0U);
  EXPECT_LT(kept, Undisturbed().size());
  Night second(store);
  EXPECT_LE(second.Wait(), 1);
  EXPECT_THAT(second.Words(), HasSubstr("going on with run 1 of "));
  EXPECT_EQ(PointsIn(store), Undisturbed());
}

TEST(KilledTest, TwoInterruptsStopAtOnce) {
  const TemporaryFolder folder;
  const auto store = folder.path() / "night.db";
  {
    Night night(store, {"--time-limit", "60"});
    Pause(milliseconds(700));
    // A worker that never answers would be waited for.
    for (const pid_t worker : night.Workers()) {
      ::kill(worker, SIGSTOP);
    }
    ::kill(night.pid(), SIGINT);
    Pause(milliseconds(200));
    EXPECT_TRUE(night.running());
    ::kill(night.pid(), SIGINT);
    EXPECT_EQ(night.Wait(), 128 + SIGINT);
  }
  Night second(store);
  EXPECT_LE(second.Wait(), 1) << second.Words();
  EXPECT_EQ(PointsIn(store), Undisturbed());
}

TEST(KilledTest, ASecondRunOnTheSameStoreIsRefused) {
  const TemporaryFolder folder;
  const auto store = folder.path() / "night.db";
  Night first(store);
  Pause(milliseconds(500));
  Night second(store);
  EXPECT_EQ(second.Wait(), 4);
  EXPECT_THAT(second.Words(), HasSubstr(std::to_string(first.pid())));
  EXPECT_LE(first.Wait(), 1) << first.Words();
}

}  // namespace
}  // namespace gatedyno
