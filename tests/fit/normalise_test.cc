#include "harness/fit/normalise.h"

#include <cmath>
#include <random>
#include <vector>

#include <gtest/gtest.h>

#include "harness/fit/calibration.h"
#include "harness/fit/line_fit.h"

namespace gatedyno {
namespace {

Corner Typical() {
  return {"typical", "tt", 1.0, 25.0};
}

Calibration Inverter() {
  Calibration calibration;
  calibration.corner = Typical();
  calibration.tau_rise_s = {1.6e-12, 0.016e-12};
  calibration.tau_fall_s = {1.4e-12, 0.014e-12};
  calibration.tau_s = {1.5e-12, std::hypot(0.016e-12, 0.014e-12) / 2.0};
  calibration.p_inv = {1.5, 0.03};
  return calibration;
}

TEST(NormaliseTest, EachEdgeByItsOwnTau) {
  struct Case {
    Edge edge;
    double g;
  };
  constexpr Case kCases[] = {{Edge::kRise, 1.125}, {Edge::kFall, 9.0 / 7.0}};
  const Line line{.slope_s = 1.8e-12,
                  .intercept_s = 3.0e-12,
                  .slope_u_s = 0.036e-12,
                  .intercept_u_s = 0.06e-12,
                  .covariance_s2 = -1e-27,
                  .points = 6};
  for (const Case& test : kCases) {
    const Normalised result = Normalise(line, test.edge, Inverter());
    EXPECT_NEAR(result.effort.value, test.g, 1e-12);
    EXPECT_NEAR(result.effort_mean.value, 1.2, 1e-12);
    EXPECT_NEAR(result.parasitic.value, 2.0, 1e-12);
    // 2 % of the slope and 1 % of tau, independent.
    EXPECT_NEAR(*result.effort.u / test.g, std::hypot(0.02, 0.01), 1e-12);
  }
}

TEST(NormaliseTest, WithoutUncertaintyThereIsNone) {
  const Line line{.slope_s = 1.8e-12, .intercept_s = 3.0e-12, .points = 2};
  const Normalised result = Normalise(line, Edge::kRise, Inverter());
  EXPECT_NEAR(result.effort.value, 1.125, 1e-12);
  EXPECT_FALSE(result.effort.u.has_value());
  EXPECT_FALSE(result.effort_mean.u.has_value());
  EXPECT_FALSE(result.parasitic.u.has_value());
}

std::vector<Point> Noisy(std::mt19937_64& random, double slope_s) {
  std::normal_distribution<double> noise_s(0.0, 0.02e-12);
  std::vector<Point> points;
  for (int h = 1; h <= 6; ++h) {
    points.push_back({.fanout = 1.0 * h,
                      .delay_s = slope_s * h + 2.2e-12 + noise_s(random)});
  }
  return points;
}

// Variances stated and seen over many repeated measurements.
struct Spread {
  void Add(const Measured& measured) {
    ++count;
    sum += measured.value;
    squares += measured.value * measured.value;
    stated += measured.u.value() * measured.u.value();
  }
  double StatedOverSeen() const {
    const double mean = sum / count;
    return stated / count / (squares / count - mean * mean);
  }

  int count = 0;
  double sum = 0.0;
  double squares = 0.0;
  double stated = 0.0;
};

// A variance over 4000 draws is known to 2.2 %; three times that.
constexpr int kDraws = 4000;
constexpr double kScatter = 0.07;

TEST(NormaliseTest, TheReferenceInverterIsOneByDefinition) {
  std::mt19937_64 random(7);
  Spread effort_mean;
  Spread parasitic;
  for (int i = 0; i < kDraws; ++i) {
    const std::vector<Point> rise = Noisy(random, 1.6e-12);
    const std::vector<Point> fall = Noisy(random, 1.4e-12);
    const Calibration calibration = Calibrate(Typical(), rise, fall).value();
    const Normalised result =
        Normalise(FitLine(rise).value(), Edge::kRise, calibration);
    ASSERT_EQ(result.effort.value, 1.0);
    ASSERT_EQ(result.effort.u, 0.0);
    effort_mean.Add(result.effort_mean);
    parasitic.Add(result.parasitic);
  }
  EXPECT_NEAR(effort_mean.StatedOverSeen(), 1.0, kScatter);
  EXPECT_NEAR(parasitic.StatedOverSeen(), 1.0, kScatter);
}

TEST(NormaliseTest, UncertaintyIsTheSpreadOfRepeatedMeasurements) {
  std::mt19937_64 random(8);
  Spread effort;
  Spread effort_mean;
  Spread parasitic;
  for (int i = 0; i < kDraws; ++i) {
    const Calibration calibration =
        Calibrate(Typical(), Noisy(random, 1.6e-12), Noisy(random, 1.4e-12))
            .value();
    const Normalised result = Normalise(
        FitLine(Noisy(random, 1.9e-12)).value(), Edge::kFall, calibration);
    effort.Add(result.effort);
    effort_mean.Add(result.effort_mean);
    parasitic.Add(result.parasitic);
  }
  EXPECT_NEAR(effort.StatedOverSeen(), 1.0, kScatter);
  EXPECT_NEAR(effort_mean.StatedOverSeen(), 1.0, kScatter);
  EXPECT_NEAR(parasitic.StatedOverSeen(), 1.0, kScatter);
}

}  // namespace
}  // namespace gatedyno
