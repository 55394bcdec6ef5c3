#include "harness/base/spice_number.h"

#include <limits>
#include <string>

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

// Each row as ngspice 39.3 reads it, tried.
TEST(SpiceNumber, Reads) {
  const struct {
    std::string text;
    double value;
  } table[] = {
      {"0", 0.0},     {"12", 12.0},  {"-1.5", -1.5},    {"+2", 2.0},
      {".5", 0.5},    {"5.", 5.0},   {"1e-9", 1e-9},    {"1E3", 1e3},
      {"1t", 1e12},   {"1G", 1e9},   {"1MEG", 1e6},     {"1meg", 1e6},
      {"1k", 1e3},    {"1M", 1e-3},  {"1m", 1e-3},      {"1mil", 25.4e-6},
      {"1u", 1e-6},   {"1n", 1e-9},  {"1p", 1e-12},     {"1F", 1e-15},
      {"1fF", 1e-15}, {"1uF", 1e-6}, {"10volts", 10.0}, {"3kohm", 3e3},
  };
  for (const auto& row : table) {
    const Result<double> value = ParseSpiceNumber(row.text);
    ASSERT_TRUE(value.ok()) << value.error().message;
    EXPECT_DOUBLE_EQ(*value, row.value) << row.text;
  }
}

TEST(SpiceNumber, Refuses) {
  const struct {
    std::string text;
    std::string message;
  } table[] = {
      {"", "expected a number, got ''"},
      {"wn", "expected a number, got 'wn'"},
      {"inf", "expected a number, got 'inf'"},
      {"nan", "expected a number, got 'nan'"},
      {"1e999", "expected a number, got '1e999'"},
      {"1a",
       "'1a': the scale letter 'a' means atto in some dialects and nothing in "
       "others: write an exponent"},
      {"4k7",
       "expected a number, got '4k7': only unit letters may follow the digits "
       "and the scale letter"},
      {"1meg5",
       "expected a number, got '1meg5': only unit letters may follow the "
       "digits and the scale letter"},
      {"1 u",
       "expected a number, got '1 u': only unit letters may follow the digits "
       "and the scale letter"},
      {"2*3",
       "expected a number, got '2*3': only unit letters may follow the digits "
       "and the scale letter"},
  };
  for (const auto& row : table) {
    const Result<double> value = ParseSpiceNumber(row.text);
    ASSERT_FALSE(value.ok()) << row.text << " = " << *value;
    EXPECT_EQ(value.error().kind, ErrorKind::kBadInput);
    EXPECT_EQ(value.error().message, row.message);
  }
}

TEST(SpiceNumber, FormatsWhatItReadsBack) {
  EXPECT_EQ(FormatSpiceNumber(9e-08), "9e-08");
  EXPECT_EQ(FormatSpiceNumber(1.0), "1");
  for (const double value : {0.1,
                             1.0 / 3.0,
                             -90e-9,
                             6.02214076e23,
                             std::numeric_limits<double>::min(),
                             std::numeric_limits<double>::max()}) {
    const Result<double> again = ParseSpiceNumber(FormatSpiceNumber(value));
    ASSERT_TRUE(again.ok()) << again.error().message;
    EXPECT_EQ(*again, value);
  }
}

}  // namespace
}  // namespace gatedyno
