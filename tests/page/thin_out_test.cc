#include "harness/page/thin_out.h"

#include <algorithm>
#include <cmath>
#include <string>
#include <vector>

#include <gmock/gmock.h>
#include <gtest/gtest.h>

namespace gatedyno {
namespace {

using ::testing::ElementsAre;

constexpr double kEnd_s = 100e-12;

// An edge with tails, as of a gate, in steps of 0.1 ps.
Waveform GateEdge() {
  Waveform edge = {"y", {}, {}};
  for (int i = 0; i <= 1000; ++i) {
    edge.time_s.push_back(i * 0.1e-12);
    edge.voltage_v.push_back(0.5 + 0.5 * std::tanh((i - 500) / 60.0));
  }
  return edge;
}

double VoltageAt(const Waveform& waveform, double time_s) {
  const auto after = std::lower_bound(
      waveform.time_s.begin() + 1, waveform.time_s.end() - 1, time_s);
  const auto i = static_cast<size_t>(after - waveform.time_s.begin());
  const double share = (time_s - waveform.time_s[i - 1]) /
                       (waveform.time_s[i] - waveform.time_s[i - 1]);
  return std::lerp(waveform.voltage_v[i - 1], waveform.voltage_v[i], share);
}

TEST(ThinOutTest, DepartsNowhereByMoreThanAskedFor) {
  const Waveform edge = GateEdge();
  size_t before = edge.time_s.size();
  for (const double tolerance_v : {1e-4, kUnseenV, 1e-2}) {
    const Waveform thin = ThinOut(edge, 0, kEnd_s, tolerance_v);
    EXPECT_EQ(thin.net, "y");
    EXPECT_LT(thin.time_s.size(), before);
    before = thin.time_s.size();
    for (size_t i = 0; i < edge.time_s.size(); ++i) {
      constexpr double kRounding_v = 1e-12;
      EXPECT_NEAR(VoltageAt(thin, edge.time_s[i]),
                  edge.voltage_v[i],
                  tolerance_v + kRounding_v)
          << i;
    }
  }
}

// An arc of a picture is then 2 KB.
TEST(ThinOutTest, LeavesAFewDozenPointsOfAnEdge) {
  const size_t points = ThinOut(GateEdge(), 0, kEnd_s).time_s.size();
  EXPECT_GT(points, 10U);
  EXPECT_LT(points, 50U);
}

TEST(ThinOutTest, AStraightLineIsItsEnds) {
  const Waveform line = {"y", {0, 1, 2, 3, 4}, {0, 0.25, 0.5, 0.75, 1}};
  EXPECT_THAT(ThinOut(line, 0, 4).time_s, ElementsAre(0, 4));
  const Waveform step = {"y", {0, 1, 2, 3, 4}, {0, 0, 1, 1, 1}};
  EXPECT_THAT(ThinOut(step, 0, 4).time_s, ElementsAre(0, 1, 2, 4));
}

TEST(ThinOutTest, TakesOneMorePointOnEitherSide) {
  const Waveform zigzag = {"y", {0, 1, 2, 3, 4, 5}, {0, 1, 0, 1, 0, 1}};
  struct Case {
    double from_s;
    double to_s;
    std::vector<double> times_s;
  };
  const Case cases[] = {{1.5, 2.5, {1, 2, 3}},
                        {2, 3, {2, 3}},
                        {-1, 0.5, {0, 1}},
                        {4.5, 9, {4, 5}},
                        {-2, -1, {0}},
                        {7, 8, {5}}};
  for (const Case& test : cases) {
    EXPECT_EQ(ThinOut(zigzag, test.from_s, test.to_s).time_s, test.times_s)
        << test.from_s;
  }
  EXPECT_THAT(ThinOut({"y", {3}, {0.5}}, 0, 9).voltage_v, ElementsAre(0.5));
}

}  // namespace
}  // namespace gatedyno
