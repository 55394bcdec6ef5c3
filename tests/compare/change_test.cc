#include "harness/compare/change.h"

#include <cmath>
#include <limits>
#include <optional>

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

// Student's t for 95.45 % at two and at ten degrees of freedom: JCGM 100:2008,
// table G.2, which has two decimals.
constexpr double kCoverageOfFourPoints = 4.53;
constexpr double kCoverageOfTwelvePoints = 2.28;
constexpr double kTableRounding = 0.0025;  // Relative.

constexpr double kNaN = std::numeric_limits<double>::quiet_NaN();

TEST(ChangeTest, IsRelativeToTheSizeOfBefore) {
  struct Case {
    double before;
    double after;
    double relative;
  };
  const Case cases[] = {
      {2.0, 2.0, 0.0},
      {2.0, 2.5, 0.25},
      {2.0, 1.0, -0.5},
      {-2.0, -1.0, 0.5},  // Up is up, whatever the sign.
      {2.0, -2.0, -2.0},
  };
  for (const Case& c : cases) {
    const auto change = ChangeOf({{c.before, 0.0}, 5}, {{c.after, 0.0}, 5});
    ASSERT_TRUE(change);
    EXPECT_DOUBLE_EQ(change->relative, c.relative) << c.before;
    EXPECT_EQ(change->before.value, c.before);
    EXPECT_EQ(change->after.value, c.after);
  }
}

TEST(ChangeTest, NothingIsRelativeToNothing) {
  const double infinity = std::numeric_limits<double>::infinity();
  const double pairs[][2] = {
      {0.0, 1.0}, {kNaN, 1.0}, {1.0, kNaN}, {infinity, 1.0}, {1.0, infinity}};
  for (const auto& [before, after] : pairs) {
    EXPECT_FALSE(ChangeOf({{before, 0.1}, 5}, {{after, 0.1}, 5}))
        << before << " " << after;
  }
}

// dc/db = 1 / a, dc/da = -b / a^2.
TEST(ChangeTest, BothUncertaintiesCountWithTheirOwnCoverage) {
  struct Case {
    const char* what;
    Reading before;
    Reading after;
    double expanded;
  };
  const Case cases[] = {
      {"after alone",
       {{2.0, 0.0}, 4},
       {{3.0, 0.02}, 4},
       kCoverageOfFourPoints * 0.02 / 2.0},
      {"before alone, which counts b / a as much",
       {{2.0, 0.02}, 4},
       {{3.0, 0.0}, 4},
       kCoverageOfFourPoints * 0.02 * 3.0 / 4.0},
      {"both, of few and of many points",
       {{2.0, 0.02}, 4},
       {{3.0, 0.05}, 12},
       std::hypot(kCoverageOfFourPoints * 0.02 * 3.0 / 4.0,
                  kCoverageOfTwelvePoints * 0.05 / 2.0)},
  };
  for (const Case& c : cases) {
    const auto change = ChangeOf(c.before, c.after);
    ASSERT_TRUE(change && change->expanded) << c.what;
    EXPECT_NEAR(*change->expanded / c.expanded, 1.0, kTableRounding) << c.what;
  }
}

TEST(ChangeTest, UnknownUncertaintyIsNeverBeyond) {
  const Reading known{{1.0, 0.0}, 5};
  const Reading unknowns[] = {
      {{9.0, std::nullopt}, 5},
      {{9.0, 0.0}, 2},  // A line through two points has none.
  };
  for (const Reading& unknown : unknowns) {
    for (const auto& change :
         {ChangeOf(known, unknown), ChangeOf(unknown, known)}) {
      ASSERT_TRUE(change);
      EXPECT_FALSE(change->expanded);
      EXPECT_FALSE(IsBeyondUncertainty(*change));
    }
  }
}

TEST(ChangeTest, BeyondUncertainty) {
  struct Case {
    double relative;
    std::optional<double> expanded;
    bool beyond;
  };
  const Case cases[] = {{0.05, 0.04, true},
                        {-0.05, 0.04, true},
                        {0.05, 0.05, false},
                        {0.0, 0.0, false},
                        {0.05, std::nullopt, false}};
  for (const Case& c : cases) {
    Change change;
    change.relative = c.relative;
    change.expanded = c.expanded;
    EXPECT_EQ(IsBeyondUncertainty(change), c.beyond) << c.relative;
  }
}

}  // namespace
}  // namespace gatedyno
