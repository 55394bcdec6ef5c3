// What is left in the file when the program is killed in the middle.

#include <csignal>
#include <string>

#include <SQLiteCpp/SQLiteCpp.h>
#include <gtest/gtest.h>
#include <sys/wait.h>
#include <unistd.h>

#include "tests/store/store_fixture.h"

namespace gatedyno {
namespace {

class StoreDeathTest : public StoreFixture {};

// In the child: saves jobs for ever and reports each one saved as a byte.
[[noreturn]] void SaveUntilKilled(const std::filesystem::path& path,
                                  int report) {
  Result<Store> store = Store::Open(path);
  for (int i = 0; store.ok(); ++i) {
    if (!store->SaveOutcome(ExampleJob(i), MeasuredAs(1e-12)).ok() ||
        write(report, "x", 1) != 1) {
      break;
    }
  }
  _exit(1);
}

TEST_F(StoreDeathTest, WhatWasSavedBeforeAKillIsThere) {
  constexpr int kBeforeTheKill = 300;
  int ends[2];
  ASSERT_EQ(pipe(ends), 0);
  const pid_t child = fork();
  ASSERT_GE(child, 0);
  if (child == 0) {
    close(ends[0]);
    SaveUntilKilled(Path(), ends[1]);
  }
  close(ends[1]);
  int reported = 0;
  char byte = 0;
  while (reported < kBeforeTheKill && read(ends[0], &byte, 1) == 1) {
    ++reported;
  }
  kill(child, SIGKILL);
  while (read(ends[0], &byte, 1) == 1) {
    ++reported;
  }
  close(ends[0]);
  int status = 0;
  ASSERT_EQ(waitpid(child, &status, 0), child);
  ASSERT_TRUE(WIFSIGNALED(status));
  ASSERT_GE(reported, kBeforeTheKill);

  Store store = Store::Open(Path()).value();
  for (int i = 0; i < reported; ++i) {
    ASSERT_TRUE(store.FindMeasured(ExampleJob(i).key).value().has_value()) << i;
  }
  // At most one more may have been committed without being reported, and never
  // a job without its outcome.
  EXPECT_FALSE(store.FindJob(ExampleJob(reported + 1).key).value().has_value());
  SQLite::Database plain(Path().string(), SQLite::OPEN_READONLY);
  EXPECT_EQ(plain.execAndGet("PRAGMA integrity_check").getString(), "ok");
  EXPECT_EQ(plain.execAndGet("SELECT count(*) FROM job").getInt(),
            plain.execAndGet("SELECT count(outcome) FROM job").getInt());
}

}  // namespace
}  // namespace gatedyno
