#include "harness/report/figure_view.h"

#include <cmath>

#include <gtest/gtest.h>

#include "tests/report/sample_run.h"

namespace gatedyno {
namespace {

// Sums of a handful of doubles.
constexpr double kRounding = 1e-12;
// Student's t for 95.45 % at three degrees of freedom: JCGM 100:2008, table
// G.2, which has two decimals.
constexpr double kCoverageOfFivePoints = 3.31;
constexpr double kTableRounding = 0.005;

TEST(FigureViewTest, EffortIsRelativeToAHandNumberWithoutUncertainty) {
  const FigureView view = EffortView(SampleRow("inv", "a", Edge::kRise));
  EXPECT_EQ(view.hand, 4.0 / 3.0);
  EXPECT_EQ(view.measured.value, 1.296);
  EXPECT_EQ(view.difference, -0.028);
  EXPECT_EQ(view.tolerance, Tolerance().effort);
  ASSERT_TRUE(view.difference_expanded);
  EXPECT_NEAR(*view.difference_expanded / (0.004 / (4.0 / 3.0)),
              kCoverageOfFivePoints,
              kTableRounding);
}

// u(p/hand)^2 = (u(p)^2 + (p/hand)^2 u(hand)^2) / hand^2, u(hand) = n u(p_inv).
TEST(FigureViewTest, ParasiticCarriesTheUncertaintyOfPInv) {
  const Comparison row = SampleRow("inv", "a", Edge::kRise);
  const Calibration calibration = SampleCalibration();
  const FigureView view = ParasiticView(row, &calibration);
  ASSERT_TRUE(view.difference_expanded);
  const double ratio = 1.71 / 2.51;
  const double u = std::hypot(0.02, ratio * 2.0 * 0.002) / 2.51;
  EXPECT_NEAR(
      *view.difference_expanded / u, kCoverageOfFivePoints, kTableRounding);
  EXPECT_FALSE(ParasiticView(row, nullptr).difference_expanded);
}

TEST(FigureViewTest, TwoPointsSayNothingOfTheUncertainty) {
  Comparison row = SampleRow("inv", "a", Edge::kRise);
  row.line->points = 2;
  EXPECT_FALSE(EffortView(row).difference_expanded);
}

TEST(FigureViewTest, TheHandLineHasTheTauOfItsEdge) {
  const Calibration calibration = SampleCalibration();
  for (const auto& [edge, tau_s] :
       {std::pair{Edge::kRise, 2.181e-12}, std::pair{Edge::kFall, 2.278e-12}}) {
    const HandLine line = HandLineOf(SampleRow("inv", "a", edge), calibration);
    EXPECT_NEAR(line.slope_s / (4.0 / 3.0 * tau_s), 1.0, kRounding);
    EXPECT_NEAR(line.intercept_s / (2.51 * 2.2295e-12), 1.0, kRounding);
  }
}

TEST(FigureViewTest, FindsTheCalibrationOfTheCorner) {
  const RunResult result = SampleRun();
  EXPECT_EQ(CalibrationOf(result.comparisons.front(), result),
            &result.calibrations.front());
  EXPECT_EQ(CalibrationOf(result.comparisons.back(), result), nullptr);
}

}  // namespace
}  // namespace gatedyno
