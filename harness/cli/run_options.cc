#include "harness/cli/run_options.h"

#include "harness/cli/value_kind.h"

namespace gatedyno {

void AddRunOptions(CLI::App& app, RunOptions& options) {
  constexpr int kMostWorkers = 1024;
  app.add_option("--store",
                 options.store,
                 "file that keeps every outcome (default: gatedyno.db)")
      ->type_name(kFile);
  app.add_option("--reuse",
                 options.reuse,
                 "another store whose measured jobs are taken, repeatable")
      ->type_name(kFile)
      ->allow_extra_args(false);
  app.add_option("--json", options.json, "write the run as JSON")
      ->type_name(kFile);
  app.add_option("--csv", options.csv, "write the run as CSV")
      ->type_name(kFile);
  app.add_option("--workers",
                 options.workers,
                 "simulator processes (default: one a processor)")
      ->check(CLI::Range(1, kMostWorkers));
  app.add_option("--worker-memory",
                 options.worker_memory_bytes,
                 "most a simulator process may take, 512M for example "
                 "(default: 4G)")
      ->transform(CLI::AsSizeValue(/*kb_is_1000=*/false));
  app.add_option("--time-limit",
                 options.time_limit_s,
                 "seconds before a silent simulator is replaced (default: an "
                 "estimate for each job)")
      ->check(CLI::PositiveNumber);
}

PoolOptions PoolOptionsOf(const RunOptions& options) {
  PoolOptions pool;
  pool.workers = options.workers;
  pool.memory_limit_bytes = options.worker_memory_bytes;
  return pool;
}

}  // namespace gatedyno
