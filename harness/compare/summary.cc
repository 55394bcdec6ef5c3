#include "harness/compare/summary.h"

#include <algorithm>
#include <cmath>

namespace gatedyno {

Summary Summarise(std::span<const Comparison> comparisons,
                  std::size_t worst_count) {
  Summary summary;
  std::vector<std::size_t>& worst = summary.worst_by_effort;
  for (std::size_t i = 0; i < comparisons.size(); ++i) {
    const Comparison& comparison = comparisons[i];
    summary.within += comparison.verdict == Verdict::kWithin ? 1 : 0;
    summary.beyond += comparison.verdict == Verdict::kBeyond ? 1 : 0;
    summary.bent += comparison.bent ? 1 : 0;
    if (comparison.verdict == Verdict::kNotMeasured) {
      ++summary.not_measured;
    } else {
      worst.push_back(i);
    }
  }
  std::stable_sort(
      worst.begin(), worst.end(), [&](std::size_t a, std::size_t b) {
        return std::abs(comparisons[a].effort_difference) >
               std::abs(comparisons[b].effort_difference);
      });
  worst.resize(std::min(worst.size(), worst_count));
  return summary;
}

}  // namespace gatedyno
