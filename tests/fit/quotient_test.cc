#include "harness/fit/quotient.h"

#include <cmath>
#include <random>

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

// The root of what rounding leaves of terms that cancel.
constexpr double kRounding = 1e-8;

TEST(QuotientTest, FirstOrder) {
  struct Case {
    const char* what;
    Measured a;
    Measured b;
    double covariance;
    double q;
    double u;
  };
  constexpr Case kCases[] = {
      {"exact divisor", {3.0, 0.3}, {2.0, 0.0}, 0.0, 1.5, 0.15},
      {"exact dividend", {3.0, 0.0}, {2.0, 0.02}, 0.0, 1.5, 0.015},
      {"3-4-5", {1.0, 0.03}, {1.0, 0.04}, 0.0, 1.0, 0.05},
      {"itself", {2.0, 0.1}, {2.0, 0.1}, 0.01, 1.0, 0.0},
      {"below zero", {1.0, 0.03}, {-1.0, 0.04}, 0.0, -1.0, 0.05},
  };
  for (const Case& test : kCases) {
    SCOPED_TRACE(test.what);
    const Measured q = Quotient(test.a, test.b, test.covariance);
    EXPECT_DOUBLE_EQ(q.value, test.q);
    EXPECT_NEAR(*q.u, test.u, kRounding);
  }
}

TEST(QuotientTest, UnknownStaysUnknown) {
  EXPECT_FALSE(Quotient({3.0, std::nullopt}, {2.0, 0.1}).u.has_value());
  EXPECT_FALSE(Quotient({3.0, 0.1}, {2.0, std::nullopt}).u.has_value());
  EXPECT_DOUBLE_EQ(Quotient({3.0, std::nullopt}, {2.0, 0.1}).value, 1.5);
}

// Drawn, not derived: the formula against the spread of simulated quotients of
// correlated numbers.
TEST(QuotientTest, AgreesWithDraws) {
  constexpr int kDraws = 20000;
  std::mt19937_64 random(11);
  std::normal_distribution<double> normal;
  double sum = 0.0;
  double squares = 0.0;
  for (int i = 0; i < kDraws; ++i) {
    const double common = normal(random);
    const double a = 3.0 + 0.03 * common + 0.02 * normal(random);
    const double b = 2.0 + 0.01 * common + 0.01 * normal(random);
    sum += a / b;
    squares += a / b * a / b;
  }
  const double mean = sum / kDraws;
  const double spread = std::sqrt(squares / kDraws - mean * mean);
  const Measured q = Quotient({3.0, std::hypot(0.03, 0.02)},
                              {2.0, std::hypot(0.01, 0.01)},
                              0.03 * 0.01);
  // The spread of 20000 draws is itself known to 0.5 %; four times that.
  EXPECT_NEAR(*q.u / spread, 1.0, 0.02);
}

}  // namespace
}  // namespace gatedyno
