// A shell command, and what it took.

#ifndef GATEDYNO_TESTS_BENCH_SHELL_H_
#define GATEDYNO_TESTS_BENCH_SHELL_H_

#include <filesystem>
#include <string>
#include <vector>

#include "harness/base/result.h"

namespace gatedyno {

struct Spent {
  double wall_s = 0.0;
  double processor_s = 0.0;  // Of all processes, user and system.
};

// Fails, quoting the command, where its exit code is none of `good_codes`.
Result<Spent> RunShell(const std::string& command,
                       const std::vector<int>& good_codes = {0});

// Processor time of all children of this process that have ended.
double ChildrenProcessorTime();

// In single quotes.  REQUIRES: there is none in the path.
std::string Quoted(const std::filesystem::path& path);

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_BENCH_SHELL_H_
