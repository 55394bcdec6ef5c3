#include "harness/report/number_text.h"

#include <numbers>
#include <optional>

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

struct Text {
  double value;
  const char* text;
};

TEST(NumberTextTest, PicosecondsKeepFourDigits) {
  constexpr Text kCases[] = {{1.4849e-12, "1.485 ps"},
                             {-0.0123e-12, "-0.012 ps"},
                             {12.3456e-12, "12.35 ps"},
                             {123.456e-12, "123.5 ps"},
                             {1.5e-9, "1500.0 ps"},
                             {0.0, "0.000 ps"}};
  for (const Text& tried : kCases) {
    EXPECT_EQ(Picoseconds(tried.value), tried.text);
  }
}

TEST(NumberTextTest, PercentsSayTheirSign) {
  constexpr Text kSigned[] = {{0.028, "+2.8 %"},
                              {-0.0281, "-2.8 %"},
                              {0.0, "+0.0 %"},
                              {-0.00001, "-0.0 %"},
                              {0.0994, "+9.9 %"},
                              {0.0996, "+10 %"},
                              {-0.1666, "-17 %"},
                              {1.5, "+150 %"}};
  for (const Text& tried : kSigned) {
    EXPECT_EQ(SignedPercent(tried.value), tried.text) << tried.value;
  }
  EXPECT_EQ(Percent(0.25), "25 %");
  EXPECT_EQ(Percent(0.125), "12.5 %");
  EXPECT_EQ(Percent(0.07), "7 %");
}

TEST(NumberTextTest, UncertaintyHasTheValuesDecimals) {
  EXPECT_EQ(WithUncertainty({1.2961, 0.0042}, 3), "1.296 ±0.005");
  EXPECT_EQ(WithUncertainty({1.2961, 0.004}, 3), "1.296 ±0.004");
  EXPECT_EQ(WithUncertainty({0.955, 0.0004}, 2), "0.95 ±0.01");
  EXPECT_EQ(WithUncertainty({1.0, 0.0}, 3), "1.000 ±0.000");
  EXPECT_EQ(WithUncertainty({1.7, 0.05}, 2), "1.70 ±0.05");
  EXPECT_EQ(WithUncertainty({1.7, std::nullopt}, 2), "1.70");
}

TEST(NumberTextTest, FractionsWhereTheValueIsOne) {
  constexpr Text kFractions[] = {{1.0, "1"},
                                 {4.0 / 3.0, "4/3"},
                                 {5.0 / 6.0, "5/6"},
                                 {-2.5, "-5/2"},
                                 {0.0, "0"},
                                 {7.0 / 60.0, "7/60"},
                                 {7.0 / 61.0, ""},
                                 {4.0 / 3.0 + 1e-8, ""},
                                 {std::numbers::pi, ""}};
  for (const Text& tried : kFractions) {
    EXPECT_EQ(FractionText(tried.value), tried.text) << tried.value;
  }
}

}  // namespace
}  // namespace gatedyno
