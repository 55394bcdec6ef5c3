#include "harness/report/time_text.h"

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

TEST(TimeTextTest, IsUtc) {
  // By date -u -d @1772400602.
  EXPECT_EQ(TimeText(1'772'400'602'999), "2026-03-01 21:30:02 UTC");
  EXPECT_EQ(IsoTimeText(1'772'400'602'000), "2026-03-01T21:30:02Z");
  EXPECT_EQ(TimeText(0), "1970-01-01 00:00:00 UTC");
}

}  // namespace
}  // namespace gatedyno
