#include "harness/record/outcome.h"

#include <string_view>

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

struct EndingRow {
  std::string_view name;
  Ending ending;
  bool measured;
};

TEST(OutcomeTest, OnlyMeasuredIsMeasured) {
  const EndingRow rows[] = {{"measured", Ending::kMeasured, true},
                            {"failed", Ending::kFailed, false},
                            {"timed out", Ending::kTimedOut, false},
                            {"crashed", Ending::kCrashed, false}};
  for (const EndingRow& row : rows) {
    Outcome outcome;
    outcome.ending = row.ending;
    EXPECT_EQ(EndingName(row.ending), row.name);
    EXPECT_EQ(outcome.measured(), row.measured);
  }
}

// A job that nobody ran must not look measured.
TEST(OutcomeTest, StartsAsFailed) {
  EXPECT_FALSE(Outcome().measured());
}

}  // namespace
}  // namespace gatedyno
