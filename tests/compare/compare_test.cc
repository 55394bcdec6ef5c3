#include "harness/compare/compare.h"

#include <algorithm>
#include <cmath>
#include <string>
#include <vector>

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

constexpr double kTauS = 1.5e-12;
constexpr double kRounding = 1e-9;

Calibration Inverter() {
  Calibration calibration;
  calibration.corner = {"typical", "tt", 1.0, 25.0};
  calibration.tau_rise_s = {kTauS, 0.0};
  calibration.tau_fall_s = {kTauS, 0.0};
  calibration.tau_s = {kTauS, 0.0};
  calibration.p_inv = {1.5, 0.0};
  calibration.fo4_s = 5.5 * kTauS;
  return calibration;
}

// Four points about d = g h + p with residuals in tau of +r, -r, -r, +r, which
// a least-squares line leaves where they are.  At fanouts 1, 2, 3, 4:
// s^2 = 4 r^2 / 2, Sxx = 5, so u(g) = r sqrt(2/5).
MeasuredArc Nand2(double g, double p, double residual_tau = 0.0) {
  MeasuredArc measured;
  measured.arc = {.cell = "nand2",
                  .pin = "a",
                  .output = "y",
                  .input_edge = Edge::kRise,
                  .edge = Edge::kFall,
                  .side = {{"b", true}}};
  measured.estimate.effort = 4.0 / 3.0;
  measured.estimate.parasitic_by_nodes = 2.0;
  measured.estimate.parasitic_by_elmore = 8.0 / 3.0;
  constexpr double kSigns[] = {1.0, -1.0, -1.0, 1.0};
  for (int h = 1; h <= 4; ++h) {
    const double delay_tau = g * h + p + kSigns[h - 1] * residual_tau;
    measured.points.push_back(
        {.fanout = 1.0 * h, .delay_s = delay_tau * kTauS});
  }
  return measured;
}

TEST(CompareTest, FillsEveryNumber) {
  const Tolerance tolerance{0.25, 0.35};
  const Comparison result =
      Compare(Nand2(1.2, 2.7, 0.01), Inverter(), tolerance);
  EXPECT_EQ(result.arc, Nand2(1.2, 2.7).arc);
  EXPECT_EQ(result.corner, "typical");
  EXPECT_EQ(result.points.size(), 4U);
  ASSERT_TRUE(result.line.has_value());
  EXPECT_EQ(result.line->points, 4);
  EXPECT_NEAR(result.effort.value, 1.2, kRounding);
  EXPECT_NEAR(*result.effort.u, 0.01 * std::sqrt(0.4), kRounding);
  EXPECT_NEAR(result.effort_mean.value, 1.2, kRounding);
  EXPECT_NEAR(result.parasitic.value, 2.7, kRounding);
  EXPECT_NEAR(result.hand_parasitic, 3.0, kRounding);
  EXPECT_NEAR(result.effort_difference, -0.1, kRounding);
  EXPECT_NEAR(result.parasitic_difference, -0.1, kRounding);
  EXPECT_FALSE(result.bent);
  EXPECT_EQ(result.verdict, Verdict::kWithin);
  EXPECT_EQ(result.reason, "");
}

