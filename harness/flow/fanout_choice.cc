#include "harness/flow/fanout_choice.h"

#include <algorithm>
#include <cassert>

#include "harness/fit/coverage.h"
#include "harness/fit/line_fit.h"
#include "harness/fit/linearity.h"

namespace gatedyno {
namespace {

// Each step with those before it.
const std::vector<std::vector<double>>& Steps() {
  static const auto& steps =
      *new std::vector<std::vector<double>>{{1, 4, 6}, {2, 3}, {1.5, 5}};
  return steps;
}

bool IsSlopeCertain(const Line& line) {
  const double expanded_s =
      CoverageFactor(line.points - 2) * line.slope_u_s.value_or(0.0);
  return expanded_s <= kWantedSlope * line.slope_s;
}

}  // namespace

std::vector<double> FirstFanouts(const FanoutRule& rule) {
  return rule.fixed.empty() ? Steps().front() : rule.fixed;
}

std::vector<double> MoreFanouts(const FanoutRule& rule,
                                std::span<const Point> points,
                                double tau_s,
                                bool close_call) {
  if (!rule.fixed.empty()) {
    return {};
  }
  const Result<Line> line = FitLine(points, rule.delay_u_relative);
  assert(line.ok());
  const Linearity linearity =
      TestLinearity(*line, points, tau_s, rule.delay_u_relative);
  const bool is_first = points.size() == Steps().front().size();
  if (linearity.straight && !close_call &&
      (!is_first || IsSlopeCertain(*line))) {
    return {};
  }
  size_t measured = 0;
  for (const std::vector<double>& step : Steps()) {
    if (measured == points.size()) {
      return step;
    }
    measured += step.size();
  }
  return {};
}

std::vector<double> AllFanouts(const FanoutRule& rule) {
  if (!rule.fixed.empty()) {
    return rule.fixed;
  }
  std::vector<double> all;
  for (const std::vector<double>& step : Steps()) {
    all.insert(all.end(), step.begin(), step.end());
  }
  std::sort(all.begin(), all.end());
  return all;
}

}  // namespace gatedyno
