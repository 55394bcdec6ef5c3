#include "harness/network/toggle.h"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "tests/support/arc_text.h"
#include "tests/support/bundle_gates.h"
#include "tests/support/gates.h"

namespace gatedyno {
namespace {

std::vector<std::string> TogglesOf(const Cell& cell) {
  const auto analysis = AnalyseNetwork(cell);
  EXPECT_TRUE(analysis.ok());
  std::vector<std::string> found;
  for (const Toggle& toggle : FindToggles(*analysis)) {
    found.push_back(ArcText(ArcOf(cell, *analysis, toggle)));
  }
  return found;
}

TEST(FindTogglesTest, NandTogglesOnlyWithTheOtherInputHigh) {
  EXPECT_THAT(TogglesOf(NandCell(2, 2, 2)),
              testing::ElementsAre("rise a->y fall b=1",
                                   "fall a->y rise b=1",
                                   "rise b->y fall a=1",
                                   "fall b->y rise a=1"));
}

TEST(FindTogglesTest, ExclusiveOrTogglesAlways) {
  EXPECT_THAT(TogglesOf(XorSymmetricCell(2, 2)),
              testing::ElementsAre("rise a->y rise b=0",
                                   "fall a->y fall b=0",
                                   "rise a->y fall b=1",
                                   "fall a->y rise b=1",
                                   "rise b->y rise a=0",
                                   "rise b->y fall a=1",
                                   "fall b->y fall a=0",
                                   "fall b->y rise a=1"));
}

TEST(FindTogglesTest, EverySideVectorOfAnAndOrGate) {
  // c of AOI21 toggles at three of four side vectors.
  const std::vector<std::string> found = TogglesOf(Aoi21Cell(2));
  EXPECT_EQ(found.size(), 10U);
  EXPECT_THAT(found, testing::Contains("rise c->y fall a=0 b=1"));
  EXPECT_THAT(found, testing::Not(testing::Contains("rise c->y fall a=1 b=1")));
}

TEST(FindTogglesTest, OneListForEveryOutput) {
  CellBuilder builder("buf");
  builder.Pins({"a", "y", "x", "vdd", "vss"});
  const Cell cell =
      builder.Inverter("a", "x", 1, 2).Inverter("x", "y", 1, 2).Build();
  EXPECT_THAT(TogglesOf(cell),
              testing::ElementsAre("rise a->y rise",
                                   "fall a->y fall",
                                   "rise a->x fall",
                                   "fall a->x rise"));
}

}  // namespace
}  // namespace gatedyno
