#include "harness/farm/round_folder.h"

#include <set>
#include <string>

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "tests/support/temporary_folder.h"

namespace gatedyno {
namespace {

using testing::MatchesRegex;

TEST(RoundFolderTest, EveryRoundHasANameOfItsOwn) {
  const TemporaryFolder farm;
  std::set<std::string> names;
  for (int i = 0; i < 5; ++i) {
    const auto round = RoundFolder::Make(farm.path());
    ASSERT_TRUE(round.ok());
    EXPECT_THAT(round->name(), MatchesRegex("round-[0-9a-f]{8}"));
    EXPECT_EQ(round->QueueName(), "gatedyno-" + round->name());
    names.insert(round->name());
  }
  const auto all = RoundFolder::All(farm.path());
  ASSERT_TRUE(all.ok());
  std::set<std::string> found;
  for (const RoundFolder& round : *all) {
    found.insert(round.name());
  }
  EXPECT_EQ(found, names);
}

TEST(RoundFolderTest, ListsResultsAndNothingElse) {
  TemporaryFolder farm;
  const auto round = RoundFolder::Make(farm.path());
  ASSERT_TRUE(round.ok());
  for (const char* name : {"share-7.jobs",
                           "share-7.n1-5-2.result",
                           "share-12.n1-5-1.result",
                           "share-1.n1-5-1.result.part",
                           "share-1.n1-5-1.result.spoilt",
                           "share-x.n1-5-1.result",
                           "share-3result"}) {
    farm.Write(round->name() + "/" + name, "");
  }
  const auto results = round->Results();
  ASSERT_TRUE(results.ok());
  ASSERT_EQ(results->size(), 2U);
  EXPECT_EQ((*results)[0].share, 12);
  EXPECT_EQ((*results)[0].path, round->path() / "share-12.n1-5-1.result");
  EXPECT_EQ((*results)[1].share, 7);
}

TEST(RoundFolderTest, KnowsItsOwnResultsAndLogs) {
  TemporaryFolder farm;
  const auto round = RoundFolder::Make(farm.path());
  ASSERT_TRUE(round.ok());
  farm.Write(round->name() + "/" + round->NewResult(3, 9).filename().string(),
             "");
  ASSERT_EQ(round->Results()->size(), 1U);
  EXPECT_EQ(round->Results()->front().share, 3);
  for (const int share : {1, 11}) {
    farm.Write("logs/" + round->LogFile(share, "17").filename().string(), "");
  }
  round->RemoveLogs(1);
  EXPECT_FALSE(std::filesystem::exists(round->LogFile(1, "17")));
  EXPECT_TRUE(std::filesystem::exists(round->LogFile(11, "17")));
  EXPECT_TRUE(round->Remove().ok());
  EXPECT_FALSE(std::filesystem::exists(round->path()));
}

// %a and %A are Slurm's; another % in the name means itself.
TEST(RoundFolderTest, LogPatternIsSlurms) {
  EXPECT_EQ(RoundFolder("/farm 5%a", "round-1").LogPattern(),
            "/farm 5%%a/logs/round-1-share-%a-%A.log");
  EXPECT_EQ(RoundFolder("/farm", "round-1").LogFile(4, "17").string(),
            "/farm/logs/round-1-share-4-17.log");
}

TEST(RoundFolderTest, NamesAFolderThatCannotBeUsed) {
  const auto made = RoundFolder::Make("/proc/nowhere");
  ASSERT_FALSE(made.ok());
  EXPECT_EQ(made.error().message,
            "/proc/nowhere: the farm's folder cannot be written: No such file "
            "or directory");
  const auto all = RoundFolder::All("/nowhere");
  ASSERT_FALSE(all.ok());
  EXPECT_EQ(all.error().message,
            "/nowhere: cannot be listed: No such file or directory");
}

}  // namespace
}  // namespace gatedyno
