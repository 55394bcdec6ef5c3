#include "tests/bench/statistics.h"

#include <algorithm>
#include <cassert>
#include <cmath>

#include <fmt/format.h>

namespace gatedyno {

void RelativeErrors::Add(const std::string& label,
                         double value,
                         double golden) {
  const double error = value / golden - 1.0;
  ++count_;
  squares_ += error * error;
  if (std::abs(error) > largest_) {
    largest_ = std::abs(error);
    worst_ = label;
  }
}

double RelativeErrors::rms() const {
  return count_ == 0 ? 0.0 : std::sqrt(squares_ / count_);
}

std::string RelativeErrors::Text() const {
  constexpr double kPercent = 100.0;
  return fmt::format("{:.3f} % largest, {:.3f} % rms of {}{} ({})",
                     kPercent * largest_,
                     kPercent * rms(),
                     count_,
                     missing_ > 0 ? fmt::format(", {} missing", missing_) : "",
                     worst_);
}

double Median(std::vector<double> values) {
  assert(!values.empty());
  std::sort(values.begin(), values.end());
  const size_t middle = values.size() / 2;
  return values.size() % 2 == 1 ? values[middle]
                                : (values[middle - 1] + values[middle]) / 2;
}

}  // namespace gatedyno
