#include "harness/record/edge.h"

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

TEST(EdgeTest, HasANameAndAnOpposite) {
  EXPECT_EQ(EdgeName(Edge::kRise), "rise");
  EXPECT_EQ(EdgeName(Edge::kFall), "fall");
  EXPECT_EQ(Opposite(Edge::kRise), Edge::kFall);
  EXPECT_EQ(Opposite(Edge::kFall), Edge::kRise);
}

}  // namespace
}  // namespace gatedyno
