#include "harness/fit/linearity.h"

#include <random>
#include <vector>

#include <gtest/gtest.h>

#include "harness/fit/line_fit.h"

namespace gatedyno {
namespace {

constexpr double kTauS = 1.5e-12;

struct Shape {
  double slope_tau = 1.0;
  double curvature_tau = 0.0;  // Times fanout squared.
};

std::vector<Point> Points(const std::vector<double>& fanouts,
                          const Shape& shape) {
  std::vector<Point> points;
  points.reserve(fanouts.size());
  for (const double h : fanouts) {
    points.push_back({.fanout = h,
                      .delay_s = kTauS * (2.0 + shape.slope_tau * h +
                                          shape.curvature_tau * h * h)});
  }
  return points;
}

Linearity Judge(const std::vector<Point>& points) {
  return TestLinearity(FitLine(points).value(), points, kTauS);
}

TEST(LinearityTest, TheBendIsRecovered) {
  // Over fanouts 1 to 6 a parabola of c h^2 leaves its nearest line by
  // c (5/2)^2 / 2.
  const Linearity result =
      Judge(Points({1, 2, 3, 4, 5, 6}, {.curvature_tau = 0.01}));
  ASSERT_TRUE(result.bend_tau.has_value());
  EXPECT_NEAR(result.bend_tau->value, 0.03125, 1e-9);
  EXPECT_NEAR(*result.bend_tau->u, 0.0, 1e-9);
  EXPECT_FALSE(result.bent);
}

TEST(LinearityTest, Verdicts) {
  struct Case {
    const char* what;
    std::vector<double> fanouts;
    Shape shape;
    double kick_tau;  // Added to the delay of the third point.
    bool bent;
  };
  const Case cases[] = {
      {"straight", {1, 2, 3, 4, 5, 6}, {}, 0.0, false},
      {"slightly curved", {1, 2, 3, 4, 5, 6}, {1.0, 0.012}, 0.0, false},
      {"curved upwards", {1, 2, 3, 4, 5, 6}, {1.0, 0.02}, 0.0, true},
      {"curved downwards", {1, 2, 3, 4, 5, 6}, {1.0, -0.02}, 0.0, true},
      {"one point off", {1, 2, 3, 4, 5, 6}, {}, 0.15, true},
      {"one point off by little", {1, 2, 3, 4, 5, 6}, {}, 0.05, false},
      {"curved, seen by residual only", {1, 3, 6}, {1.0, 0.06}, 0.0, true},
      {"the same curve under a large effort",
       {1, 2, 3, 4, 5, 6},
       {8.0, 0.02},
       0.0,
       false},
      {"two points", {1, 4}, {1.0, 1.0}, 0.0, false},
  };
  for (const Case& test : cases) {
    SCOPED_TRACE(test.what);
    std::vector<Point> points = Points(test.fanouts, test.shape);
    if (test.kick_tau != 0.0) {
      points[2].delay_s += test.kick_tau * kTauS;
    }
    EXPECT_EQ(Judge(points).bent, test.bent);
  }
}

TEST(LinearityTest, ResidualIsInTau) {
  std::vector<Point> points = Points({1, 2, 3}, {});
  points[1].delay_s += 0.3 * kTauS;
  // Least squares leaves 1/6, -1/3, 1/6 of a kick in the middle of three.
  EXPECT_NEAR(Judge(points).largest_residual_tau, 0.2, 1e-9);
}

TEST(LinearityTest, NoBendWhereTheTestCannotBeMade) {
  EXPECT_FALSE(Judge(Points({1, 2, 3}, {})).bend_tau.has_value());
  EXPECT_FALSE(Judge(Points({1, 1, 4, 4}, {})).bend_tau.has_value());
}

// Scatter alone must not look like a bend.
TEST(LinearityTest, NoiseIsNotABend) {
  std::mt19937_64 random(21);
  std::normal_distribution<double> noise_s(0.0, 0.03 * kTauS);
  int bent = 0;
  constexpr int kArcs = 1000;
  for (int i = 0; i < kArcs; ++i) {
    std::vector<Point> points = Points({1, 2, 3, 4, 5, 6}, {});
    for (Point& point : points) {
      point.delay_s += noise_s(random);
    }
    bent += Judge(points).bent ? 1 : 0;
  }
  EXPECT_LT(bent, kArcs * 2 / 100);
}

}  // namespace
}  // namespace gatedyno
