#include "harness/fit/line_fit.h"

#include <algorithm>
#include <cmath>
#include <vector>

#include <Eigen/Core>
#include <fmt/format.h>

namespace gatedyno {
namespace {

Status CheckPoints(std::span<const Point> points) {
  std::vector<double> fanouts;
  for (const Point& point : points) {
    if (!std::isfinite(point.fanout)) {
      return BadInput("a fanout is not a finite number");
    }
    if (!std::isfinite(point.delay_s)) {
      return BadInput(
          fmt::format("the delay at fanout {} is not a finite "
                      "number",
                      point.fanout));
    }
    fanouts.push_back(point.fanout);
  }
  std::sort(fanouts.begin(), fanouts.end());
  const auto distinct =
      std::unique(fanouts.begin(), fanouts.end()) - fanouts.begin();
  if (distinct < 2) {
    return BadInput(
        fmt::format("a line needs two distinct fanouts, got {}", distinct));
  }
  return Ok();
}

}  // namespace

Result<Line> FitLine(std::span<const Point> points, double delay_u_relative) {
  if (const Status checked = CheckPoints(points); !checked.ok()) {
    return Forward(checked);
  }
  const auto count = static_cast<Eigen::Index>(points.size());
  Eigen::ArrayXd x(count);
  Eigen::ArrayXd y(count);
  for (Eigen::Index i = 0; i < count; ++i) {
    x[i] = points[static_cast<size_t>(i)].fanout;
    y[i] = points[static_cast<size_t>(i)].delay_s;
  }
  // About the means, no digits are lost where the delays are far larger than
  // their spread, and picoseconds squared stay far from underflow.
  const double mean_x = x.mean();
  const double mean_y = y.mean();
  x -= mean_x;
  y -= mean_y;
  const double sxx = x.square().sum();

  Line line;
  line.points = static_cast<int>(points.size());
  line.slope_s = (x * y).sum() / sxx;
  line.intercept_s = mean_y - line.slope_s * mean_x;
  const Eigen::ArrayXd residual = y - line.slope_s * x;
  line.largest_residual_s = residual.abs().maxCoeff();
  if (line.points > 2) {
    const double variance = residual.square().sum() / (line.points - 2);
    const Eigen::ArrayXd delay_u = delay_u_relative * (y + mean_y);
    const Eigen::ArrayXd slope_weight = x / sxx;
    const Eigen::ArrayXd intercept_weight =
        1.0 / line.points - mean_x * slope_weight;
    const auto combined = [&](const Eigen::ArrayXd& a,
                              const Eigen::ArrayXd& b) {
      return variance * (a * b).sum() + (a * b * delay_u.square()).sum();
    };
    line.slope_u_s = std::sqrt(combined(slope_weight, slope_weight));
    line.intercept_u_s =
        std::sqrt(combined(intercept_weight, intercept_weight));
    line.covariance_s2 = combined(slope_weight, intercept_weight);
  }
  return line;
}

Measured DelayAt(const Line& line, double fanout) {
  Measured delay{line.slope_s * fanout + line.intercept_s, std::nullopt};
  if (line.slope_u_s && line.intercept_u_s && line.covariance_s2) {
    const double slope_part = fanout * *line.slope_u_s;
    const double variance = *line.intercept_u_s * *line.intercept_u_s +
                            slope_part * slope_part +
                            2.0 * fanout * *line.covariance_s2;
    delay.u = std::sqrt(std::max(0.0, variance));
  }
  return delay;
}

}  // namespace gatedyno