TEST(CompareTest, Verdicts) {
  struct Case {
    const char* what;
    MeasuredArc measured;
    Verdict verdict;
    const char* reason;
  };
  // Four points have k = 4.53; u(d_g) = r sqrt(2/5) / (4/3), so a residual of
  // 0.04 tau means U = 8.6 % on g.
  const Case cases[] = {
      {"as by hand", Nand2(4.0 / 3, 3.0), Verdict::kWithin, ""},
      {"just allowed", Nand2(1.334 * 0.8, 3.0), Verdict::kWithin, ""},
      {"slower than by hand",
       Nand2(1.7, 3.0),
       Verdict::kBeyond,
       "g 1.70 against 1.33 by hand: +27.5 % (allowed 20 %)"},
      {"faster than by hand",
       Nand2(1.0, 3.0),
       Verdict::kBeyond,
       "g 1.00 against 1.33 by hand: -25.0 % (allowed 20 %)"},
      {"parasitic",
       Nand2(4.0 / 3, 4.5),
       Verdict::kBeyond,
       "p 4.50 against 3.00 by hand: +50.0 % (allowed 35 %)"},
      {"both",
       Nand2(1.0, 4.5),
       Verdict::kBeyond,
       "g 1.00 against 1.33 by hand: -25.0 % (allowed 20 %); "
       "p 4.50 against 3.00 by hand: +50.0 % (allowed 35 %)"},
      {"beyond by less than its uncertainty",
       Nand2(1.0, 3.0, 0.04),
       Verdict::kWithin,
       ""},
      {"beyond by more than its uncertainty",
       Nand2(0.9, 3.0, 0.04),
       Verdict::kBeyond,
       "g 0.90 against 1.33 by hand: -32.5 % (allowed 20 %)"},
      {"too uncertain to tell",
       Nand2(1.36, 3.0, 0.1),
       Verdict::kNotMeasured,
       "g is too uncertain to tell: +2.0 % with an uncertainty of 21.5 % "
       "(allowed 20 %)"},
      {"beyond outweighs doubt",
       Nand2(4.0 / 3, 6.0, 0.1),
       Verdict::kBeyond,
       "p 6.00 against 3.00 by hand: +100.0 % (allowed 35 %)"},
  };
  for (const Case& test : cases) {
    SCOPED_TRACE(test.what);
    const Comparison result = Compare(test.measured, Inverter(), {0.20, 0.35});
    EXPECT_EQ(VerdictName(result.verdict), VerdictName(test.verdict));
    EXPECT_EQ(result.reason, test.reason);
    EXPECT_TRUE(result.line.has_value());
  }
}

TEST(CompareTest, NotMeasuredSaysWhy) {
  MeasuredArc timed_out = Nand2(1.2, 2.7);
  timed_out.points.pop_back();
  timed_out.failures = {"h=4: timed out after 60 s"};
  MeasuredArc failed_twice = timed_out;
  failed_twice.failures.emplace_back("h=6: worker crashed");
  MeasuredArc no_points = Nand2(1.2, 2.7);
  no_points.points.clear();
  MeasuredArc two_points = Nand2(1.2, 2.7);
  two_points.points.resize(2);
  struct Case {
    const char* what;
    MeasuredArc measured;
    bool has_line;
    const char* reason;
  };
  const Case cases[] = {
      {"one job failed", timed_out, false, "h=4: timed out after 60 s"},
      {"two jobs failed",
       failed_twice,
       false,
       "h=4: timed out after 60 s (and 1 more)"},
      {"no points",
       no_points,
       false,
       "a line needs two distinct fanouts, got 0"},
      {"two points",
       two_points,
       true,
       "uncertainty unknown: needs three points or more, of the arc and of the "
       "reference inverter"},
  };
  for (const Case& test : cases) {
    SCOPED_TRACE(test.what);
    const Comparison result = Compare(test.measured, Inverter(), {});
    EXPECT_EQ(result.verdict, Verdict::kNotMeasured);
    EXPECT_EQ(result.reason, test.reason);
    EXPECT_EQ(result.line.has_value(), test.has_line);
    EXPECT_EQ(result.points.size(), test.measured.points.size());
    EXPECT_NEAR(result.hand_parasitic, 3.0, kRounding);
  }
}

TEST(CompareTest, TheCalibrationsUncertaintyCounts) {
  Calibration calibration = Inverter();
  calibration.tau_fall_s.u = 0.05 * kTauS;
  const Comparison doubtful =
      Compare(Nand2(1.0, 3.0), calibration, {0.20, 0.35});
  EXPECT_EQ(doubtful.verdict, Verdict::kWithin);
  EXPECT_NEAR(*doubtful.effort.u, 0.05, kRounding);
  calibration.tau_fall_s.u.reset();
  EXPECT_EQ(Compare(Nand2(1.0, 3.0), calibration, {0.20, 0.35}).verdict,
            Verdict::kNotMeasured);
}

TEST(CompareTest, ParasiticByTheTextbookInverter) {
  Calibration calibration = Inverter();
  calibration.p_inv = {1.0, 0.0};
  const Comparison result = Compare(Nand2(4.0 / 3, 2.2), calibration, {});
  EXPECT_NEAR(result.hand_parasitic, 2.0, kRounding);
  EXPECT_NEAR(result.parasitic_difference, 0.1, kRounding);
}

