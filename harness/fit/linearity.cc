#include "harness/fit/linearity.h"

#include <algorithm>
#include <cassert>
#include <cmath>

#include <Eigen/Dense>

#include "harness/fit/coverage.h"

namespace gatedyno {
namespace {

constexpr int kParabolaTerms = 3;

struct Bend {
  double value_tau = 0.0;
  double scatter_u_tau = 0.0;    // Of the points about the parabola.
  double numerical_u_tau = 0.0;  // Of their delays.
  int freedom = 0;

  double expanded_tau() const {
    const double scatter =
        freedom > 0 ? CoverageFactor(freedom) * scatter_u_tau : 0.0;
    constexpr double kManyDegrees = 2.0;
    return std::hypot(scatter, kManyDegrees * numerical_u_tau);
  }
};

// Fits a + b z + c z^2.
std::optional<Bend> BendInTau(std::span<const Point> points,
                              double tau_s,
                              double delay_u_relative) {
  const auto count = static_cast<Eigen::Index>(points.size());
  const auto [low, high] = std::minmax_element(
      points.begin(), points.end(), [](const Point& a, const Point& b) {
        return a.fanout < b.fanout;
      });
  const double middle = (low->fanout + high->fanout) / 2.0;
  const double reach = (high->fanout - low->fanout) / 2.0;
  Eigen::MatrixX3d terms(count, kParabolaTerms);
  Eigen::VectorXd delay_tau(count);
  for (Eigen::Index i = 0; i < count; ++i) {
    const Point& point = points[static_cast<size_t>(i)];
    const double z = (point.fanout - middle) / reach;
    terms.row(i) << 1.0, z, z * z;
    delay_tau[i] = point.delay_s / tau_s;
  }
  const Eigen::ColPivHouseholderQR<Eigen::MatrixX3d> solver(terms);
  if (solver.rank() < kParabolaTerms) {
    return std::nullopt;
  }
  const Eigen::Vector3d parabola = solver.solve(delay_tau);
  const Eigen::Matrix3d cofactor = (terms.transpose() * terms).inverse();
  const Eigen::VectorXd weights =
      (cofactor.row(2) * terms.transpose()).transpose();
  Bend bend;
  bend.value_tau = parabola[2] / 2.0;
  bend.freedom = static_cast<int>(count) - kParabolaTerms;
  bend.numerical_u_tau =
      delay_u_relative * weights.cwiseProduct(delay_tau).norm() / 2.0;
  if (bend.freedom > 0) {
    const double variance =
        (terms * parabola - delay_tau).squaredNorm() / bend.freedom;
    bend.scatter_u_tau = std::sqrt(variance * cofactor(2, 2)) / 2.0;
  }
  return bend;
}

}  // namespace

Linearity TestLinearity(const Line& line,
                        std::span<const Point> points,
                        double tau_s,
                        double delay_u_relative,
                        const LinearityLimits& limits) {
  assert(tau_s > 0.0);
  const double scale = std::max(1.0, line.slope_s / tau_s);
  Linearity result;
  result.largest_residual_tau = line.largest_residual_s / tau_s;
  result.bent = result.largest_residual_tau > limits.residual_tau * scale;
  const auto least = static_cast<size_t>(
      delay_u_relative > 0.0 ? kParabolaTerms : kParabolaTerms + 1);
  const std::optional<Bend> bend =
      points.size() >= least ? BendInTau(points, tau_s, delay_u_relative)
                             : std::nullopt;
  if (!bend) {
    return result;
  }
  result.bend_tau = Measured{
      bend->value_tau, std::hypot(bend->scatter_u_tau, bend->numerical_u_tau)};
  const double size = std::abs(bend->value_tau);
  const double expanded = bend->expanded_tau();
  const double limit = limits.bend_tau * scale;
  result.bent |= size > expanded && size > limit;
  result.straight = !result.bent && size + expanded <= limit;
  return result;
}

}  // namespace gatedyno
