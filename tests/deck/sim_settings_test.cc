#include "harness/deck/sim_settings.h"

#include <string>
#include <vector>

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

TEST(SimSettingsTest, TheCheapestRungThatPromisesEnough) {
  EXPECT_EQ(RungFor(kCoarsestAccuracy), 0U);
  EXPECT_EQ(RungFor(0.01), 0U);
  EXPECT_EQ(RungFor(0.0099), 1U);
  EXPECT_EQ(RungFor(kDefaultAccuracy), 1U);
  EXPECT_EQ(RungFor(0.001), 2U);
  EXPECT_EQ(RungFor(0.0009), 3U);
  EXPECT_EQ(RungFor(kFinestAccuracy), 3U);
}

TEST(SimSettingsTest, ALadderClimbsAndEndsInAllThatHelps) {
  EXPECT_EQ(SettingsLadder(RungFor(kDefaultAccuracy)),
            (std::vector<std::string>{
                ".options reltol=0.001 chgtol=1e-17 trtol=0.3 num_threads=1\n",
                ".options reltol=0.001 chgtol=1e-18 trtol=0.1 num_threads=1\n",
                ".options reltol=0.001 chgtol=1e-18 trtol=0.1 num_threads=1 "
                "method=gear itl1=1000 itl4=200\n"}));
}

// The finest rung is checked by one more, which has none above it.
TEST(SimSettingsTest, EveryRungHasOneToCheckItWith) {
  const size_t finest = RungFor(kFinestAccuracy);
  const std::vector<std::string> check = SettingsLadder(finest + 1);
  EXPECT_EQ(check.front(), SettingsLadder(finest)[1]);
  EXPECT_EQ(check.front(), check[1]);
}

}  // namespace
}  // namespace gatedyno
