#include "harness/worker/waveform.h"

#include <string>

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

TEST(WaveformTest, FindsCrossingsByLinearInterpolation) {
  // Worked by hand from the five points of Bumpy().
  const CrossingRow rows[] = {
      {0.4, Edge::kRise, 1, 0.5e-9},
      {0.5, Edge::kFall, 1, 1.5e-9},
      {0.6, Edge::kRise, 2, 2.5e-9},
      {0.8, Edge::kRise, 1, 1e-9},  // At a point: counted once,
      {0.8, Edge::kRise, 2, 2.75e-9},
      {0.2, Edge::kFall, 1, 2e-9},  // and when it is the turning point.
      {1.0, Edge::kRise, 1, 3e-9},
  };
  constexpr double kRounding = 1e-22;
  for (const CrossingRow& row : rows) {
    const Result<double> time_s =
        CrossingTime(Bumpy(), {"y", row.level_v, row.edge, row.occurrence});
    ASSERT_TRUE(time_s.ok()) << time_s.error().message;
    EXPECT_NEAR(*time_s, row.time_s, kRounding) << row.level_v;
  }
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
