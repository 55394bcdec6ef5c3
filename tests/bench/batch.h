// A folder of decks under `ngspice -b`, so many at a time by xargs: what a
// script does.

#ifndef GATEDYNO_TESTS_BENCH_BATCH_H_
#define GATEDYNO_TESTS_BENCH_BATCH_H_

#include <filesystem>
#include <map>
#include <string>

#include "harness/base/result.h"
#include "tests/bench/shell.h"

namespace gatedyno {

// What the simulator's start-up file in the folder says.
enum class Threads { kOne, kDefault };

// Runs every *.sp of the folder, each into a log beside it.
Result<Spent> RunFolder(const std::filesystem::path& folder, Threads threads);

// Threads of a simulator that works on `deck`, a tenth of a second after its
// start; 0 where it has ended by then.
Result<int> ThreadsOf(const std::filesystem::path& deck);

// Seconds by name, from a log; what failed is missing.
Result<std::map<std::string, double>> ReadLog(const std::filesystem::path& log);

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_BENCH_BATCH_H_
