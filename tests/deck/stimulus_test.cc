#include "harness/deck/stimulus.h"

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

constexpr double kRounding = 1e-12;  // Relative.

struct Case {
  double time_unit_s;
  double chain_tau;
  double ramp_s;  // 1.5 time units, rounded up to two digits.
  double half_s;  // 5 windows of chain and ramp, rounded up likewise.
};
constexpr Case kCases[] = {
    {2e-12, 38.5, 3e-12, 400e-12},
    {2.2e-12, 20.0, 3.3e-12, 240e-12},
    {2.21e-12, 20.0, 3.4e-12, 240e-12},
    {2.3e-12, 31.6, 3.5e-12, 390e-12},
    {12.4e-12, 20.0, 19e-12, 1400e-12},
    {1e-12, 198.5, 1.5e-12, 1000e-12},
};

TEST(StimulusTest, RoundsUpToTwoDigits) {
  for (const Case& tried : kCases) {
    const Stimulus stimulus = StimulusFor(tried.chain_tau, tried.time_unit_s);
    EXPECT_NEAR(stimulus.ramp_s, tried.ramp_s, kRounding * tried.ramp_s)
        << tried.time_unit_s;
    EXPECT_EQ(stimulus.start_s, stimulus.ramp_s);
    EXPECT_NEAR(stimulus.half_s, tried.half_s, kRounding * tried.half_s)
        << tried.time_unit_s;
    EXPECT_NEAR(stimulus.stop_s(),
                tried.ramp_s + 2 * tried.half_s,
                kRounding * stimulus.stop_s());
  }
}

// The same deck, and so the same job, for a tau measured a little differently.
TEST(StimulusTest, TinyChangesOfTauLeaveTheDeckAsItIs) {
  const Stimulus one = StimulusFor(20.0, 2.23e-12);
  const Stimulus other = StimulusFor(20.0, 2.23001e-12);
  EXPECT_EQ(SourceLine(one, 1.0), SourceLine(other, 1.0));
  EXPECT_EQ(TransientLine(one), TransientLine(other));
}

TEST(StimulusTest, WritesTheSourceAndTheRun) {
  const Stimulus stimulus{.start_s = 10e-12, .ramp_s = 10e-12, .half_s = 4e-10};
  EXPECT_EQ(SourceLine(stimulus, 0.9),
            "vsrc src 0 pulse(0 0.9 1e-11 1e-11 1e-11 3.9e-10 1.6e-09)\n");
  EXPECT_EQ(TransientLine(stimulus), ".tran 5e-11 8.1e-10 0 5e-11\n");
}

}  // namespace
}  // namespace gatedyno
