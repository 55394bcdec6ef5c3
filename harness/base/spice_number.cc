#include "harness/base/spice_number.h"

#include <array>
#include <charconv>
#include <cmath>

#include <fmt/format.h>

#include "harness/base/text.h"

namespace gatedyno {
namespace {

struct Scale {
  std::string_view letters;
  double factor;
};
// Longer spellings first: "meg" and "mil" before "m".
constexpr std::array<Scale, 10> kScales = {{{"meg", 1e6},
                                            {"mil", 25.4e-6},
                                            {"t", 1e12},
                                            {"g", 1e9},
                                            {"k", 1e3},
                                            {"m", 1e-3},
                                            {"u", 1e-6},
                                            {"n", 1e-9},
                                            {"p", 1e-12},
                                            {"f", 1e-15}}};

bool AllLetters(std::string_view text) {
  for (const char c : text) {
    if (c < 'a' || c > 'z') {
      return false;
    }
  }
  return true;
}

}  // namespace

Result<double> ParseSpiceNumber(std::string_view text) {
  const std::string lower = ToLower(text);
  std::string_view rest = lower;
  if (rest.starts_with('+')) {
    rest.remove_prefix(1);
  }
  double value = 0.0;
  const auto [end, failed] =
      std::from_chars(rest.data(), rest.data() + rest.size(), value);
  if (failed != std::errc() || !std::isfinite(value)) {
    return BadInput(fmt::format("expected a number, got '{}'", text));
  }
  rest.remove_prefix(static_cast<size_t>(end - rest.data()));
  if (rest.starts_with('a')) {
    return BadInput(fmt::format(
        "'{}': the scale letter 'a' means atto in some dialects and nothing "
        "in others: write an exponent",
        text));
  }
  for (const Scale& scale : kScales) {
    if (rest.starts_with(scale.letters)) {
      value *= scale.factor;
      rest.remove_prefix(scale.letters.size());
      break;
    }
  }
  if (!AllLetters(rest)) {
    return BadInput(fmt::format(
        "expected a number, got '{}': only unit letters may follow the digits "
        "and the scale letter",
        text));
  }
  return value;
}

std::string FormatSpiceNumber(double value) {
  return fmt::format("{}", value);
}

}  // namespace gatedyno
