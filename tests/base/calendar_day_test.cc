#include "harness/base/calendar_day.h"

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

// Leap years by the Gregorian rule: 2000 and 2024, not 1900.
TEST(CalendarDayTest, IsADayThatThereIs) {
  for (const char* day : {"2026-12-02",
                          "2026-01-01",
                          "2026-12-31",
                          "2024-02-29",
                          "2000-02-29",
                          "9999-12-31"}) {
    EXPECT_TRUE(IsCalendarDay(day)) << day;
  }
  for (const char* day : {"",
                          "2026-02-29",
                          "1900-02-29",
                          "2026-04-31",
                          "2026-13-01",
                          "2026-00-10",
                          "2026-01-00",
                          "2026-1-1",
                          "26-01-01",
                          "02.12.2026",
                          "2026/12/02",
                          "2026-12-02 ",
                          "2026-12-02T00:00",
                          "+026-12-02",
                          "next week"}) {
    EXPECT_FALSE(IsCalendarDay(day)) << day;
  }
}

}  // namespace
}  // namespace gatedyno
