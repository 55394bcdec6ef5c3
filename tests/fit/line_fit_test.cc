#include "harness/fit/line_fit.h"

#include <cmath>
#include <limits>
#include <numeric>
#include <random>
#include <string>
#include <vector>

#include <gsl/gsl_fit.h>
#include <gtest/gtest.h>

#include "harness/fit/coverage.h"
#include "tests/fit/on_line.h"

namespace gatedyno {
namespace {

// Two ways of computing the same sums differ by rounding only.
constexpr double kRounding = 1e-12;

// NIST Statistical Reference Datasets, linear regression, "Norris" (x, y).
// Typed from memory; that the certified values come out proves the copy.
constexpr Point kNorris[] = {
    {.fanout = 0.2, .delay_s = 0.1},     {.fanout = 337.4, .delay_s = 338.8},
    {.fanout = 118.2, .delay_s = 118.1}, {.fanout = 884.6, .delay_s = 888.0},
    {.fanout = 10.1, .delay_s = 9.2},    {.fanout = 226.5, .delay_s = 228.1},
    {.fanout = 666.3, .delay_s = 668.5}, {.fanout = 996.3, .delay_s = 998.5},
    {.fanout = 448.6, .delay_s = 449.1}, {.fanout = 777.0, .delay_s = 778.9},
    {.fanout = 558.2, .delay_s = 559.2}, {.fanout = 0.4, .delay_s = 0.3},
    {.fanout = 0.6, .delay_s = 0.1},     {.fanout = 775.5, .delay_s = 778.1},
    {.fanout = 666.9, .delay_s = 668.8}, {.fanout = 338.0, .delay_s = 339.3},
    {.fanout = 447.5, .delay_s = 448.9}, {.fanout = 11.6, .delay_s = 10.8},
    {.fanout = 556.0, .delay_s = 557.7}, {.fanout = 228.1, .delay_s = 228.3},
    {.fanout = 995.8, .delay_s = 998.0}, {.fanout = 887.6, .delay_s = 888.8},
    {.fanout = 120.2, .delay_s = 119.6}, {.fanout = 0.3, .delay_s = 0.3},
    {.fanout = 0.3, .delay_s = 0.6},     {.fanout = 556.8, .delay_s = 557.6},
    {.fanout = 339.1, .delay_s = 339.3}, {.fanout = 887.2, .delay_s = 888.0},
    {.fanout = 999.0, .delay_s = 998.5}, {.fanout = 779.0, .delay_s = 778.9},
    {.fanout = 11.1, .delay_s = 10.2},   {.fanout = 118.3, .delay_s = 117.6},
    {.fanout = 229.2, .delay_s = 228.9}, {.fanout = 669.1, .delay_s = 668.4},
    {.fanout = 448.9, .delay_s = 449.2}, {.fanout = 0.5, .delay_s = 0.2},
};

TEST(FitLineTest, ReproducesTheCertifiedValuesOfNorris) {
  constexpr double kCertifiedDigits = 1e-11;  // Relative; 15 are certified.
  const Result<Line> line = FitLine(kNorris);
  ASSERT_TRUE(line.ok());
  EXPECT_EQ(line->points, 36);
  EXPECT_NEAR(line->intercept_s / -0.262323073774029, 1.0, kCertifiedDigits);
  EXPECT_NEAR(line->slope_s / 1.00211681802045, 1.0, kCertifiedDigits);
  EXPECT_NEAR(*line->intercept_u_s / 0.232818234301152, 1.0, kCertifiedDigits);
  EXPECT_NEAR(*line->slope_u_s / 0.429796848199937e-3, 1.0, kCertifiedDigits);
}

// The GNU Scientific Library's gsl_fit_linear on points of our size.
TEST(FitLineTest, AgreesWithGslOnRandomPicoseconds) {
  std::mt19937_64 random(20231);
  std::uniform_real_distribution<double> fanout(0.5, 12.0);
  std::normal_distribution<double> noise_s(0.0, 0.05e-12);
  for (const size_t count : {3U, 4U, 6U, 10U, 100U}) {
    SCOPED_TRACE(count);
    std::vector<double> x;
    std::vector<double> y;
    std::vector<Point> points;
    for (size_t i = 0; i < count; ++i) {
      x.push_back(fanout(random));
      y.push_back(1.7e-12 * x.back() + 3.1e-12 + noise_s(random));
      points.push_back({.fanout = x.back(), .delay_s = y.back()});
    }
    double c0 = 0;
    double c1 = 0;
    double cov00 = 0;
    double cov01 = 0;
    double cov11 = 0;
    double sum_of_squares = 0;
    gsl_fit_linear(x.data(),
                   1,
                   y.data(),
                   1,
                   count,
                   &c0,
                   &c1,
                   &cov00,
                   &cov01,
                   &cov11,
                   &sum_of_squares);
    const Result<Line> line = FitLine(points);
    ASSERT_TRUE(line.ok());
    EXPECT_NEAR(line->intercept_s / c0, 1.0, kRounding);
    EXPECT_NEAR(line->slope_s / c1, 1.0, kRounding);
    // Sums of squared residuals lose half the digits of the delays.
    constexpr double kResidualRounding = 1e-9;
    EXPECT_NEAR(
        *line->intercept_u_s / std::sqrt(cov00), 1.0, kResidualRounding);
    EXPECT_NEAR(*line->slope_u_s / std::sqrt(cov11), 1.0, kResidualRounding);
    EXPECT_NEAR(*line->covariance_s2 / cov01, 1.0, kResidualRounding);
  }
}

TEST(FitLineTest, RecoversTheLineThePointsWereBuiltFrom) {
  struct Case {
    const char* what;
    double slope_s;
    double intercept_s;
    double first_fanout;
  };
  constexpr Case kCases[] = {
      {"45 nm", 1.485e-12, 2.3e-12, 1.0},
      {"femtoseconds", 3.2e-15, 1.1e-15, 1.0},
      {"delay below zero at no load", 2.0e-12, -0.5e-12, 1.0},
      {"far larger than its spread", 1.0e-15, 1.0e-9, 1.0},
      {"fanouts far from zero", 1.485e-12, 2.3e-12, 1000.0},
  };
  for (const Case& test : kCases) {
    SCOPED_TRACE(test.what);
    std::vector<double> fanouts(6);
    std::iota(fanouts.begin(), fanouts.end(), test.first_fanout);
    const Result<Line> line =
        FitLine(OnLine(fanouts, test.slope_s, test.intercept_s));
    ASSERT_TRUE(line.ok());
    // Rounding of the largest delay, seen over five units of fanout and carried
    // back to fanout zero.
    const double largest_s =
        std::abs(test.intercept_s) + test.slope_s * fanouts.back();
    const double rounding_s =
        4.0 * std::numeric_limits<double>::epsilon() * largest_s;
    EXPECT_NEAR(line->slope_s, test.slope_s, rounding_s);
    EXPECT_NEAR(
        line->intercept_s, test.intercept_s, rounding_s * fanouts.back());
    EXPECT_LE(line->largest_residual_s, rounding_s);
    EXPECT_LE(*line->slope_u_s, rounding_s);
  }
}

TEST(FitLineTest, LargestResidualIsTheFurthestPoint) {
  // Residuals 1, -2, 1 about 0: the line of (0,1) (1,-2) (2,1) is flat.
  const std::vector<Point> points = {{.fanout = 0, .delay_s = 1},
                                     {.fanout = 1, .delay_s = -2},
                                     {.fanout = 2, .delay_s = 1}};
  const Result<Line> line = FitLine(points);
  ASSERT_TRUE(line.ok());
  EXPECT_NEAR(line->largest_residual_s, 2.0, kRounding);
  // s^2 = 6 / 1, Sxx = 2, m = 1.
  EXPECT_NEAR(*line->slope_u_s, std::sqrt(3.0), kRounding);
  EXPECT_NEAR(
      *line->intercept_u_s, std::sqrt(6.0 * (1.0 / 3 + 1.0 / 2)), kRounding);
  EXPECT_NEAR(*line->covariance_s2, -3.0, kRounding);
}

TEST(FitLineTest, TwoPointsGiveALineWithoutUncertainty) {
  const Result<Line> line = FitLine(OnLine({1, 4}, 2e-12, 3e-12));
  ASSERT_TRUE(line.ok());
  EXPECT_NEAR(line->slope_s / 2e-12, 1.0, kRounding);
  EXPECT_FALSE(line->slope_u_s.has_value());
  EXPECT_FALSE(line->intercept_u_s.has_value());
  EXPECT_FALSE(line->covariance_s2.has_value());
  EXPECT_FALSE(DelayAt(*line, 4).u.has_value());
}

TEST(FitLineTest, RefusesWhatIsNotALine) {
  constexpr double kNan = std::numeric_limits<double>::quiet_NaN();
  constexpr double kInfinity = std::numeric_limits<double>::infinity();
  struct Case {
    std::vector<Point> points;
    std::string message;
  };
  const Case cases[] = {
      {{}, "a line needs two distinct fanouts, got 0"},
      {{{.fanout = 4, .delay_s = 1e-12}},
       "a line needs two distinct fanouts, got 1"},
      {{{.fanout = 4, .delay_s = 1e-12}, {.fanout = 4, .delay_s = 2e-12}},
       "a line needs two distinct fanouts, got 1"},
      {{{.fanout = 1, .delay_s = 1e-12}, {.fanout = 4, .delay_s = kNan}},
       "the delay at fanout 4 is not a finite number"},
      {{{.fanout = 2.5, .delay_s = kInfinity}, {.fanout = 4, .delay_s = 1e-12}},
       "the delay at fanout 2.5 is not a finite number"},
      {{{.fanout = kNan, .delay_s = 1e-12}, {.fanout = 4, .delay_s = 1e-12}},
       "a fanout is not a finite number"},
  };
  for (const Case& test : cases) {
    const Result<Line> line = FitLine(test.points);
    ASSERT_FALSE(line.ok());
    EXPECT_EQ(line.error().message, test.message);
    EXPECT_EQ(line.error().kind, ErrorKind::kBadInput);
  }
}

TEST(FitLineTest, DelayAtCarriesTheCovariance) {
  const Result<Line> line = FitLine(kNorris);
  ASSERT_TRUE(line.ok());
  // At the mean fanout slope and intercept no longer matter: u = s/sqrt(n).
  // Residual standard deviation certified by NIST.
  double mean = 0.0;
  for (const Point& point : kNorris) {
    mean += point.fanout / 36.0;
  }
  EXPECT_NEAR(*DelayAt(*line, mean).u, 0.884796396144373 / 6.0, 1e-10);
  EXPECT_NEAR(*DelayAt(*line, 0.0).u, *line->intercept_u_s, kRounding);
}

// Noisy lines with a known truth: how often do U = k u and 2 u hold it?
struct Coverage {
  double expanded = 0.0;
  double two_sigma = 0.0;
};

Coverage SlopeCoverage(int points, int lines) {
  constexpr double kSlopeS = 1.5e-12;
  std::mt19937_64 random(45);
  std::normal_distribution<double> noise_s(0.0, 0.03e-12);
  const double factor = CoverageFactor(points - 2);
  int expanded = 0;
  int two_sigma = 0;
  for (int i = 0; i < lines; ++i) {
    std::vector<Point> noisy;
    for (int h = 1; h <= points; ++h) {
      noisy.push_back({.fanout = 1.0 * h,
                       .delay_s = kSlopeS * h + 2e-12 + noise_s(random)});
    }
    const Result<Line> line = FitLine(noisy);
    const double error_s = std::abs(line.value().slope_s - kSlopeS);
    expanded += error_s <= factor * line->slope_u_s.value() ? 1 : 0;
    two_sigma += error_s <= 2.0 * line->slope_u_s.value() ? 1 : 0;
  }
  return {1.0 * expanded / lines, 1.0 * two_sigma / lines};
}

TEST(FitLineTest, UncertaintyIsHonest) {
  constexpr int kLines = 2000;
  // The scatter of a frequency near 0.95 over 2000 draws is 0.005; three times
  // that.
  constexpr double kScatter = 0.015;
  struct Case {
    int points;
    double two_sigma;  // P(|t| < 2) for points - 2 degrees of freedom.
  };
  // Student's t: 2/pi atan(2) for one degree, 0.8165 for two, and so on; the
  // reason why two sigma is not used for few points.
  constexpr Case kCases[] = {{3, 0.705}, {4, 0.816}, {6, 0.884}, {12, 0.927}};
  for (const Case& test : kCases) {
    SCOPED_TRACE(test.points);
    const Coverage coverage = SlopeCoverage(test.points, kLines);
    EXPECT_NEAR(coverage.expanded, 0.9545, kScatter);
    EXPECT_NEAR(coverage.two_sigma, test.two_sigma, 2.0 * kScatter);
  }
}

}  // namespace
}  // namespace gatedyno
