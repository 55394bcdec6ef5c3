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

// What is allowed between hand and measured, relative to the hand number.
//
// The defaults are the spread of ordinary gates, so that "beyond" marks an arc
// that strays further than they do.  Effort: ten gates of a published 0.13 um
// cell data book (2005-08) lie 11.5 % below the ideal on average, standard
// deviation 5.8 %, worst 22.5 % (a four-high NAND); mean plus two deviations is
// 23 %.  Parasitic: two-input NANDs on public cards of five nodes come out
// between 26 % below and 14 % above the node count, by input (our own trials),
// and counting the internal nets of a three-high stack adds a third.
struct Tolerance {
  double effort = 0.25;
  double parasitic = 0.35;
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
  bool bent = false;  // A line does not describe the points.
  Verdict verdict = Verdict::kNotMeasured;
  std::string reason;  // Why not measured, or what is beyond.
};

}  // namespace gatedyno

#endif  // GATEDYNO_RECORD_COMPARISON_H_
