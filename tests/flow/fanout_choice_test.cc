#include "harness/flow/fanout_choice.h"

#include <string>
#include <vector>

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

constexpr double kTauS = 2e-12;

struct World {
  std::string what;
  double bend_tau;  // Coefficient of h^2.
  double kick_tau;  // On the point at fanout 4.
  double delay_u_relative;
  std::vector<double> measured_at;
  bool close_call = false;
};

std::vector<Point> PointsAt(const std::vector<double>& fanouts,
                            const World& world) {
  std::vector<Point> points;
  for (const double h : fanouts) {
    const double tau = 1.2 + 1.3 * h + world.bend_tau * h * h +
                       (h == 4.0 ? world.kick_tau : 0.0);
    points.push_back({.fanout = h, .delay_s = kTauS * tau});
  }
  return points;
}

// Follows the rule until it has enough.
std::vector<double> Follow(const FanoutRule& rule, const World& world) {
  std::vector<double> fanouts = FirstFanouts(rule);
  while (true) {
    const std::vector<double> more =
        MoreFanouts(rule, PointsAt(fanouts, world), kTauS, world.close_call);
    if (more.empty()) {
      return fanouts;
    }
    fanouts.insert(fanouts.end(), more.begin(), more.end());
  }
}

// Limits by hand for slope 1.3 tau: bent from 0.05 * 1.3 = 0.065 tau, which is
// c (5/2)^2 / 2 for c h^2, so c = 0.0208.
TEST(FanoutChoiceTest, AsFewAsProveTheLineStraight) {
  const World worlds[] = {
      {"straight", 0.0, 0.0, 0.001, {1, 4, 6}},
      {"a little bent", 0.003, 0.0, 0.001, {1, 4, 6}},
      {"the slope is uncertain", 0.011, 0.0, 0.001, {1, 4, 6, 2, 3}},
      {"bent", 0.03, 0.0, 0.001, {1, 4, 6, 2, 3, 1.5, 5}},
      {"one point off", 0.0, 0.2, 0.001, {1, 4, 6, 2, 3, 1.5, 5}},
      {"delays too inexact to tell", 0.0, 0.0, 0.05, {1, 4, 6, 2, 3, 1.5, 5}},
      {"the verdict hangs on the uncertainty",
       0.0,
       0.0,
       0.001,
       {1, 4, 6, 2, 3, 1.5, 5},
       true},
      {"and not known to be any better", 0.0, 0.0, 0.0, {1, 4, 6, 2, 3}},
  };
  for (const World& world : worlds) {
    const FanoutRule rule{.fixed = {},
                          .delay_u_relative = world.delay_u_relative};
    EXPECT_EQ(Follow(rule, world), world.measured_at) << world.what;
  }
}

TEST(FanoutChoiceTest, APlanThatNamesThemGetsNoOthers) {
  const FanoutRule rule{.fixed = {2, 8}, .delay_u_relative = 0.001};
  EXPECT_EQ(Follow(rule, {"bent", 0.5, 0.0, 0.001, {}}), rule.fixed);
  EXPECT_EQ(AllFanouts(rule), rule.fixed);
}

TEST(FanoutChoiceTest, AllAreTheOnesAnArcMayBeMeasuredAt) {
  EXPECT_EQ(AllFanouts({}), (std::vector<double>{1, 1.5, 2, 3, 4, 5, 6}));
}

}  // namespace
}  // namespace gatedyno
