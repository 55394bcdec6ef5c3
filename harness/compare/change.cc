#include "harness/compare/change.h"

#include <cmath>

#include "harness/fit/coverage.h"

namespace gatedyno {
namespace {

// None below three points, which leave no degree of freedom.
std::optional<double> Expanded(const Reading& reading) {
  constexpr int kParameters = 2;  // Slope and intercept.
  if (!reading.measured.u || reading.points <= kParameters) {
    return std::nullopt;
  }
  return CoverageFactor(reading.points - kParameters) * *reading.measured.u;
}

}  // namespace

std::optional<Change> ChangeOf(const Reading& before, const Reading& after) {
  const double a = before.measured.value;
  const double b = after.measured.value;
  if (!std::isfinite(a) || !std::isfinite(b) || a == 0.0) {
    return std::nullopt;
  }
  Change change{.before = before.measured,
                .after = after.measured,
                .relative = (b - a) / std::abs(a),
                .expanded = std::nullopt};
  const std::optional<double> u_a = Expanded(before);
  const std::optional<double> u_b = Expanded(after);
  if (u_a && u_b) {
    change.expanded = std::hypot(*u_b / a, b * *u_a / (a * a));
  }
  return change;
}

bool IsBeyondUncertainty(const Change& change) {
  return change.expanded && std::abs(change.relative) > *change.expanded;
}

}  // namespace gatedyno
