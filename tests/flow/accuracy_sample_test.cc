#include "harness/flow/accuracy_sample.h"

#include <cmath>
#include <string>

#include <fmt/format.h>
#include <gtest/gtest.h>

#include "harness/base/fingerprint.h"
#include "harness/sim/table_runner.h"

namespace gatedyno {
namespace {

constexpr double kPromise = 0.002;

Outcome Delays(double rise_s, double fall_s) {
  return MeasuredOutcome({{"delay_rise", rise_s}, {"delay_fall", fall_s}});
}

TEST(AccuracySampleTest, WantsAboutOneInSoMany) {
  const AccuracySample sample(kPromise);
  constexpr int kJobs = 5000;
  int wanted = 0;
  for (int i = 0; i < kJobs; ++i) {
    wanted += sample.Wants(Fingerprint(fmt::format("job {}", i))) ? 1 : 0;
  }
  // Four standard deviations of a binomial count.
  const double expected = kJobs / AccuracySample::kOneIn;
  EXPECT_NEAR(wanted, expected, 4 * std::sqrt(expected));
}

TEST(AccuracySampleTest, ComparesBothEdgesOfEachJobOnce) {
  AccuracySample sample(kPromise);
  const Outcome tighter = Delays(10e-12, 20e-12);
  sample.Add("1", "one", Delays(10.03e-12, 20e-12), tighter);
  sample.Add("2", "two", Delays(10e-12, 19.92e-12), tighter);
  sample.Add("2", "two", Delays(10e-12, 19.92e-12), tighter);
  const AccuracyCheck check = sample.Check();
  // Changes of 0.3 %, 0, 0 and -0.4 %, by hand.
  constexpr double kRounding = 1e-12;
  EXPECT_EQ(check.delays, 4);
  EXPECT_NEAR(check.rms, std::sqrt((9e-6 + 16e-6) / 4), kRounding);
  EXPECT_NEAR(check.largest, 0.004, kRounding);
  EXPECT_EQ(check.worst, "two");
  EXPECT_FALSE(check.met());
  // Student's t for four degrees of freedom, over two.
  EXPECT_NEAR(sample.DelayUncertainty(), check.rms * 2.87 / 2, 1e-5);
}

TEST(AccuracySampleTest, WithoutAnySampleThePromiseIsAllThatIsKnown) {
  const AccuracySample sample(kPromise);
  EXPECT_FALSE(sample.Check().met());
  EXPECT_DOUBLE_EQ(sample.DelayUncertainty(), kPromise / std::sqrt(3.0));
}

}  // namespace
}  // namespace gatedyno
