#include "harness/farm/merge.h"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "harness/farm/outbox.h"
#include "harness/farm/round_draft.h"
#include "harness/sim/protocol.h"
#include "tests/farm/farm_bench.h"
#include "tests/support/temporary_folder.h"

namespace gatedyno {
namespace {

using testing::ElementsAre;

class MergeTest : public testing::Test {
 protected:
  void SetUp() override {
    RoundDraft draft(round_, 100);
    for (const Job& job : jobs_) {
      ASSERT_TRUE(draft.Add(*JobText(job)).ok());
    }
    ASSERT_TRUE(draft.Close().ok());
  }

  // A result of these jobs, each measured as `value`.
  std::filesystem::path Result(const std::vector<Job>& jobs,
                               int number,
                               double value) {
    const TemporaryFolder scratch;
    Outbox outbox(round_, number, scratch.path());
    Outcome outcome;
    outcome.ending = Ending::kMeasured;
    outcome.values_s = {{"value", value}};
    for (const Job& job : jobs) {
      EXPECT_TRUE(outbox.Add(job, outcome).ok());
    }
    EXPECT_TRUE(outbox.Publish().ok());
    return round_.NewResult(number, 1);
  }

  size_t Merge(const std::vector<std::filesystem::path>& results) {
    const auto count = MergeShare(
        round_.ShareFile(0), results, collector_.Taker(), &delivered_);
    EXPECT_TRUE(count.ok()) << count.error().message;
    return count.ok() ? *count : 0;
  }

  TemporaryFolder farm_;
  RoundFolder round_ = *RoundFolder::Make(farm_.path());
  std::vector<Job> jobs_ = DeedJobs(4, "echo");
  Collector collector_;  // Fails the test where a job ends twice.
  std::vector<bool> delivered_;
};

TEST_F(MergeTest, HandsOnEachOutcomeOnceWhateverRanTwice) {
  const auto some = Result({jobs_[0], jobs_[2]}, 0, 1.0);
  const auto twin = Result({jobs_[2], jobs_[3]}, 1, 1.0);
  EXPECT_EQ(Merge({some}), 2U);
  EXPECT_THAT(delivered_, ElementsAre(true, false, true, false));
  EXPECT_EQ(Merge({some}), 0U);
  EXPECT_EQ(Merge({some, twin}), 1U);
  EXPECT_THAT(delivered_, ElementsAre(true, false, true, true));
  EXPECT_EQ(collector_.count(), 3U);
}

TEST_F(MergeTest, WhatTheShareDoesNotHaveIsNoConcernOfIt) {
  EXPECT_EQ(Merge({Result({DeedJob("echo", 77)}, 0, 1.0)}), 0U);
}

TEST_F(MergeTest, ASpoiltResultIsSetAside) {
  const auto good = Result({jobs_[1]}, 0, 1.0);
  const auto garbage =
      farm_.Write(round_.name() + "/share-0.x-1-1.result", "rubbish");
  // The first page of a store, and no more.
  const auto cut = Result(jobs_, 2, 1.0);
  std::filesystem::resize_file(cut, 4096);
  EXPECT_EQ(Merge({garbage, cut, good}), 1U);
  for (const auto& bad : {garbage, cut}) {
    EXPECT_FALSE(std::filesystem::exists(bad));
    EXPECT_TRUE(std::filesystem::exists(bad.string() + ".spoilt"));
  }
  EXPECT_TRUE(std::filesystem::exists(good));
}

TEST_F(MergeTest, StopsAtWhatTheTakerRefuses) {
  int calls = 0;
  const auto count = MergeShare(
      round_.ShareFile(0),
      std::vector{Result(jobs_, 0, 1.0)},
      [&](const Job&, const Outcome&) -> Status {
        ++calls;
        return calls == 2 ? Status(Unavailable("the disk is full")) : Ok();
      },
      &delivered_);
  ASSERT_FALSE(count.ok());
  EXPECT_EQ(count.error().message, "the disk is full");
  EXPECT_EQ(calls, 2);
  EXPECT_THAT(delivered_, ElementsAre(true, false));
}

}  // namespace
}  // namespace gatedyno
