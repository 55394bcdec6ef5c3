#include "harness/record/arc.h"

#include <string>

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

struct ArcRow {
  Arc arc;
  std::string text;
  std::string side;
};

TEST(ArcTest, IsDescribedByItsPinsAndEdge) {
  const ArcRow rows[] = {
      {{"inv", "a", "y", Edge::kRise, Edge::kFall, {}}, "a->y fall", ""},
      {{"nand2", "b", "y", Edge::kFall, Edge::kRise, {{"a", true}}},
       "b->y rise",
       "a=1"},
      {{"aoi21",
        "c",
        "out",
        Edge::kRise,
        Edge::kFall,
        {{"a", true}, {"b", false}}},
       "c->out fall",
       "a=1 b=0"},
  };
  for (const ArcRow& row : rows) {
    EXPECT_EQ(DescribeArc(row.arc), row.text);
    EXPECT_EQ(DescribeSide(row.arc), row.side);
  }
}

TEST(ArcTest, InvertsWhenItsEdgesDiffer) {
  Arc arc;
  arc.input_edge = Edge::kRise;
  arc.edge = Edge::kFall;
  EXPECT_TRUE(arc.inverting());
  arc.edge = Edge::kRise;
  EXPECT_FALSE(arc.inverting());
}

}  // namespace
}  // namespace gatedyno
