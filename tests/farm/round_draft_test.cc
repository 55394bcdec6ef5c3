#include "harness/farm/round_draft.h"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "harness/base/file.h"
#include "tests/support/temporary_folder.h"

namespace gatedyno {
namespace {

using testing::ElementsAre;

TEST(RoundDraftTest, FillsOneShareAfterTheOther) {
  const TemporaryFolder farm;
  const auto folder = RoundFolder::Make(farm.path());
  ASSERT_TRUE(folder.ok());
  RoundDraft draft(*folder, 2);
  EXPECT_TRUE(draft.last_share_full());
  for (const char* job : {"a", "b", "c", "d", "e"}) {
    ASSERT_TRUE(draft.Add(job).ok());
  }
  EXPECT_FALSE(draft.last_share_full());
  ASSERT_TRUE(draft.Close().ok());
  EXPECT_EQ(draft.job_count(), 5U);
  EXPECT_THAT(draft.share_sizes(), ElementsAre(2, 2, 1));
  EXPECT_EQ(*ReadFile(folder->ShareFile(0)), "a\nb\n");
  EXPECT_EQ(*ReadFile(folder->ShareFile(1)), "c\nd\n");
  EXPECT_EQ(*ReadFile(folder->ShareFile(2)), "e\n");
}

}  // namespace
}  // namespace gatedyno
