// Several ways of measuring the same delays, timed in turn.

#ifndef GATEDYNO_TESTS_BENCH_CONTEST_H_
#define GATEDYNO_TESTS_BENCH_CONTEST_H_

#include <cstddef>
#include <functional>
#include <string>
#include <vector>

#include "harness/base/result.h"
#include "tests/bench/shell.h"
#include "tests/bench/statistics.h"

namespace gatedyno {

// One way of measuring the delays, and how long it took, round by round.
struct Contender {
  std::string name;
  std::function<Result<Spent>()> run;
  int rounds = 0;
  std::vector<double> wall_s = {};
  std::vector<double> processor_s = {};

  double median_s() const { return Median(wall_s); }
};

// One round of each after the other, so that a busy machine slows all.
Status RunRounds(std::vector<Contender>* contenders);

// The first is ours.
void PrintContenders(const std::vector<Contender>& contenders, size_t delays);

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_BENCH_CONTEST_H_
