#include "harness/fit/linearity.h"

#include <algorithm>
#include <cassert>
#include <cmath>

#include <Eigen/Dense>

#include "harness/fit/coverage.h"

namespace gatedyno {
namespace {

constexpr int kParabolaTerms = 3;

// Fits a + b z + c z^2 with the fanouts mapped to z in [-1, 1].  The nearest
// line to c z^2 there is the constant c/2, so the parabola leaves it by c/2.
std::optional<Measured> BendInTau(std::span<const Point> points, double tau_s) {
  const auto count = static_cast<Eigen::Index>(points.size());
  if (count <= kParabolaTerms) {
    return std::nullopt;
  }
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
  const double variance = (terms * parabola - delay_tau).squaredNorm() /
                          static_cast<double>(count - kParabolaTerms);
  const Eigen::Matrix3d cofactor = (terms.transpose() * terms).inverse();
  return Measured{parabola[2] / 2.0,
                  std::sqrt(variance * cofactor(2, 2)) / 2.0};
}

}  // namespace

Linearity TestLinearity(const Line& line,
                        std::span<const Point> points,
                        double tau_s,
                        const LinearityLimits& limits) {
  assert(tau_s > 0.0);
  const double scale = std::max(1.0, line.slope_s / tau_s);
  Linearity result;
  result.largest_residual_tau = line.largest_residual_s / tau_s;
  result.bend_tau = BendInTau(points, tau_s);
  result.bent = result.largest_residual_tau > limits.residual_tau * scale;
  if (result.bend_tau) {
    const int freedom = static_cast<int>(points.size()) - kParabolaTerms;
    const double bend = std::abs(result.bend_tau->value);
    const bool certain =
        bend > CoverageFactor(freedom) * result.bend_tau->u.value_or(0.0);
    result.bent |= certain && bend > limits.bend_tau * scale;
  }
  return result;
}

}  // namespace gatedyno
