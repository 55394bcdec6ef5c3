#include "harness/fit/normalise.h"

#include "harness/fit/quotient.h"

namespace gatedyno {
namespace {

// Of an arc's slope and intercept with the calibration's figures.
struct SharedCovariance {
  double slope_edge_tau_s2 = 0.0;
  double slope_tau_s2 = 0.0;
  double intercept_tau_s2 = 0.0;
};

SharedCovariance Shared(const Line& line, const Measured& edge_tau_s) {
  const bool is_reference = line.slope_s == edge_tau_s.value &&
                            line.slope_u_s == edge_tau_s.u && edge_tau_s.u;
  if (!is_reference) {
    return {};
  }
  const double slope_variance_s2 = *edge_tau_s.u * *edge_tau_s.u;
  // tau is half this edge and half the other, which is independent of it.
  return {slope_variance_s2,
          slope_variance_s2 / 2.0,
          line.covariance_s2.value_or(0.0) / 2.0};
}

}  // namespace

Normalised Normalise(const Line& line,
                     Edge edge,
                     const Calibration& calibration) {
  const Measured& edge_tau_s =
      edge == Edge::kRise ? calibration.tau_rise_s : calibration.tau_fall_s;
  const SharedCovariance shared = Shared(line, edge_tau_s);
  const Measured slope{line.slope_s, line.slope_u_s};
  const Measured intercept{line.intercept_s, line.intercept_u_s};
  return {
      Quotient(slope, edge_tau_s, shared.slope_edge_tau_s2),
      Quotient(slope, calibration.tau_s, shared.slope_tau_s2),
      Quotient(intercept, calibration.tau_s, shared.intercept_tau_s2),
  };
}

}  // namespace gatedyno
