#include "harness/page/hand_line.h"

#include <utility>

#include <gtest/gtest.h>

#include "tests/report/sample_run.h"

namespace gatedyno {
namespace {

// Sums of a handful of doubles.
constexpr double kRounding = 1e-12;

TEST(HandLineTest, TheHandLineHasTheTauOfItsEdge) {
  const Calibration calibration = SampleCalibration();
  for (const auto& [edge, tau_s] :
       {std::pair{Edge::kRise, 2.181e-12}, std::pair{Edge::kFall, 2.278e-12}}) {
    const HandLine line = HandLineOf(SampleRow("inv", "a", edge), calibration);
    EXPECT_NEAR(line.slope_s / (4.0 / 3.0 * tau_s), 1.0, kRounding);
    EXPECT_NEAR(line.intercept_s / (2.51 * 2.2295e-12), 1.0, kRounding);
  }
}

TEST(HandLineTest, FindsTheCalibrationOfTheCorner) {
  const RunResult result = SampleRun();
  EXPECT_EQ(CalibrationOf(result.comparisons.front(), result),
            &result.calibrations.front());
  EXPECT_EQ(CalibrationOf(result.comparisons.back(), result), nullptr);
}

}  // namespace
}  // namespace gatedyno
