#include "harness/record/tolerance.h"

#include <string>
#include <vector>

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

Arc ArcOf(const std::string& cell, Edge edge) {
  return {.cell = cell,
          .pin = "a",
          .output = "y",
          .input_edge = Opposite(edge),
          .edge = edge,
          .side = {}};
}

const std::vector<ToleranceRule> kRules = {
    {.where = {.cells = "nor*", .edge = {}}, .effort = 0.3, .parasitic = 0.5},
    {.where = {.edge = Edge::kRise}, .effort = std::nullopt, .parasitic = 0.4},
    {.where = {.corners = "slow_*", .edge = {}},
     .effort = 0.1,
     .parasitic = std::nullopt},
};

TEST(ToleranceTest, TheLastRuleThatNamesAQuantityCounts) {
  struct Case {
    Arc arc;
    std::string corner;
    Tolerance allowed;
  };
  const Case cases[] = {
      {ArcOf("inv", Edge::kFall), "typical", {0.25, 0.35}},
      {ArcOf("inv", Edge::kRise), "typical", {0.25, 0.4}},
      {ArcOf("nor2", Edge::kFall), "typical", {0.3, 0.5}},
      {ArcOf("nor2", Edge::kRise), "typical", {0.3, 0.4}},
      {ArcOf("nor2", Edge::kRise), "slow_lo", {0.1, 0.4}},
      {ArcOf("inv", Edge::kFall), "slow_lo", {0.1, 0.35}},
  };
  const Tolerance general{0.25, 0.35};
  for (const Case& test : cases) {
    EXPECT_EQ(ToleranceFor(test.arc, test.corner, general, kRules),
              test.allowed)
        << test.arc.cell << " " << EdgeName(test.arc.edge) << " "
        << test.corner;
  }
}

TEST(ToleranceTest, WithoutRulesTheGeneralOneCounts) {
  const Tolerance general{0.1, 0.2};
  EXPECT_EQ(ToleranceFor(ArcOf("inv", Edge::kRise), "typical", general, {}),
            general);
}

}  // namespace
}  // namespace gatedyno
