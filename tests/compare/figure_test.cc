#include "harness/compare/figure.h"

#include <cmath>

#include <gtest/gtest.h>

#include "harness/compare/compare.h"

namespace gatedyno {
namespace {

// Student's t for 95.45 % at two and three degrees of freedom: JCGM 100:2008,
// table G.2, which has two decimals.
constexpr double kCoverageOfFourPoints = 4.53;
constexpr double kTableRounding = 0.005;

// Four points about d = 1.2 h + 2.7 with residuals of +r, -r, -r, +r tau, which
// a least-squares line leaves: s^2 = 2 r^2 and, at fanouts 1 to 4,
// u(slope)^2 = s^2 / 5, u(intercept)^2 = s^2 (1/4 + 2.5^2 / 5).
constexpr double kResidualTau = 0.01;

Comparison Measured4(double p_inv_u) {
  Calibration calibration;
  calibration.tau_rise_s = calibration.tau_fall_s =
      calibration.tau_s = {1e-12, 0.0};
  calibration.p_inv = {1.5, p_inv_u};
  MeasuredArc measured;
  measured.estimate.effort = 4.0 / 3.0;
  measured.estimate.parasitic_by_nodes = 2.0;
  constexpr double kSigns[] = {1.0, -1.0, -1.0, 1.0};
  for (int h = 1; h <= 4; ++h) {
    measured.points.push_back(
        {.fanout = 1.0 * h,
         .delay_s = (1.2 * h + 2.7 + kSigns[h - 1] * kResidualTau) * 1e-12});
  }
  return Compare(measured, calibration, {0.2, 0.3});
}

TEST(FigureTest, EffortIsRelativeToAHandNumberWithoutUncertainty) {
  const Figure figure = FigureOf(Measured4(0.1), Quantity::kEffort);
  EXPECT_EQ(figure.hand, 4.0 / 3.0);
  EXPECT_NEAR(figure.difference, -0.1, 1e-9);
  EXPECT_EQ(figure.tolerance, 0.2);
  ASSERT_TRUE(figure.expanded);
  const double u = kResidualTau * std::sqrt(2.0 / 5.0) / (4.0 / 3.0);
  EXPECT_NEAR(*figure.expanded / u, kCoverageOfFourPoints, kTableRounding);
}

// u(p/hand)^2 = (u(p)^2 + (p/hand)^2 u(hand)^2) / hand^2, u(hand) = n u(p_inv).
TEST(FigureTest, ParasiticCarriesTheUncertaintyOfPInv) {
  const Figure figure = FigureOf(Measured4(0.01), Quantity::kParasitic);
  EXPECT_EQ(figure.hand, 3.0);
  EXPECT_EQ(figure.tolerance, 0.3);
  ASSERT_TRUE(figure.expanded);
  const double u_p = kResidualTau * std::sqrt(2.0 * (0.25 + 6.25 / 5.0));
  const double u = std::hypot(u_p, 2.7 / 3.0 * 2.0 * 0.01) / 3.0;
  EXPECT_NEAR(*figure.expanded / u, kCoverageOfFourPoints, kTableRounding);
}

TEST(FigureTest, BeyondAndTooUncertain) {
  struct Case {
    double difference;
    std::optional<double> expanded;
    bool beyond;
    bool too_uncertain;
  };
  const Case cases[] = {
      {0.24, 0.0, false, false},
      {0.26, 0.0, true, false},
      {-0.26, 0.0, true, false},
      {0.3, 0.06, false, false},  // By less than its uncertainty.
      {0.1, 0.26, false, true},
      {0.6, 0.26, true, true},
      {9.0, std::nullopt, false, false},
  };
  for (const Case& c : cases) {
    const Figure figure{.measured = {},
                        .difference = c.difference,
                        .expanded = c.expanded,
                        .tolerance = 0.25};
    EXPECT_EQ(IsBeyond(figure), c.beyond) << c.difference;
    EXPECT_EQ(IsTooUncertain(figure), c.too_uncertain) << c.difference;
  }
}

}  // namespace
}  // namespace gatedyno
