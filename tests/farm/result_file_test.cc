#include "harness/farm/result_file.h"

#include <cstdlib>

#include <gtest/gtest.h>

#include "harness/base/file.h"
#include "tests/farm/farm_bench.h"
#include "tests/support/temporary_folder.h"

namespace gatedyno {
namespace {

TEST(ResultFileTest, PublishesAWholeFileAndNothingElse) {
  TemporaryFolder folder;
  const auto from = folder.Write("local", "all of it");
  ASSERT_TRUE(PublishStore(from, folder.path() / "shared").ok());
  EXPECT_EQ(*ReadFile(folder.path() / "shared"), "all of it");
  EXPECT_EQ(NamesIn(folder.path()).size(), 2U);
  const Status nowhere = PublishStore(from, "/nowhere/shared");
  ASSERT_FALSE(nowhere.ok());
  EXPECT_EQ(nowhere.error().message,
            "/nowhere/shared: cannot be written: No such file or directory");
}

TEST(ResultFileTest, WhatIsNoResultIsRefused) {
  TemporaryFolder folder;
  const ScratchPlace place;
  const auto bad = folder.Write("bad.result", "a store, or not?");
  const auto reader = ResultReader::Open(bad);
  ASSERT_FALSE(reader.ok());
  EXPECT_EQ(reader.error().kind, ErrorKind::kBadInput);
  EXPECT_TRUE(
      reader.error().message.starts_with(bad.string() + ": cannot be read: "));
  const auto none = ResultReader::Open(folder.path() / "none.result");
  ASSERT_FALSE(none.ok());
  EXPECT_EQ(none.error().kind, ErrorKind::kUnavailable);
  EXPECT_EQ(place.entries(), 0U);
}

TEST(ResultFileTest, TheCopyGoesWithTheReader) {
  TemporaryFolder folder;
  const ScratchPlace place;
  const auto path = folder.path() / "good.result";
  ASSERT_TRUE(Store::Open(path).ok());
  {
    auto reader = ResultReader::Open(path);
    ASSERT_TRUE(reader.ok());
    EXPECT_EQ(place.entries(), 1U);
    EXPECT_FALSE(reader->Find("no key")->has_value());
  }
  EXPECT_EQ(place.entries(), 0U);
}

TEST(ScratchFolderTest, SaysWhereNoneCanBeMade) {
  ::setenv("TMPDIR", "/proc", 1);
  const auto scratch = ScratchFolder::Make("gatedyno-farm");
  ::unsetenv("TMPDIR");
  ASSERT_FALSE(scratch.ok());
  EXPECT_EQ(scratch.error().message,
            "/proc: no temporary folder can be made: No such file or "
            "directory; set TMPDIR");
}

}  // namespace
}  // namespace gatedyno
