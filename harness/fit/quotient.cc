#include "harness/fit/quotient.h"

#include <algorithm>
#include <cassert>
#include <cmath>

namespace gatedyno {

Measured Quotient(const Measured& a, const Measured& b, double covariance) {
  assert(b.value != 0.0);
  const double q = a.value / b.value;
  if (!a.u || !b.u) {
    return {q, std::nullopt};
  }
  const double variance =
      *a.u * *a.u - 2.0 * q * covariance + q * q * *b.u * *b.u;
  return {q, std::sqrt(std::max(0.0, variance)) / std::abs(b.value)};
}

}  // namespace gatedyno
