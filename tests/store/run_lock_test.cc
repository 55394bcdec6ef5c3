#include "harness/store/run_lock.h"

#include <array>
#include <atomic>
#include <csignal>
#include <string>
#include <thread>
#include <vector>

#include <fcntl.h>
#include <fmt/format.h>
#include <gtest/gtest.h>
#include <sys/wait.h>
#include <unistd.h>

#include "tests/store/store_fixture.h"

namespace gatedyno {
namespace {

class RunLockTest : public StoreFixture {};

std::string Host() {
  std::array<char, 256> name{};
  EXPECT_EQ(::gethostname(name.data(), name.size() - 1), 0);
  return name.data();
}

TEST_F(RunLockTest, OneAtATime) {
  EXPECT_FALSE(RunsLocked(Path()));
  {
    const Result<RunLock> lock = LockRuns(Path());
    ASSERT_TRUE(lock.ok()) << lock.error().message;
    EXPECT_TRUE(RunsLocked(Path()));
    const Result<RunLock> second = LockRuns(Path());
    ASSERT_FALSE(second.ok());
    EXPECT_EQ(second.error().kind, ErrorKind::kUnavailable);
    EXPECT_EQ(second.error().message,
              fmt::format("{}: in use by the run of process {} on {}; wait for "
                          "it, or name another store",
                          Path().string(),
                          ::getpid(),
                          Host()));
    // The refused one has taken nothing away.
    EXPECT_TRUE(RunsLocked(Path()));
  }
  EXPECT_FALSE(RunsLocked(Path()));
  EXPECT_TRUE(std::filesystem::is_empty(folder_));
  EXPECT_TRUE(LockRuns(Path()).ok());
}

TEST_F(RunLockTest, MovesWithItsOwner) {
  RunLock first = LockRuns(Path()).value();
  RunLock lock = std::move(first);
  EXPECT_TRUE(RunsLocked(Path()));
  lock = LockRuns(folder_ / "other.db").value();
  EXPECT_FALSE(RunsLocked(Path()));
  EXPECT_TRUE(RunsLocked(folder_ / "other.db"));
}

TEST_F(RunLockTest, AStoreByAnotherNameIsTheSameStore) {
  ASSERT_TRUE(Store::Open(Path()).ok());
  const std::filesystem::path link = folder_ / "link.db";
  std::filesystem::create_symlink(Path(), link);
  const RunLock lock = LockRuns(link).value();
  EXPECT_TRUE(RunsLocked(Path()));
  EXPECT_TRUE(RunsLocked(folder_ / "." / "runs.db"));
  EXPECT_FALSE(LockRuns(Path()).ok());
}

TEST_F(RunLockTest, AStoreInMemoryNeedsNone) {
  const Result<RunLock> first = LockRuns(":memory:");
  const Result<RunLock> second = LockRuns(":memory:");
  EXPECT_TRUE(first.ok());
  EXPECT_TRUE(second.ok());
  EXPECT_FALSE(RunsLocked(":memory:"));
  EXPECT_FALSE(std::filesystem::exists(":memory:-run"));
}

TEST_F(RunLockTest, SaysWhatCannotBeLocked) {
  const std::filesystem::path store = folder_ / "none" / "runs.db";
  const Result<RunLock> lock = LockRuns(store);
  ASSERT_FALSE(lock.ok());
  EXPECT_EQ(lock.error().kind, ErrorKind::kUnavailable);
  EXPECT_EQ(lock.error().message,
            store.string() +
                "-run: cannot be locked: No such file or "
                "directory");
  EXPECT_FALSE(RunsLocked(store));
}

// In the child: takes the lock, starts a program that outlives it, reports the
// byte and waits for its end.
[[noreturn]] void HoldUntilKilled(const std::filesystem::path& path,
                                  int report) {
  const Result<RunLock> lock = LockRuns(path);
  const pid_t program = ::fork();
  if (program == 0) {
    ::execl("/bin/sleep", "sleep", "5", static_cast<char*>(nullptr));
    ::_exit(1);
  }
  if (lock.ok() &&
      ::write(report, &program, sizeof program) == sizeof program) {
    ::pause();
  }
  ::_exit(1);
}

TEST_F(RunLockTest, GoesWithAKilledProcessWhateverItStarted) {
  int ends[2];
  ASSERT_EQ(::pipe2(ends, O_CLOEXEC), 0);
  const pid_t child = ::fork();
  ASSERT_GE(child, 0);
  if (child == 0) {
    HoldUntilKilled(Path(), ends[1]);
  }
  ::close(ends[1]);
  pid_t program = 0;
  ASSERT_EQ(::read(ends[0], &program, sizeof program),
            static_cast<ssize_t>(sizeof program));
  // The end of the pipe shows that the program has been started: it does not
  // inherit the other end.
  EXPECT_TRUE(RunsLocked(Path()));
  EXPECT_NE(LockRuns(Path()).error().message.find(
                fmt::format("process {} on {}", child, Host())),
            std::string::npos);
  ::kill(child, SIGKILL);
  ASSERT_EQ(::waitpid(child, nullptr, 0), child);
  char rest = 0;
  EXPECT_EQ(::read(ends[0], &rest, 1), 0);
  ::close(ends[0]);
  EXPECT_FALSE(RunsLocked(Path()));
  const Result<RunLock> next = LockRuns(Path());
  EXPECT_TRUE(next.ok()) << next.error().message;
  ::kill(program, SIGKILL);
}

// The file goes with each lock: none may be left holding one that is gone.
TEST_F(RunLockTest, NeverTwoAmongMany) {
  constexpr int kThreads = 8;
  constexpr int kTries = 400;
  std::atomic<int> holders{0};
  std::atomic<int> taken{0};
  std::vector<std::thread> threads;
  threads.reserve(kThreads);
  for (int i = 0; i < kThreads; ++i) {
    threads.emplace_back([&] {
      for (int tried = 0; tried < kTries; ++tried) {
        const Result<RunLock> lock = LockRuns(Path());
        if (lock.ok()) {
          EXPECT_EQ(++holders, 1);
          ++taken;
          std::this_thread::yield();
          --holders;
        }
      }
    });
  }
  for (std::thread& thread : threads) {
    thread.join();
  }
  EXPECT_GT(taken.load(), 0);
  EXPECT_FALSE(RunsLocked(Path()));
}

}  // namespace
}  // namespace gatedyno
