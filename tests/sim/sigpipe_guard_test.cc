#include "harness/sim/sigpipe_guard.h"

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

bool IsBlocked() {
  sigset_t mask;
  pthread_sigmask(SIG_BLOCK, nullptr, &mask);
  return sigismember(&mask, SIGPIPE) == 1;
}

TEST(SigpipeGuardTest, SwallowsTheSignalOnlyWhileItLives) {
  ASSERT_FALSE(IsBlocked());
  {
    const SigpipeGuard guard;
    EXPECT_TRUE(IsBlocked());
    pthread_kill(pthread_self(), SIGPIPE);
  }
  // Still here: the pending signal went with the guard.
  EXPECT_FALSE(IsBlocked());
}

TEST(SigpipeGuardTest, Nests) {
  const SigpipeGuard outer;
  { const SigpipeGuard inner; }
  EXPECT_TRUE(IsBlocked());
}

TEST(SigpipeGuardDeathTest, LeavesTheProgramAsItWas) {
  EXPECT_EXIT(
      {
        { const SigpipeGuard guard; }
        pthread_kill(pthread_self(), SIGPIPE);
      },
      testing::KilledBySignal(SIGPIPE),
      "");
}

}  // namespace
}  // namespace gatedyno
