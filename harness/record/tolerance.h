// What is allowed between hand and measured, and where something else is.

#ifndef GATEDYNO_RECORD_TOLERANCE_H_
#define GATEDYNO_RECORD_TOLERANCE_H_

#include <optional>
#include <span>
#include <string>

#include "harness/record/arc_pattern.h"

namespace gatedyno {

// Relative to the hand number.
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

  bool operator==(const Tolerance&) const = default;
};

// For the arcs of a pattern, in place of what was allowed; a quantity that is
// not named keeps what it had.
struct ToleranceRule {
  ArcPattern where;
  std::optional<double> effort;
  std::optional<double> parasitic;

  bool operator==(const ToleranceRule&) const = default;
};

// The general tolerance, changed by every rule that covers the arc, in order:
// where several name a quantity, the last one counts.
Tolerance ToleranceFor(const Arc& arc,
                       const std::string& corner,
                       const Tolerance& general,
                       std::span<const ToleranceRule> rules);

}  // namespace gatedyno

#endif  // GATEDYNO_RECORD_TOLERANCE_H_
