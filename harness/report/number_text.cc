#include "harness/report/number_text.h"

#include <algorithm>
#include <cmath>

#include <fmt/format.h>

namespace gatedyno {

std::string Picoseconds(double seconds) {
  const double ps = seconds * 1e12;
  const double size = std::abs(ps);
  const int decimals = size < 10.0 ? 3 : size < 100.0 ? 2 : 1;
  return fmt::format("{:.{}f} ps", ps, decimals);
}

std::string SignedPercent(double ratio) {
  const double percent = ratio * 100.0;
  return std::abs(percent) < 9.95 ? fmt::format("{:+.1f} %", percent)
                                  : fmt::format("{:+.0f} %", percent);
}

std::string Percent(double ratio) {
  return fmt::format("{:g} %", ratio * 100);
}

std::string WithUncertainty(const Measured& measured, int decimals) {
  constexpr double kTen = 10.0;
  // 0.004 is 0.004, however its double is spelt.
  constexpr double kSpelling = 1e-9;
  const double unit = std::pow(kTen, -decimals);
  return measured.u
             ? fmt::format(
                   "{:.{}f} ±{:.{}f}",
                   measured.value,
                   decimals,
                   std::ceil(std::max(0.0, *measured.u / unit - kSpelling)) *
                       unit,
                   decimals)
             : fmt::format("{:.{}f}", measured.value, decimals);
}

std::string PicosecondsWithUncertainty(const Measured& seconds) {
  constexpr double kPicoseconds = 1e12;
  Measured ps{seconds.value * kPicoseconds, std::nullopt};
  if (seconds.u) {
    ps.u = *seconds.u * kPicoseconds;
  }
  return WithUncertainty(ps, 3);
}

std::string FractionText(double value) {
  constexpr int kLargestDenominator = 60;
  constexpr double kExact = 1e-9;
  for (int denominator = 1; denominator <= kLargestDenominator; ++denominator) {
    const double numerator = std::round(value * denominator);
    if (std::abs(value - numerator / denominator) <= kExact) {
      return denominator == 1
                 ? fmt::format("{:.0f}", numerator)
                 : fmt::format("{:.0f}/{}", numerator, denominator);
    }
  }
  return "";
}

}  // namespace gatedyno
