// No room left in the middle of a transaction.

#include <csignal>
#include <filesystem>
#include <fstream>
#include <functional>
#include <string>

#include <SQLiteCpp/SQLiteCpp.h>
#include <gtest/gtest.h>
#include <sys/mount.h>
#include <sys/resource.h>

#include "tests/store/small_disk.h"
#include "tests/store/store_fixture.h"

namespace gatedyno {
namespace {

class StoreFullTest : public StoreFixture {};

constexpr int kMost = 20'000;
constexpr size_t kDeckSize = 4000;  // Of a small arc's deck.

Job LargeJob(int number) {
  Job job = ExampleJob(number);
  job.deck.append(kDeckSize, '*');
  return job;
}

// How a child process that writes until there is no room found things.
enum ChildExit : int {
  kAllWell,
  kNotRefused,
  kWrongTrouble,
  kLost,
  kHalfThere,
  kUnsound,
  kNotUsableOn,
};

// Saves until it is refused; the number saved, or -1 where it never is.
int SaveUntilRefused(Store* store) {
  for (int i = 0; i < kMost; ++i) {
    if (!store->SaveOutcome(LargeJob(i), MeasuredAs(1e-12)).ok()) {
      return i;
    }
  }
  return -1;
}

// Whether the store has exactly the first `saved` jobs, all with outcomes.
ChildExit Look(const std::filesystem::path& path, int saved) {
  Store store = Store::Open(path, {.read_only = true}).value();
  for (int i = 0; i < saved; ++i) {
    if (!store.FindMeasured(ExampleJob(i).key).value().has_value()) {
      return kLost;
    }
  }
  if (store.FindJob(ExampleJob(saved).key).value().has_value()) {
    return kHalfThere;
  }
  SQLite::Database plain(path.string(), SQLite::OPEN_READONLY);
  return plain.execAndGet("PRAGMA integrity_check").getString() == "ok"
             ? kAllWell
             : kUnsound;
}

// `make_room` undoes what refused the writes.
ChildExit FillUp(const std::filesystem::path& path,
                 const std::function<void()>& make_room) {
  Store store = Store::Open(path).value();
  const int saved = SaveUntilRefused(&store);
  if (saved < 0) {
    return kNotRefused;
  }
  if (store.trouble() != StoreTrouble::kFull) {
    return kWrongTrouble;
  }
  if (const ChildExit found = Look(path, saved); found != kAllWell) {
    return found;
  }
  make_room();
  const Status again = store.SaveOutcome(LargeJob(saved), MeasuredAs(1e-12));
  return again.ok() ? Look(path, saved + 1) : kNotUsableOn;
}

void LimitFiles(rlim_t bytes) {
  const struct rlimit limit = {bytes, RLIM_INFINITY};
  ::setrlimit(RLIMIT_FSIZE, &limit);
}

// A limit on the size of files strikes the log at any byte.
TEST_F(StoreFullTest, ALimitOnTheSizeOfFiles) {
  for (const rlim_t kib : {100U, 101U, 777U, 3000U}) {
    SCOPED_TRACE(kib);
    static rlim_t limit;
    limit = kib << 10;
    std::filesystem::remove_all(folder_);
    std::filesystem::create_directory(folder_);
    EXPECT_EQ(ExitOf(
                  [](const std::filesystem::path& path) -> int {
                    ::signal(SIGXFSZ, SIG_IGN);
                    LimitFiles(limit);
                    return FillUp(path, [] { LimitFiles(RLIM_INFINITY); });
                  },
                  Path()),
              kAllWell);
    // As the next process finds it, after the child's end.
    SQLite::Database plain(Path().string(), SQLite::OPEN_READWRITE);
    EXPECT_EQ(plain.execAndGet("PRAGMA integrity_check").getString(), "ok");
  }
}

TEST_F(StoreFullTest, AFullDisk) {
  const int ended = ExitOf(
      [](const std::filesystem::path& path) -> int {
        const std::filesystem::path disk = path.parent_path();
        if (!MountDisk(disk, "size=3m")) {
          return kNoDiskHere;
        }
        return FillUp(path, [&disk] {
          ::mount("tmpfs", disk.c_str(), "tmpfs", MS_REMOUNT, "size=64m");
        });
      },
      Path());
  if (ended == kNoDiskHere) {
    GTEST_SKIP() << "only the superuser may mount a small disk";
  }
  EXPECT_EQ(ended, kAllWell);
}

}  // namespace
}  // namespace gatedyno
