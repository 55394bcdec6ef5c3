#include "harness/network/levels.h"

#include <gtest/gtest.h>

#include "harness/network/analysis.h"
#include "tests/support/gates.h"

namespace gatedyno {
namespace {

TEST(EvaluateTest, InnerNetsFollowFloatOrSeeTheRail) {
  // NAND2, first input at the output: the net between the NMOS floats at
  // a=0 b=0, follows the output at a=1 b=0 and sees ground when b=1.
  const Cell cell = NandCell(2, 2, 2);
  const auto analysis = AnalyseNetwork(cell);
  ASSERT_TRUE(analysis.ok());
  size_t inner = 0;
  while (cell.nets[inner] != "y.n.a.b:1") {
    ++inner;
  }
  EXPECT_EQ(analysis->levels[0b00][inner], Level::kFloating);
  EXPECT_EQ(analysis->levels[0b01][inner], Level::kHigh);
  EXPECT_EQ(analysis->levels[0b10][inner], Level::kLow);
  EXPECT_EQ(analysis->levels[0b11][inner], Level::kLow);
}

TEST(DescribeVectorTest, InPinOrder) {
  const Cell cell = NandCell(3, 3, 2);
  const auto analysis = AnalyseNetwork(cell);
  ASSERT_TRUE(analysis.ok());
  EXPECT_EQ(DescribeVector(cell, analysis->inputs, 0b110), "a=0 b=1 c=1");
  EXPECT_EQ(DescribeVector(cell, {}, 0), "");
}

TEST(InputVectorTest, Bits) {
  EXPECT_TRUE(IsHigh(0b100, 2));
  EXPECT_FALSE(IsHigh(0b100, 1));
  EXPECT_EQ(Toggled(0b100, 2), 0U);
  EXPECT_EQ(Toggled(0b100, 0), 0b101U);
}

}  // namespace
}  // namespace gatedyno
