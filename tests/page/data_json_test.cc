#include "harness/page/data_json.h"

#include <limits>
#include <optional>

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

TEST(DataJsonTest, NineDigitsOrNull) {
  EXPECT_EQ(ShortNumber(1.0 / 3.0).dump(), "0.333333333");
  EXPECT_EQ(ShortNumber(2.0).dump(), "2.0");
  EXPECT_TRUE(ShortNumber(std::numeric_limits<double>::quiet_NaN()).is_null());
  EXPECT_TRUE(ShortNumber(std::numeric_limits<double>::infinity()).is_null());
  EXPECT_TRUE(ShortNumber(std::optional<double>()).is_null());
  EXPECT_EQ(ShortNumber(std::optional(0.25)).dump(), "0.25");
}

TEST(DataJsonTest, NamesHaveThePlaceTheyCameFirst) {
  NamePlaces places;
  EXPECT_EQ(places.Of("x"), 0U);
  EXPECT_EQ(places.Of("y"), 1U);
  EXPECT_EQ(places.Of("x"), 0U);
  EXPECT_EQ(places.names().dump(), "[\"x\",\"y\"]");
}

}  // namespace
}  // namespace gatedyno
