// What the comparison with golden comes to.

#ifndef GATEDYNO_TESTS_BENCH_TALLY_H_
#define GATEDYNO_TESTS_BENCH_TALLY_H_

#include <map>

#include "tests/bench/statistics.h"

namespace gatedyno {

// How often an error lies within its uncertainty.
struct Coverage {
  int arcs = 0;
  int within_two_u = 0;
  int within_expanded = 0;  // k u, k for the line's few points.

  // `points` of its line.
  void Add(double error, double u, int points);
};

struct Tally {
  RelativeErrors delays;
  RelativeErrors effort;       // Golden at the arc's own fanouts.
  RelativeErrors effort_full;  // Golden at all fanouts.
  Coverage coverage;
  Coverage coverage_full;
  RelativeErrors half_step;  // Golden against golden with half its step.
  std::map<int, int> arcs_by_points;
  int exact = 0;  // Arcs of the reference inverter itself.
  int not_measured = 0;
  int golden_decks = 0;
  int loosened = 0;
};

// False where a target is missed.
bool PrintTally(const Tally& tally);

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_BENCH_TALLY_H_
