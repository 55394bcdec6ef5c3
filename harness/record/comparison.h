// Estimate against line, for one arc at one corner; and all of a run's.

#ifndef GATEDYNO_RECORD_COMPARISON_H_
#define GATEDYNO_RECORD_COMPARISON_H_

#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include "harness/record/arc.h"
#include "harness/record/corner.h"
#include "harness/record/line.h"
#include "harness/record/tolerance.h"

namespace gatedyno {

enum class Verdict { kWithin, kBeyond, kNotMeasured };

std::string_view VerdictName(Verdict verdict);  // "within", "beyond", ...

// How the cell under test is driven.
enum class Drive { kMatched, kSelf };

std::string_view DriveName(Drive drive);

// What the reference inverter gives at one corner.
struct Calibration {
  Corner corner;
  Measured tau_rise_s;  // Slope of the inverter's rising output per fanout.
  Measured tau_fall_s;
  Measured tau_s;      // Mean of both edges.
  Measured p_inv;      // Intercept over tau, mean of both edges.
  double fo4_s = 0.0;  // Mean delay at h = 4.
};

// One row of the table.
struct Comparison {
  Arc arc;
  std::string corner;
  Estimate estimate;
  Tolerance tolerance;
  std::vector<Point> points;
  std::optional<Line> line;        // None when not measured.
  Measured effort;                 // g = slope / tau(edge).
  Measured effort_mean;            // slope / tau.
  Measured parasitic;              // p = intercept / tau.
  double hand_parasitic = 0.0;     // p by nodes, in tau; see compare.h.
  double effort_difference = 0.0;  // (measured - hand) / hand.
  double parasitic_difference = 0.0;
  // What the verdict allows for, U of compare/compare.h; none when unknown.
  std::optional<double> effort_difference_expanded = std::nullopt;
  std::optional<double> parasitic_difference_expanded = std::nullopt;
  bool bent = false;  // A line does not describe the points.
  Verdict verdict = Verdict::kNotMeasured;
  std::string reason;  // Why not measured, or what is beyond.
};

}  // namespace gatedyno

#endif  // GATEDYNO_RECORD_COMPARISON_H_