// Of a buffer whose second stage loads the first by two: p = 1 + 1 + 2, of
// which only the drains scale with p_inv.
TEST(CompareTest, EffortInsideTheCellDoesNotScaleWithPInv) {
  MeasuredArc buffer = Nand2(4.0 / 3, 5.5);
  buffer.estimate.parasitic_by_nodes = 4.0;
  buffer.estimate.inner_effort = 2.0;
  Calibration calibration = Inverter();
  calibration.p_inv.u = 0.1;
  const Comparison result = Compare(buffer, calibration, {});
  EXPECT_NEAR(result.hand_parasitic, 2.0 * 1.5 + 2.0, kRounding);
  EXPECT_NEAR(result.parasitic_difference, 0.1, kRounding);
}

TEST(CompareTest, RefusesAnInverterWithoutParasitic) {
  Calibration calibration = Inverter();
  calibration.p_inv = {-0.1, 0.0};
  const Comparison result = Compare(Nand2(4.0 / 3, 2.2), calibration, {});
  EXPECT_EQ(result.verdict, Verdict::kNotMeasured);
  EXPECT_EQ(result.reason,
            "p_inv of the reference inverter is -0.10: p by hand needs one "
            "above zero");
}

TEST(CompareTest, BentIsCarried) {
  MeasuredArc measured = Nand2(4.0 / 3, 3.0);
  for (Point& point : measured.points) {
    point.delay_s += 0.1 * point.fanout * point.fanout * kTauS;
  }
  EXPECT_TRUE(Compare(measured, Inverter(), {}).bent);
}

// G. Petley, open cell data book of a generic 0.13 um process, 2005-08:
// published effort against the ideal.  The default must hold all of them and
// not be so wide that it says nothing.
TEST(ToleranceTest, HoldsThePublishedSpreadOfEffort) {
  struct Gate {
    double published;
    double ideal;
  };
  constexpr Gate kGates[] = {
      {1.23, 4.0 / 3},
      {1.43, 5.0 / 3},
      {1.55, 2},
      {1.63, 5.0 / 3},
      {2.20, 7.0 / 3},
      {2.64, 3},
      {1.83, 2},
      {1.69, 2},
      {1.70, 2},
      {1.77, 2},
  };
  constexpr int kCount = 10;
  double mean = 0.0;
  double worst = 0.0;
  double squares = 0.0;
  for (const Gate& gate : kGates) {
    const double difference = gate.published / gate.ideal - 1.0;
    mean += difference / kCount;
    squares += difference * difference;
    worst = std::max(worst, std::abs(difference));
  }
  const double deviation =
      std::sqrt((squares - kCount * mean * mean) / (kCount - 1));
  // As the comment beside Tolerance says.
  EXPECT_NEAR(mean, -0.115, 0.0005);
  EXPECT_NEAR(deviation, 0.058, 0.0005);
  EXPECT_NEAR(worst, 0.225, 0.0005);
  EXPECT_GT(Tolerance{}.effort, std::abs(mean) + 2.0 * deviation);
  EXPECT_LT(Tolerance{}.effort, std::abs(mean) + 3.0 * deviation);
}

// U(g) is 8.6 % at a residual of 0.04 tau, as above; allowed 25 %.
TEST(CompareTest, AVerdictHangsWhereTheLimitIsWithinTheUncertainty) {
  struct Case {
    const char* what;
    double g_difference;
    bool hangs;
  };
  const Case cases[] = {
      {"far within", -0.10, false},
      {"within, but not surely", -0.20, true},
      {"beyond, but not surely", 0.30, true},
      {"surely beyond", 0.40, false},
  };
  constexpr double kResidualTau = 0.04;
  for (const Case& test : cases) {
    const double g = 4.0 / 3.0 * (1.0 + test.g_difference);
    // p on the hand number, and its own limit far away.
    EXPECT_EQ(IsCloseCall(Nand2(g, 3.0, kResidualTau),
                          Inverter(),
                          {.effort = 0.25, .parasitic = 0.9},
                          0.0),
              test.hangs)
        << test.what;
  }
  MeasuredArc failed = Nand2(1.0, 3.0, kResidualTau);
  failed.failures = {"h=4: timed out"};
  EXPECT_FALSE(IsCloseCall(failed, Inverter(), {}, 0.0));
}

}  // namespace
}  // namespace gatedyno
