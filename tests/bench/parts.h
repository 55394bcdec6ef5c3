// The parts of the benchmark.  Each prints its figures; false where a target
// is missed.  `folder` takes decks, logs and stores.

#ifndef GATEDYNO_TESTS_BENCH_PARTS_H_
#define GATEDYNO_TESTS_BENCH_PARTS_H_

#include <filesystem>

#include "harness/base/result.h"

namespace gatedyno {

// Delays a second against two scripts on the same arcs, and everybody's error.
Result<bool> BenchSpeed(const std::filesystem::path& folder);

// Delays and g of a spread of arcs against golden, and whether u(g) holds.
Result<bool> BenchAccuracy();

// The simulator's share of the workers' time; two workers against one.
Result<bool> BenchProcessors(const std::filesystem::path& folder);

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_BENCH_PARTS_H_
