// Each card of models/ against figures from outside the project.
//
// Device figures: those of the freely published predictive bulk cards of the
// node, obtained by running such cards in ngspice 39.3 at 27 C, W = 1 um (the
// cards' own statement, Zhao and Cao, IEEE TED 53(11), 2006, abstract: Ion
// within 10 % of silicon from 130 to 32 nm).  They choose a band; they are no
// measurement of silicon.  models/SOURCE.md has the same table with what the
// cards reached.

#include <string>

#include <fmt/format.h>
#include <gtest/gtest.h>

#include "tests/models/card_bench.h"

namespace gatedyno {
namespace {

// Temperature the device figures were taken at.
constexpr double kFiguresTemperatureC = 27.0;

struct Band {
  double low;
  double high;
};
constexpr Band Around(double value, double fraction) {
  return {value * (1 - fraction), value * (1 + fraction)};
}
constexpr Band WithinFactor(double value, double factor) {
  return {value / factor, value * factor};
}
::testing::AssertionResult Inside(double value, Band band) {
  const std::string text =
      fmt::format("{:.4g} in {:.4g} .. {:.4g}", value, band.low, band.high);
  return value >= band.low && value <= band.high
             ? ::testing::AssertionSuccess() << text
             : ::testing::AssertionFailure() << text;
}

// Bands: what two cards of one node, by different hands, may differ by.
constexpr double kOnBand = 0.10;
constexpr double kOffFactor = 2.0;
constexpr double kBarrierLoweringBand = 0.30;
constexpr double kSwingBand = 0.08;
constexpr double kFo4Band = 0.15;

struct DeviceCase {
  const char* node;
  char polarity;
  double on_ua_per_um;
  double off_na_per_um;
  double barrier_lowering_mv_per_v;
  // Known for the n device only; 0: not tested.
  double swing_mv_per_decade;
};
constexpr DeviceCase kDevices[] = {
    {"p180", 'n', 738, 0.94, 77, 79},
    {"p180", 'p', 334, 0.82, 38, 0},
    {"p130", 'n', 993, 29, 81, 89},
    {"p130", 'p', 461, 22, 101, 0},
    {"p65", 'n', 1152, 67, 130, 97},
    {"p65", 'p', 532, 48, 165, 0},
    {"p45", 'n', 1332, 21, 147, 89},
    {"p45", 'p', 956, 5.2, 181, 0},
};

class DeviceCard : public testing::TestWithParam<DeviceCase> {};

TEST_P(DeviceCard, MeetsThePublishedFigures) {
  const DeviceCase& row = GetParam();
  const CardNode node = LoadCardNode(row.node);
  const auto device =
      MeasureDevice(node,
                    row.polarity,
                    NominalConditions(node, "typical", kFiguresTemperatureC));
  ASSERT_TRUE(device.ok()) << device.error().message;
  EXPECT_TRUE(Inside(device->on_a_per_m, Around(row.on_ua_per_um, kOnBand)));
  EXPECT_TRUE(Inside(device->off_a_per_m * 1e3,
                     WithinFactor(row.off_na_per_um, kOffFactor)));
  EXPECT_TRUE(
      Inside(device->barrier_lowering * 1e3,
             Around(row.barrier_lowering_mv_per_v, kBarrierLoweringBand)));
  if (row.swing_mv_per_decade > 0) {
    EXPECT_TRUE(Inside(device->swing_v * 1e3,
                       Around(row.swing_mv_per_decade, kSwingBand)));
  }
}

// Common practice: threshold falls as the channel gets shorter.
TEST_P(DeviceCard, ThresholdRollsOff) {
  const CardNode node = LoadCardNode(GetParam().node);
  const Conditions conditions =
      NominalConditions(node, "typical", kFiguresTemperatureC);
  double previous_v = 1e9;
  for (const double length_scale : {2.0, 1.5, 1.0, 0.95}) {
    const auto device =
        MeasureDevice(node, GetParam().polarity, conditions, length_scale);
    ASSERT_TRUE(device.ok()) << device.error().message;
    EXPECT_LT(device->threshold_saturated_v, previous_v) << length_scale;
    previous_v = device->threshold_saturated_v;
  }
}

INSTANTIATE_TEST_SUITE_P(
    Cards, DeviceCard, testing::ValuesIn(kDevices), [](const auto& row) {
      return fmt::format("{}_{}", row.param.node, row.param.polarity);
    });

struct InverterCase {
  const char* node;
  double fo4_ps;  // The same public cards, P/N = 2.
};
constexpr InverterCase kInverters[] = {
    {"p180", 71.0},
    {"p130", 31.6},
    {"p65", 19.0},
    {"p45", 11.7},
};

// p_inv of a reference inverter with real diffusion: common practice.
constexpr Band kParasiticBand = {0.8, 1.7};
// FO4 of 333 ps a um of drawn length (Harris, lecture tables, a rule of
// thumb); high-performance nodes beat it, so the band is wide.
constexpr double kRuleOfThumbPsPerUm = 333.0;
constexpr double kRuleOfThumbBand = 0.35;
// A delay line crosses FO4 at 4 + p_inv: how straight it is, in tau.
constexpr double kStraightness = 0.05;

class InverterCard : public testing::TestWithParam<InverterCase> {};

TEST_P(InverterCard, MeetsThePublishedDelay) {
  const CardNode node = LoadCardNode(GetParam().node);
  const auto inverter =
      MeasureInverter(node, NominalConditions(node, "typical", 25.0));
  ASSERT_TRUE(inverter.ok()) << inverter.error().message;
  const double fo4_ps = inverter->fo4_s * 1e12;
  EXPECT_TRUE(Inside(fo4_ps, Around(GetParam().fo4_ps, kFo4Band)));
  EXPECT_TRUE(Inside(
      fo4_ps,
      Around(kRuleOfThumbPsPerUm * node.length_m * 1e6, kRuleOfThumbBand)));
  EXPECT_TRUE(Inside(inverter->parasitic, kParasiticBand));
  EXPECT_NEAR(inverter->fo4_s / inverter->tau_s,
              4 + inverter->parasitic,
              kStraightness);
}

INSTANTIATE_TEST_SUITE_P(Cards,
                         InverterCard,
                         testing::ValuesIn(kInverters),
                         [](const auto& row) { return row.param.node; });

}  // namespace
}  // namespace gatedyno
