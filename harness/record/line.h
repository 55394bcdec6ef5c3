// The hand numbers of an arc, and the line fitted through its points.

#ifndef GATEDYNO_RECORD_LINE_H_
#define GATEDYNO_RECORD_LINE_H_

#include <optional>
#include <string>

namespace gatedyno {

// Hand numbers of one arc.  d = g * h + p, in units of tau; p in units of the
// inverter's parasitic delay p_inv.
struct Estimate {
  double effort = 0.0;               // g, relative to the edge's reference
                                     // inverter.
  double parasitic_by_nodes = 0.0;   // p by the drain width on the output.
  double parasitic_by_elmore = 0.0;  // p with internal nets, by Elmore.
  // Set where the pin's first stage is not the one that drives the output: its
  // own stage effort, which the netlist fixes.  Unset, the first stage's effort
  // is effort * h.  It is what the driving stages match.
  std::optional<double> fixed_first_effort;
  // The part of both p that is effort at loads inside the cell: in units of
  // tau, not of p_inv.  p in tau = (p - inner_effort) * p_inv + inner_effort.
  double inner_effort = 0.0;
};

// What one job measured, at one fanout.
struct Point {
  double fanout = 0.0;
  double delay_s = 0.0;
  double input_transition_s = 0.0;   // 20-80 %, raw (not scaled to 0-100).
  double output_transition_s = 0.0;  // 20-80 %, raw.
  std::string job_key = {};          // Of the job that measured it.
};

// delay_s = slope_s * fanout + intercept_s.
struct Line {
  double slope_s = 0.0;
  double intercept_s = 0.0;
  // Standard uncertainties, one sigma, and the covariance of slope and
  // intercept: the residuals' and the simulator's numerical error.  None for
  // two points: any two lie on a line, so they say nothing of the former.
  std::optional<double> slope_u_s = std::nullopt;
  std::optional<double> intercept_u_s = std::nullopt;
  std::optional<double> covariance_s2 = std::nullopt;
  double largest_residual_s = 0.0;
  int points = 0;
};

// A number and its standard uncertainty (one sigma); none when unknown.
struct Measured {
  double value = 0.0;
  std::optional<double> u = std::nullopt;
};

}  // namespace gatedyno

#endif  // GATEDYNO_RECORD_LINE_H_
