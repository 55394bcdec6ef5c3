#include "harness/record/arc_pattern.h"

#include <string>

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

const Arc kArc = {.cell = "nor3",
                  .pin = "b",
                  .output = "y",
                  .input_edge = Edge::kRise,
                  .edge = Edge::kFall,
                  .side = {{"a", false}, {"c", false}}};
constexpr const char* kCorner = "slow_lo_m40";

struct Case {
  ArcPattern pattern;
  bool covers;
  std::string description;
};

const Case kCases[] = {
    {{}, true, "every arc"},
    {{.cells = "nor*", .edge = {}}, true, "nor*"},
    {{.cells = "nor?", .edge = {}}, true, "nor?"},
    {{.cells = "nor", .edge = {}}, false, "nor"},
    {{.cells = "NOR3", .edge = {}}, false, "NOR3"},
    {{.cells = "[mn]or3", .edge = {}}, true, "[mn]or3"},
    {{.pins = "b", .edge = {}}, true, "pin b"},
    {{.pins = "a", .edge = {}},
     false,
     "pin a"},  // A side input is not the one that moves.
    {{.outputs = "y", .edge = {}}, true, "output y"},
    {{.outputs = "q", .edge = {}}, false, "output q"},
    {{.corners = "slow_*", .edge = {}}, true, "corner slow_*"},
    {{.corners = "typical", .edge = {}}, false, "corner typical"},
    {{.edge = Edge::kFall}, true, "fall"},
    {{.edge = Edge::kRise}, false, "rise"},  // The input's, not the output's.
    {{.cells = "nor*",
      .pins = "?",
      .outputs = "y",
      .corners = "slow_*",
      .edge = Edge::kFall},
     true,
     "nor*, pin ?, output y, fall, corner slow_*"},
    {{.cells = "nor*", .pins = "c", .edge = {}}, false, "nor*, pin c"},
};

TEST(ArcPatternTest, CoversWhatFitsInEveryPart) {
  for (const Case& test : kCases) {
    EXPECT_EQ(Covers(test.pattern, kArc, kCorner), test.covers)
        << test.description;
  }
}

TEST(ArcPatternTest, IsDescribedByWhatNarrowsIt) {
  for (const Case& test : kCases) {
    EXPECT_EQ(DescribePattern(test.pattern), test.description);
  }
}

}  // namespace
}  // namespace gatedyno
