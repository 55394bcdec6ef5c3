#include "harness/fit/coverage.h"

#include <cassert>
#include <cmath>
#include <numbers>

#include <boost/math/distributions/students_t.hpp>

namespace gatedyno {

double CoverageFactor(int degrees_of_freedom) {
  assert(degrees_of_freedom >= 1);
  // A normal distribution's probability above two sigma.
  const double upper_tail = 0.5 * std::erfc(std::numbers::sqrt2);
  const boost::math::students_t distribution(degrees_of_freedom);
  return boost::math::quantile(
      boost::math::complement(distribution, upper_tail));
}

}  // namespace gatedyno
