// The fitter on published delay figures of real cells.

#include <vector>

#include <gtest/gtest.h>

#include "harness/fit/calibration.h"
#include "harness/fit/line_fit.h"
#include "harness/fit/normalise.h"

namespace gatedyno {
namespace {

constexpr double kPs = 1e-12;

std::vector<Point> Points(double slope_ps, double intercept_ps) {
  std::vector<Point> points;
  for (const double h : {1.0, 2.0, 4.0, 8.0}) {
    points.push_back(
        {.fanout = h, .delay_s = (slope_ps * h + intercept_ps) * kPs});
  }
  return points;
}

double EffortMean(double slope_ps, Edge edge, const Calibration& calibration) {
  // The source's intercept holds a fixed-slew term and is no parasitic delay;
  // any stands in for it, since the slope is what is checked.
  constexpr double kInterceptPs = 20.0;
  return Normalise(
             FitLine(Points(slope_ps, kInterceptPs)).value(), edge, calibration)
      .effort_mean.value;
}

// G. Petley, open cell data book of a generic 0.13 um process, 1.2 V, 27 C,
// 2005-08: delay = Prop + Ramp * C, ramps in ps/fF, pin capacitance in fF.
TEST(PublishedCalibrationTest, EffortsOfACellDataBook) {
  struct Gate {
    const char* pin;
    double ramp_rise;
    double ramp_fall;
    double pin_ff;
    double effort;
  };
  constexpr Gate kGates[] = {
      {"nand2 b", 2.27, 2.04, 4.9, 1.23},
      {"nand3 c", 2.96, 2.54, 4.5, 1.43},
      {"nand4 d", 2.20, 2.02, 6.3, 1.55},
      {"nor2 b", 5.81, 3.86, 2.9, 1.63},
      {"nor3 c", 3.12, 2.33, 7.0, 2.20},
      {"nor4 d", 5.98, 3.84, 4.6, 2.64},
      {"aoi21 a2", 2.99, 2.18, 6.1, 1.83},
      {"aoi22 b2", 2.72, 2.17, 6.0, 1.69},
      {"oai22 b2", 2.99, 2.02, 5.9, 1.70},
      {"carry c", 3.00, 2.04, 6.0, 1.77},
  };
  constexpr double kPrinted = 0.02;  // What ramps of three digits allow.
  constexpr double kInverterFf = 5.5;
  const Corner corner{"typical", "tt", 1.2, 27.0};
  const Result<Calibration> inverter =
      Calibrate(corner,
                Points(1.98 * kInverterFf, 20.0),
                Points(1.15 * kInverterFf, 20.0));
  ASSERT_TRUE(inverter.ok());
  EXPECT_NEAR(inverter->tau_s.value / kPs, 8.61, 0.01);
  for (const Gate& gate : kGates) {
    const double rise =
        EffortMean(gate.ramp_rise * gate.pin_ff, Edge::kRise, *inverter);
    const double fall =
        EffortMean(gate.ramp_fall * gate.pin_ff, Edge::kFall, *inverter);
    EXPECT_NEAR((rise + fall) / 2.0, gate.effort, kPrinted) << gate.pin;
  }
}

// N. Weste, D. Harris, CMOS VLSI Design, exercise solutions, 6.9 of an earlier
// edition: outer input of a 180 nm NAND2, delays in ns against load in fF,
// 3.9 fF a unit of fanout; tau 12.42 ps.
TEST(PublishedCalibrationTest, Nand2OfAnExercise) {
  struct Row {
    Edge edge;
    double intercept_ns;
    double slope_ns;
    double g;
    double p;
  };
  constexpr Row kRows[] = {
      {Edge::kRise, 0.0400, 4.5253 * 0.0039, 1.42, 3.22},
      {Edge::kFall, 0.0242, 2.8470 * 0.0039, 0.90, 1.95},
  };
  constexpr double kPrinted = 0.01;
  Calibration calibration;
  const Measured tau_s{12.42 * kPs, 0.0};
  calibration.tau_rise_s = tau_s;
  calibration.tau_fall_s = tau_s;
  calibration.tau_s = tau_s;
  for (const Row& row : kRows) {
    const Line line =
        FitLine(Points(row.slope_ns * 1e3, row.intercept_ns * 1e3)).value();
    const Normalised result = Normalise(line, row.edge, calibration);
    EXPECT_NEAR(result.effort.value, row.g, kPrinted);
    EXPECT_NEAR(result.effort_mean.value, row.g, kPrinted);
    EXPECT_NEAR(result.parasitic.value, row.p, kPrinted);
  }
}

}  // namespace
}  // namespace gatedyno
