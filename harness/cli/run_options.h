// The options of `gatedyno run` that say how, and where, but not what.

#ifndef GATEDYNO_CLI_RUN_OPTIONS_H_
#define GATEDYNO_CLI_RUN_OPTIONS_H_

#include <cstdint>
#include <optional>
#include <string>
#include <vector>

#include <CLI/CLI.hpp>

#include "harness/sim/worker_pool.h"

namespace gatedyno {

struct RunOptions {
  std::string store = "gatedyno.db";
  std::vector<std::string> reuse;
  std::optional<std::string> json;
  std::optional<std::string> csv;
  int workers = 0;
  std::uint64_t worker_memory_bytes = PoolOptions().memory_limit_bytes;
  std::optional<double> time_limit_s;
};

// `options` outlives the parse.
void AddRunOptions(CLI::App& app, RunOptions& options);

PoolOptions PoolOptionsOf(const RunOptions& options);

}  // namespace gatedyno

#endif  // GATEDYNO_CLI_RUN_OPTIONS_H_
