// A store that is only looked at.

#include <filesystem>
#include <fstream>
#include <iterator>
#include <string>

#include <SQLiteCpp/SQLiteCpp.h>
#include <fmt/format.h>
#include <gtest/gtest.h>

#include "harness/base/file.h"
#include "harness/store/schema.h"
#include "tests/store/small_disk.h"
#include "tests/store/store_fixture.h"

namespace gatedyno {
namespace {

constexpr StoreOptions kReadOnly{.read_only = true};

class ReadOnlyTest : public StoreFixture {};

TEST_F(ReadOnlyTest, NoFileIsMade) {
  const Result<Store> store = Store::Open(Path(), kReadOnly);
  ASSERT_FALSE(store.ok());
  EXPECT_EQ(store.error().kind, ErrorKind::kBadInput);
  EXPECT_EQ(store.error().message, Path().string() + ": no such store");
  EXPECT_TRUE(std::filesystem::is_empty(folder_));
}

TEST_F(ReadOnlyTest, SeesWhatAWriterSaves) {
  Store writer = Store::Open(Path()).value();
  Store reader = Store::Open(Path(), kReadOnly).value();
  for (int i = 0; i < 10; ++i) {
    ASSERT_TRUE(writer.SaveOutcome(ExampleJob(i), MeasuredAs(1e-12)).ok());
    EXPECT_TRUE(reader.FindMeasured(ExampleJob(i).key).value().has_value());
  }
  SQLite::Database other(Path().string(), SQLite::OPEN_READWRITE);
  other.exec("BEGIN IMMEDIATE");
  EXPECT_TRUE(reader.FindMeasured(ExampleJob(1).key).value().has_value());
  EXPECT_TRUE(Store::Open(Path(), kReadOnly).ok());
}

TEST_F(ReadOnlyTest, NothingIsWritten) {
  ASSERT_TRUE(
      Store::Open(Path())->SaveOutcome(ExampleJob(1), MeasuredAs(1e-12)).ok());
  const std::string before = ReadFile(Path()).value();
  {
    Store store = Store::Open(Path(), kReadOnly).value();
    EXPECT_TRUE(store.FindMeasured(ExampleJob(1).key).value().has_value());
    const std::string message = Path().string() + ": may only be read";
    EXPECT_EQ(
        store.SaveOutcome(ExampleJob(2), MeasuredAs(1e-12)).error().message,
        message);
    EXPECT_EQ(store.trouble(), StoreTrouble::kOther);
    EXPECT_EQ(store.BeginRun({}).error().message, message);
    EXPECT_EQ(store.NoteProgress(1, {}).error().message, message);
  }
  EXPECT_EQ(ReadFile(Path()).value(), before);
}

// Of a file it may not migrate it says how to have it migrated.
TEST_F(ReadOnlyTest, RefusesAnOlderFileAndLeavesItAlone) {
  SQLite::Database(Path().string(),
                   SQLite::OPEN_READWRITE | SQLite::OPEN_CREATE)
      .exec(fmt::format("PRAGMA application_id = {}; PRAGMA user_version = 1; "
                        "CREATE TABLE job (key TEXT)",
                        kStoreApplicationId));
  const std::string before = ReadFile(Path()).value();
  const Result<Store> store = Store::Open(Path(), kReadOnly);
  ASSERT_FALSE(store.ok());
  EXPECT_EQ(store.error().kind, ErrorKind::kBadInput);
  EXPECT_EQ(store.error().message,
            fmt::format("{0}: written by an older gatedyno (schema 1, this "
                        "program reads {1}); 'gatedyno run' with '--store {0}' "
                        "brings it up to date",
                        Path().string(),
                        NewestSchema()));
  EXPECT_EQ(ReadFile(Path()).value(), before);
}

TEST_F(ReadOnlyTest, AnEmptyFileIsNoStore) {
  std::ofstream(Path()).close();
  const Result<Store> store = Store::Open(Path(), kReadOnly);
  ASSERT_FALSE(store.ok());
  EXPECT_EQ(store.error().message, Path().string() + ": not a gatedyno store");
  EXPECT_EQ(std::filesystem::file_size(Path()), 0U);
}

// What the child below found.
enum ChildExit : int { kAllWell, kNotOpened, kNotFound, kMadeFiles };

ChildExit ReadArchive(const std::filesystem::path& path) {
  Result<Store> store = Store::Open(path, kReadOnly);
  if (!store.ok()) {
    return kNotOpened;
  }
  const auto found = store->FindMeasured(ExampleJob(1).key);
  if (!found.ok() || !found->has_value()) {
    return kNotFound;
  }
  const std::filesystem::directory_iterator files(path.parent_path());
  return std::distance(begin(files), end(files)) == 1 ? kAllWell : kMadeFiles;
}

// As on a disk of finished work that many read.
TEST_F(ReadOnlyTest, ReadsFromADiskThatCannotBeWritten) {
  const int ended = ExitOf(
      [](const std::filesystem::path& runs) -> int {
        const std::filesystem::path disk = runs.parent_path();
        const std::filesystem::path path = disk / "100% mine?#1.db";
        if (!MountDisk(disk, "size=3m")) {
          return kNoDiskHere;
        }
        const Status saved =
            Store::Open(path)->SaveOutcome(ExampleJob(1), MeasuredAs(1e-12));
        if (!saved.ok() ||
            ::mount("", disk.c_str(), "", MS_REMOUNT | MS_RDONLY, "") != 0) {
          return kNoDiskHere;
        }
        return ReadArchive(path);
      },
      Path());
  if (ended == kNoDiskHere) {
    GTEST_SKIP() << "only the superuser may mount a small disk";
  }
  EXPECT_EQ(ended, kAllWell);
}

}  // namespace
}  // namespace gatedyno
