#include "harness/worker/waveform.h"

#include <cmath>
#include <numbers>
#include <string>
#include <vector>

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

// Rises, dips and rises again; never above 1 V.
Waveform Bumpy() {
  return {"y", {0.0, 1e-9, 2e-9, 3e-9, 4e-9}, {0.0, 0.8, 0.2, 1.0, 1.0}};
}

struct CrossingRow {
  double level_v;
  Edge edge;
  int occurrence;
  double time_s;
};

// At the time points themselves, whatever lies between.
TEST(WaveformTest, CountsCrossings) {
  const CrossingRow rows[] = {
      {0.8, Edge::kRise, 1, 1e-9},  // Counted once.
      {1.0, Edge::kRise, 1, 3e-9},
  };
  constexpr double kRounding = 1e-22;
  for (const CrossingRow& row : rows) {
    const Result<double> time_s =
        CrossingTime(Bumpy(), {"y", row.level_v, row.edge, row.occurrence});
    ASSERT_TRUE(time_s.ok()) << time_s.error().message;
    EXPECT_NEAR(*time_s, row.time_s, kRounding) << row.level_v;
  }
  const Result<double> second =
      CrossingTime(Bumpy(), {"y", 0.8, Edge::kRise, 2});
  ASSERT_TRUE(second.ok());
  EXPECT_GT(*second, 2e-9);
  EXPECT_LT(*second, 3e-9);
}

// Unequal steps, as the simulator takes them.
Waveform Sampled(double (*voltage)(double), const std::vector<double>& at_s) {
  Waveform waveform{"y", at_s, {}};
  for (const double t : at_s) {
    waveform.voltage_v.push_back(voltage(t));
  }
  return waveform;
}

// A parabola is its own Hermite cubic, so the crossing is exact: v = t^2 is at
// 0.5 at the root of 0.5, and a straight line between 0.6 and 0.9 says 0.693.
TEST(WaveformTest, FollowsAParabolaExactly) {
  const Waveform waveform =
      Sampled([](double t) { return t * t; }, {0.0, 0.2, 0.6, 0.9, 1.0});
  const Result<double> time_s =
      CrossingTime(waveform, {"y", 0.5, Edge::kRise, 1});
  ASSERT_TRUE(time_s.ok());
  constexpr double kRounding = 1e-12;
  EXPECT_NEAR(*time_s, std::sqrt(0.5), kRounding);
}

// v = exp(-t) is at 0.5 at ln 2.  With steps of 0.1 a straight line errs by
// h^2/8 of the curvature, 1e-3; the cubic's error is of third order.
TEST(WaveformTest, ErrsFarLessThanAStraightLine) {
  std::vector<double> at_s;
  for (int i = 0; i <= 20; ++i) {
    at_s.push_back(0.05 + 0.1 * i);
  }
  const Waveform waveform =
      Sampled([](double t) { return std::exp(-t); }, at_s);
  const Result<double> time_s =
      CrossingTime(waveform, {"y", 0.5, Edge::kFall, 1});
  ASSERT_TRUE(time_s.ok());
  constexpr double kThirdOrder = 3e-5;
  EXPECT_NEAR(*time_s, std::numbers::ln2, kThirdOrder);
}

// Between two points there is nothing but the line.
TEST(WaveformTest, TwoPointsAreALine) {
  const Waveform waveform{"y", {0.0, 1e-9}, {0.0, 1.0}};
  const Result<double> time_s =
      CrossingTime(waveform, {"y", 0.25, Edge::kRise, 1});
  ASSERT_TRUE(time_s.ok());
  EXPECT_NEAR(*time_s, 0.25e-9, 1e-22);
}

struct MissingRow {
  double level_v;
  Edge edge;
  int occurrence;
  std::string message;
};

TEST(WaveformTest, SaysWhatAMissingCrossingDidInstead) {
  const MissingRow rows[] = {
      {1.5,
       Edge::kRise,
       1,
       "v(y) never rises through 1.5 V within 4e-09 s (it stays between 0.00 "
       "and 1.00 V)"},
      {0.1,
       Edge::kFall,
       1,
       "v(y) never falls through 0.1 V within 4e-09 s (it stays between 0.00 "
       "and 1.00 V)"},
      {0.5,
       Edge::kRise,
       3,
       "v(y) rises through 0.5 V only 2 of 3 times within 4e-09 s"},
      {0.0,
       Edge::kRise,
       1,  // It starts there.
       "v(y) never rises through 0 V within 4e-09 s (it stays between 0.00 "
       "and 1.00 V)"},
  };
  for (const MissingRow& row : rows) {
    const Result<double> time_s =
        CrossingTime(Bumpy(), {"y", row.level_v, row.edge, row.occurrence});
    ASSERT_FALSE(time_s.ok());
    EXPECT_EQ(time_s.error().message, row.message);
  }
}

TEST(WaveformTest, AnUndershootOfNothingIsPrintedAsZero) {
  const Waveform flat = {"d_y", {0.0, 2.1e-9}, {-1e-9, 0.98}};
  const Result<double> time_s =
      CrossingTime(flat, {"d_y", 0.99, Edge::kRise, 1});
  ASSERT_FALSE(time_s.ok());
  EXPECT_EQ(time_s.error().message,
            "v(d_y) never rises through 0.99 V within 2.1e-09 s (it stays "
            "between 0.00 and 0.98 V)");
}

TEST(WaveformTest, OnePointHasNoCrossing) {
  const Waveform point = {"y", {0.0}, {0.5}};
  EXPECT_FALSE(CrossingTime(point, {"y", 0.5, Edge::kRise, 1}).ok());
}

struct SwingRow {
  double low_v;
  double high_v;
  bool fine;
};

TEST(WaveformTest, ChecksBothEndsOfASwing) {
  const SwingRow rows[] = {
      {0.1, 0.9, true},
      {0.0, 0.9, false},  // Must go below, not to.
      {0.1, 1.0, false},
      {-0.1, 1.1, false},
  };
  for (const SwingRow& row : rows) {
    EXPECT_EQ(CheckSwing(Bumpy(), {"y", row.low_v, row.high_v}).ok(), row.fine)
        << row.low_v << " " << row.high_v;
  }
}

TEST(WaveformTest, SaysWhatASwingLacks) {
  const Waveform floating = {"y", {0.0, 1e-9}, {0.41, 0.52}};
  const Status swing = CheckSwing(floating, {"y", 0.1, 0.9});
  ASSERT_FALSE(swing.ok());
  EXPECT_EQ(swing.error().message,
            "v(y) does not swing from below 0.1 V to above 0.9 V (it stays "
            "between 0.41 and 0.52 V): look for a floating net or supply, or a "
            "contention");
}

}  // namespace
}  // namespace gatedyno
