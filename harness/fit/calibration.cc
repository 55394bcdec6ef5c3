#include "harness/fit/calibration.h"

#include <algorithm>
#include <cmath>

#include <fmt/format.h>

#include "harness/fit/line_fit.h"
#include "harness/fit/quotient.h"

namespace gatedyno {
namespace {

constexpr double kFo4Fanout = 4.0;

Result<Line> FitReference(const Corner& corner,
                          Edge edge,
                          std::span<const Point> points,
                          double delay_u_relative) {
  Result<Line> line = FitLine(points, delay_u_relative);
  if (!line.ok()) {
    return BadInput(fmt::format("reference inverter at {}, {}: {}",
                                corner.name,
                                EdgeName(edge),
                                line.error().message));
  }
  if (line->slope_s <= 0.0) {
    return BadInput(
        fmt::format("reference inverter at {}, {}: the delay does not grow "
                    "with the fanout",
                    corner.name,
                    EdgeName(edge)));
  }
  return line;
}

double DelayAtFo4(const Line& line, std::span<const Point> points) {
  const auto found =
      std::find_if(points.begin(), points.end(), [](const Point& point) {
        return point.fanout == kFo4Fanout;
      });
  return found != points.end() ? found->delay_s
                               : DelayAt(line, kFo4Fanout).value;
}

Measured Mean(const Measured& a, const Measured& b) {
  Measured mean{(a.value + b.value) / 2.0, std::nullopt};
  if (a.u && b.u) {
    mean.u = std::hypot(*a.u, *b.u) / 2.0;
  }
  return mean;
}

}  // namespace

Result<Calibration> Calibrate(const Corner& corner,
                              std::span<const Point> rise,
                              std::span<const Point> fall,
                              double delay_u_relative) {
  const Result<Line> rising =
      FitReference(corner, Edge::kRise, rise, delay_u_relative);
  if (!rising.ok()) {
    return Forward(rising);
  }
  const Result<Line> falling =
      FitReference(corner, Edge::kFall, fall, delay_u_relative);
  if (!falling.ok()) {
    return Forward(falling);
  }
  Calibration calibration;
  calibration.corner = corner;
  calibration.tau_rise_s = {rising->slope_s, rising->slope_u_s};
  calibration.tau_fall_s = {falling->slope_s, falling->slope_u_s};
  calibration.tau_s = Mean(calibration.tau_rise_s, calibration.tau_fall_s);
  const Measured intercept =
      Mean({rising->intercept_s, rising->intercept_u_s},
           {falling->intercept_s, falling->intercept_u_s});
  const double covariance = (rising->covariance_s2.value_or(0.0) +
                             falling->covariance_s2.value_or(0.0)) /
                            4.0;
  calibration.p_inv = Quotient(intercept, calibration.tau_s, covariance);
  calibration.fo4_s =
      (DelayAtFo4(*rising, rise) + DelayAtFo4(*falling, fall)) / 2.0;
  return calibration;
}

}  // namespace gatedyno
