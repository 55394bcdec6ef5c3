#include "harness/fit/calibration.h"

#include <cmath>
#include <random>
#include <vector>

#include <gtest/gtest.h>

#include "harness/fit/line_fit.h"
#include "tests/fit/on_line.h"

namespace gatedyno {
namespace {

constexpr double kRounding = 1e-12;
Corner Typical() {
  return {"typical", "tt", 1.0, 25.0};
}

TEST(CalibrateTest, TakesTheMeanOfBothEdges) {
  const std::vector<double> fanouts = {1, 2, 4, 6};
  const Result<Calibration> calibration =
      Calibrate(Typical(),
                OnLine(fanouts, 1.6e-12, 2.4e-12),
                OnLine(fanouts, 1.4e-12, 2.1e-12));
  ASSERT_TRUE(calibration.ok());
  EXPECT_EQ(calibration->corner.name, "typical");
  EXPECT_NEAR(calibration->tau_rise_s.value / 1.6e-12, 1.0, kRounding);
  EXPECT_NEAR(calibration->tau_fall_s.value / 1.4e-12, 1.0, kRounding);
  EXPECT_NEAR(calibration->tau_s.value / 1.5e-12, 1.0, kRounding);
  EXPECT_NEAR(calibration->p_inv.value, 1.5, kRounding);
  EXPECT_NEAR(calibration->fo4_s / 8.25e-12, 1.0, kRounding);
}

TEST(CalibrateTest, Fo4IsTheMeasuredDelayWhereThereIsOne) {
  std::vector<Point> rise = OnLine({1, 2, 4, 6}, 1.6e-12, 2.4e-12);
  rise[2].delay_s += 0.2e-12;
  const std::vector<Point> fall = OnLine({1, 2, 3, 6}, 1.6e-12, 2.4e-12);
  const Result<Calibration> calibration = Calibrate(Typical(), rise, fall);
  ASSERT_TRUE(calibration.ok());
  // (8.8 + 0.2 measured, and 8.8 from the line) / 2.
  EXPECT_NEAR(calibration->fo4_s / 8.9e-12, 1.0, kRounding);
}

// FO4 / tau - (4 + p_inv) is the reference inverter's own departure from its
// line; none where the points lie on one.
TEST(CalibrateTest, Fo4IsFourAndPInvInTau) {
  const Result<Calibration> calibration =
      Calibrate(Typical(),
                OnLine({1, 2, 3, 5}, 1.9e-12, 2.0e-12),
                OnLine({1, 2, 3, 5}, 1.2e-12, 1.7e-12));
  ASSERT_TRUE(calibration.ok());
  EXPECT_NEAR(calibration->fo4_s / calibration->tau_s.value,
              4.0 + calibration->p_inv.value,
              kRounding);
}

// The stated u(tau) and u(p_inv), slope-intercept covariance included, against
// the spread of simulated calibrations.
TEST(CalibrateTest, UncertaintyIsTheSpreadOfRepeatedCalibrations) {
  constexpr int kCalibrations = 4000;
  std::mt19937_64 random(3);
  std::normal_distribution<double> noise_s(0.0, 0.02e-12);
  double tau_sum = 0;
  double tau_squares = 0;
  double p_sum = 0;
  double p_squares = 0;
  double tau_variance = 0;
  double p_variance = 0;
  for (int i = 0; i < kCalibrations; ++i) {
    std::vector<Point> rise = OnLine({1, 2, 3, 4, 5, 6}, 1.6e-12, 2.4e-12);
    std::vector<Point> fall = OnLine({1, 2, 3, 4, 5, 6}, 1.4e-12, 2.1e-12);
    for (size_t k = 0; k < rise.size(); ++k) {
      rise[k].delay_s += noise_s(random);
      fall[k].delay_s += noise_s(random);
    }
    const Calibration one = Calibrate(Typical(), rise, fall).value();
    const double tau_ps = one.tau_s.value * 1e12;
    tau_sum += tau_ps;
    tau_squares += tau_ps * tau_ps;
    p_sum += one.p_inv.value;
    p_squares += one.p_inv.value * one.p_inv.value;
    tau_variance += std::pow(one.tau_s.u.value() * 1e12, 2) / kCalibrations;
    p_variance += std::pow(one.p_inv.u.value(), 2) / kCalibrations;
  }
  const double tau_spread =
      tau_squares / kCalibrations - std::pow(tau_sum / kCalibrations, 2);
  const double p_spread =
      p_squares / kCalibrations - std::pow(p_sum / kCalibrations, 2);
  // A variance over 4000 draws is known to 2.2 %; three times that.  Without
  // the covariance u(p_inv)^2 would come out more than a third too small.
  constexpr double kScatter = 0.07;
  EXPECT_NEAR(tau_variance / tau_spread, 1.0, kScatter);
  EXPECT_NEAR(p_variance / p_spread, 1.0, kScatter);
}

TEST(CalibrateTest, TwoFanoutsGiveNoUncertainty) {
  const Result<Calibration> calibration =
      Calibrate(Typical(),
                OnLine({1, 4}, 1.6e-12, 2.4e-12),
                OnLine({1, 4}, 1.4e-12, 2.1e-12));
  ASSERT_TRUE(calibration.ok());
  EXPECT_NEAR(calibration->tau_s.value / 1.5e-12, 1.0, kRounding);
  EXPECT_FALSE(calibration->tau_s.u.has_value());
  EXPECT_FALSE(calibration->p_inv.u.has_value());
}

TEST(CalibrateTest, NamesTheCornerAndTheEdge) {
  const std::vector<Point> good = OnLine({1, 2, 4}, 1.6e-12, 2.4e-12);
  struct Case {
    std::vector<Point> rise;
    std::vector<Point> fall;
    const char* message;
  };
  const Case cases[] = {
      {{},
       good,
       "reference inverter at typical, rise: a line needs two distinct "
       "fanouts, got 0"},
      {good,
       OnLine({4}, 1.6e-12, 2.4e-12),
       "reference inverter at typical, fall: a line needs two distinct "
       "fanouts, got 1"},
      {good,
       OnLine({1, 2, 4}, -1e-12, 9e-12),
       "reference inverter at typical, fall: the delay does not grow with the "
       "fanout"},
  };
  for (const Case& test : cases) {
    const Result<Calibration> calibration =
        Calibrate(Typical(), test.rise, test.fall);
    ASSERT_FALSE(calibration.ok());
    EXPECT_EQ(calibration.error().message, test.message);
    EXPECT_EQ(calibration.error().kind, ErrorKind::kBadInput);
  }
}

}  // namespace
}  // namespace gatedyno
