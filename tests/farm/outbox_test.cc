#include "harness/farm/outbox.h"

#include <gtest/gtest.h>

#include "harness/farm/result_file.h"
#include "tests/farm/farm_bench.h"
#include "tests/support/temporary_folder.h"

namespace gatedyno {
namespace {

Outcome Measured(double value) {
  Outcome outcome;
  outcome.ending = Ending::kMeasured;
  outcome.values_s = {{"value", value}};
  return outcome;
}

class OutboxTest : public testing::Test {
 protected:
  std::vector<ResultName> Results() const {
    const auto results = round_.Results();
    EXPECT_TRUE(results.ok());
    return *results;
  }

  TemporaryFolder farm_;
  TemporaryFolder scratch_;
  RoundFolder round_ = *RoundFolder::Make(farm_.path());
};

TEST_F(OutboxTest, PublishesEachOutcomeOnceBitForBit) {
  Outbox outbox(round_, 4, scratch_.path());
  ASSERT_TRUE(outbox.Publish().ok());  // Nothing: no file.
  EXPECT_TRUE(Results().empty());
  const double third = 1.0 / 3.0;
  const Job first = DeedJob("echo", 1);
  const Job second = DeedJob("echo", 2);
  ASSERT_TRUE(outbox.Add(first, Measured(third)).ok());
  EXPECT_TRUE(Results().empty());
  ASSERT_TRUE(outbox.Publish().ok());
  ASSERT_TRUE(outbox.Publish().ok());
  ASSERT_EQ(Results().size(), 1U);
  Outcome failed;
  failed.message = "no convergence";
  ASSERT_TRUE(outbox.Add(second, failed).ok());
  ASSERT_TRUE(outbox.Publish().ok());
  ASSERT_EQ(Results().size(), 2U);

  EXPECT_EQ(Results()[0].share, 4);
  auto one = ResultReader::Open(Results()[0].path);
  auto two = ResultReader::Open(Results()[1].path);
  ASSERT_TRUE(one.ok() && two.ok());
  EXPECT_EQ((*one->Find(first.key))->values_s.at("value"), third);
  EXPECT_FALSE(one->Find(second.key)->has_value());
  EXPECT_FALSE(two->Find(first.key)->has_value());
  EXPECT_EQ((*two->Find(second.key))->message, "no convergence");
  EXPECT_TRUE(NamesIn(scratch_.path()).empty());
  // One file a result, and nothing beside it.
  EXPECT_EQ(NamesIn(round_.path()).size(), 2U);
}

TEST_F(OutboxTest, AFailureIsToldAndTriedAgain) {
  Outbox outbox(round_, 0, scratch_.path());
  ASSERT_TRUE(outbox.Add(DeedJob("echo", 1), Measured(1.0)).ok());
  std::filesystem::remove_all(round_.path());
  const std::string message = round_.NewResult(0, 1).string() +
                              ": cannot be written: No such file or directory";
  const Status published = outbox.Publish();
  ASSERT_FALSE(published.ok());
  EXPECT_EQ(published.error().message, message);
  const Status added = outbox.Add(DeedJob("echo", 2), Measured(1.0));
  ASSERT_FALSE(added.ok());
  EXPECT_EQ(added.error().message, message);
  std::filesystem::create_directory(round_.path());
  ASSERT_TRUE(outbox.Publish().ok());
  EXPECT_EQ(Results().size(), 1U);
}

}  // namespace
}  // namespace gatedyno
