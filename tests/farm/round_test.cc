#include "harness/farm/round.h"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "harness/farm/outbox.h"
#include "harness/farm/round_draft.h"
#include "harness/sim/protocol.h"
#include "tests/farm/farm_bench.h"
#include "tests/support/temporary_folder.h"

namespace gatedyno {
namespace {

using std::chrono::milliseconds;
using testing::ElementsAre;
using testing::IsEmpty;

constexpr milliseconds kAtOnce(0);
constexpr milliseconds kNever(1'000'000);

// Two shares of one job each, both with array 17.
class RoundTest : public testing::Test {
 protected:
  void SetUp() override {
    RoundDraft draft(folder_, 1);
    for (const Job& job : jobs_) {
      ASSERT_TRUE(draft.Add(*JobText(job)).ok());
    }
    ASSERT_TRUE(draft.Close().ok());
    round_.emplace(folder_, draft.share_sizes());
    round_->NoteSubmitted(std::vector{0, 1}, "17");
  }

  QueuedTask Task(int share, bool failed_to_launch = false) const {
    return {folder_.QueueName(), share, "17", failed_to_launch};
  }

  void Publish(int share) {
    const TemporaryFolder scratch;
    Outbox outbox(folder_, share, scratch.path());
    Outcome outcome;
    outcome.ending = Ending::kMeasured;
    ASSERT_TRUE(outbox.Add(jobs_[static_cast<size_t>(share)], outcome).ok());
    ASSERT_TRUE(outbox.Publish().ok());
  }

  size_t Merge() {
    const auto count = round_->Merge(collector_.Taker());
    EXPECT_TRUE(count.ok());
    return *count;
  }

  TemporaryFolder farm_;
  RoundFolder folder_ = *RoundFolder::Make(farm_.path());
  std::vector<Job> jobs_ = DeedJobs(2, "echo");
  std::optional<Round> round_;
  Collector collector_;
};

TEST_F(RoundTest, IsCompleteOnceEveryJobHasCome) {
  EXPECT_EQ(Merge(), 0U);
  Publish(1);
  EXPECT_EQ(Merge(), 1U);
  EXPECT_EQ(Merge(), 0U);
  EXPECT_FALSE(round_->complete());
  Publish(0);
  EXPECT_EQ(Merge(), 1U);
  EXPECT_TRUE(round_->complete());
}

TEST_F(RoundTest, ALostShareIsOneThatIsMissingAndNotQueued) {
  EXPECT_THAT(round_->Lost(std::vector{Task(0), Task(1)}, kAtOnce), IsEmpty());
  EXPECT_THAT(round_->Lost(std::vector{Task(1)}, kAtOnce), ElementsAre(0));
  EXPECT_THAT(round_->Lost({}, kAtOnce), ElementsAre(0, 1));
  // One of another round, and one that Slurm cannot start.
  QueuedTask other = Task(0);
  other.queue_name = "gatedyno-round-other";
  EXPECT_THAT(round_->Lost(std::vector{other, Task(1, true)}, kAtOnce),
              ElementsAre(0, 1));
  Publish(0);
  Merge();
  EXPECT_THAT(round_->Lost({}, kAtOnce), ElementsAre(1));
}

TEST_F(RoundTest, AGoneTaskIsGivenTimeForItsResultToShow) {
  EXPECT_THAT(round_->Lost(std::vector{Task(1)}, kNever), IsEmpty());
  ::usleep(20'000);
  EXPECT_THAT(round_->Lost(std::vector{Task(1)}, milliseconds(10)),
              ElementsAre(0));
  // Seen again, it starts anew.
  EXPECT_THAT(round_->Lost(std::vector{Task(0), Task(1)}, milliseconds(10)),
              IsEmpty());
  EXPECT_THAT(round_->Lost(std::vector{Task(1)}, milliseconds(10)), IsEmpty());
}

TEST_F(RoundTest, HopelessAfterSoManyTasksThatBroughtNothing) {
  // However often it is looked at, one loss counts once.
  round_->Lost(std::vector{Task(1)}, kAtOnce);
  round_->Lost(std::vector{Task(1)}, kAtOnce);
  EXPECT_FALSE(round_->Hopeless(2).has_value());
  round_->NoteSubmitted(std::vector{0}, "18");
  EXPECT_FALSE(round_->Hopeless(2).has_value());
  round_->Lost(std::vector{Task(1)}, kAtOnce);
  ASSERT_TRUE(round_->Hopeless(2).has_value());
  const std::string start =
      folder_.path().string() +
      ": 2 tasks in a row ended without a result for share 0; the last, 18_0, ";
  EXPECT_EQ(*round_->Hopeless(2),
            start + "left no words: do the nodes share that folder?");
  const std::filesystem::path log = folder_.LogFile(0, "18");
  farm_.Write("logs/" + log.filename().string(), "first\nout of luck\n\n");
  EXPECT_EQ(*round_->Hopeless(2),
            start + "said in " + log.string() + ": out of luck");
  // Only logs of shares that lost nothing go.
  farm_.Write("logs/" + folder_.LogFile(1, "17").filename().string(), "");
  round_->RemoveLogs();
  EXPECT_EQ(NamesIn(farm_.path() / "logs").size(), 1U);
}

TEST_F(RoundTest, ATaskThatBroughtSomethingBringsHopeBack) {
  RoundDraft draft(*RoundFolder::Make(farm_.path()), 2);
  folder_ = draft.folder();
  for (const Job& job : jobs_) {
    ASSERT_TRUE(draft.Add(*JobText(job)).ok());
  }
  ASSERT_TRUE(draft.Close().ok());
  round_.emplace(folder_, draft.share_sizes());
  round_->NoteSubmitted(std::vector{0}, "17");
  round_->Lost({}, kAtOnce);
  round_->NoteSubmitted(std::vector{0}, "18");
  Publish(0);  // One of the share's two jobs.
  Merge();
  round_->Lost({}, kAtOnce);
  EXPECT_FALSE(round_->Hopeless(1).has_value());
  round_->NoteSubmitted(std::vector{0}, "19");
  round_->Lost({}, kAtOnce);
  EXPECT_TRUE(round_->Hopeless(1).has_value());
}

}  // namespace
}  // namespace gatedyno
