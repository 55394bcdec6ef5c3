// A run's comparisons in a few numbers.

#ifndef GATEDYNO_COMPARE_SUMMARY_H_
#define GATEDYNO_COMPARE_SUMMARY_H_

#include <cstddef>
#include <span>
#include <vector>

#include "harness/record/comparison.h"

namespace gatedyno {

struct Summary {
  int within = 0;
  int beyond = 0;
  int not_measured = 0;
  int bent = 0;
  // Places in the span given, largest |effort_difference| first; only arcs
  // that have a verdict, at most as many as asked for.
  std::vector<std::size_t> worst_by_effort;
};

Summary Summarise(std::span<const Comparison> comparisons,
                  std::size_t worst_count = 3);

}  // namespace gatedyno

#endif  // GATEDYNO_COMPARE_SUMMARY_H_
