#include "harness/netlist/strict_number.h"

#include <string>

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

constexpr const char* kAtto =
    ": the letter 'a' means atto in some dialects and nothing in others: write "
    "an exponent";
constexpr const char* kDigitsAfterLetter =
    ": some dialects drop the digits after a letter: put the letter last";

TEST(StrictNumber, ReadsScalesAndUnits) {
  const struct {
    std::string text;
    double value;
  } table[] = {
      {"0", 0},       {"12", 12},        {"1.5e-3", 1.5e-3}, {"1t", 1e12},
      {"1g", 1e9},    {"1meg", 1e6},     {"1MEG", 1e6},      {"1k", 1e3},
      {"1m", 1e-3},   {"1M", 1e-3},      {"1mil", 25.4e-6},  {"1u", 1e-6},
      {"1n", 1e-9},   {"1p", 1e-12},     {"1f", 1e-15},      {"1F", 1e-15},
      {"1fF", 1e-15}, {"1uF", 1e-6},     {"10um", 10e-6},    {"1mm", 1e-3},
      {"1kohm", 1e3}, {"1megohms", 1e6}, {"3volts", 3},      {"2ns", 2e-9},
      {"1ghz", 1e9},
  };
  for (const auto& row : table) {
    const auto value = ReadStrictNumber(row.text);
    ASSERT_TRUE(value) << row.text << value.error();
    EXPECT_DOUBLE_EQ(*value, row.value) << row.text;
  }
}

TEST(StrictNumber, Refuses) {
  const struct {
    std::string text;
    std::string why;
  } table[] = {
      {"", ""},
      {"x", ""},
      {"inf", ""},
      {"nan", ""},
      {"2x", ""},
      {"1e", ""},
      {"1milli", ""},
      {"1micron", ""},
      {"1meters", ""},
      {"1farad", ""},
      {"1a", kAtto},
      {"1aF", kAtto},
      {"4k7", kDigitsAfterLetter},
      {"1meg5", kDigitsAfterLetter},
      {"1um2", kDigitsAfterLetter},
      {"1.2.3", ""},
      {".", ""},
      {"1e999", ": too large or too small"},
      {"1e-999", ": too large or too small"},
  };
  for (const auto& row : table) {
    const auto value = ReadStrictNumber(row.text);
    ASSERT_FALSE(value) << row.text << " = " << *value;
    EXPECT_EQ(value.error(), row.why) << row.text;
  }
}

}  // namespace
}  // namespace gatedyno
