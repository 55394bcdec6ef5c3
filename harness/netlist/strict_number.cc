#include "harness/netlist/strict_number.h"

#include <algorithm>
#include <array>
#include <charconv>
#include <cstddef>
#include <system_error>

#include "harness/base/spice_number.h"
#include "harness/base/text.h"

namespace gatedyno {
namespace {

// Longer spellings first, as ParseSpiceNumber tries them.
constexpr std::array<std::string_view, 10> kScales = {
    "meg", "mil", "t", "g", "k", "m", "u", "n", "p", "f"};
constexpr std::array<std::string_view, 11> kUnits = {
    "", "m", "f", "ohm", "ohms", "v", "volt", "volts", "s", "sec", "hz"};

bool IsUnit(std::string_view letters) {
  return std::find(kUnits.begin(), kUnits.end(), letters) != kUnits.end();
}

bool IsScaleAndUnit(std::string_view letters) {
  for (const std::string_view scale : kScales) {
    if (letters.starts_with(scale)) {
      return IsUnit(letters.substr(scale.size()));
    }
  }
  return IsUnit(letters);
}

// "k7", "meg5"; not ".3".
bool HasDigitAfterLetter(std::string_view text) {
  return !text.starts_with('.') &&
         text.find_first_of("0123456789.") != std::string_view::npos;
}

}  // namespace

tl::expected<double, std::string> ReadStrictNumber(std::string_view text) {
  const std::string lower = ToLower(text);
  double digits = 0.0;
  const char* const end = lower.data() + lower.size();
  const auto [after, failed] = std::from_chars(lower.data(), end, digits);
  if (failed == std::errc::result_out_of_range) {
    return tl::unexpected(std::string(": too large or too small"));
  }
  const std::string_view letters(after, static_cast<size_t>(end - after));
  if (letters.starts_with('a')) {
    return tl::unexpected(
        std::string(": the letter 'a' means atto in some dialects and nothing "
                    "in others: write an exponent"));
  }
  if (HasDigitAfterLetter(letters)) {
    return tl::unexpected(
        std::string(": some dialects drop the digits after a letter: put the "
                    "letter last"));
  }
  const Result<double> value = ParseSpiceNumber(text);
  if (!IsScaleAndUnit(letters) || !value.ok()) {
    return tl::unexpected(std::string());
  }
  return *value;
}

}  // namespace gatedyno
