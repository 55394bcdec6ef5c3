#include "harness/base/result.h"

#include <string>

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

Result<int> Half(int number) {
  if (number % 2 != 0) {
    return BadInput("an odd number");
  }
  return number / 2;
}

Result<std::string> HalfAsText(int number) {
  const Result<int> half = Half(number);
  if (!half.ok()) {
    return Forward(half);
  }
  return std::to_string(*half);
}

TEST(Result, HoldsAValueOrAnError) {
  EXPECT_TRUE(Half(4).ok());
  EXPECT_EQ(*Half(4), 2);
  ASSERT_FALSE(Half(3).ok());
  EXPECT_EQ(Half(3).error().message, "an odd number");
}

TEST(Result, ForwardsTheErrorOfAnother) {
  EXPECT_EQ(*HalfAsText(4), "2");
  ASSERT_FALSE(HalfAsText(3).ok());
  EXPECT_EQ(HalfAsText(3).error().kind, ErrorKind::kBadInput);
  EXPECT_EQ(HalfAsText(3).error().message, "an odd number");
}

TEST(Result, KeepsTheKind) {
  const Status unavailable = Unavailable("x");
  const Status internal = Internal("x");
  EXPECT_EQ(unavailable.error().kind, ErrorKind::kUnavailable);
  EXPECT_EQ(internal.error().kind, ErrorKind::kInternal);
  EXPECT_TRUE(Ok().ok());
}

}  // namespace
}  // namespace gatedyno
