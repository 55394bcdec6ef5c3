// The options that send a run's jobs to a cluster.

#ifndef GATEDYNO_CLI_FARM_OPTIONS_H_
#define GATEDYNO_CLI_FARM_OPTIONS_H_

#include <optional>
#include <string>
#include <vector>

#include <CLI/CLI.hpp>

#include "harness/base/result.h"
#include "harness/farm/slurm_farm.h"

namespace gatedyno {

struct FarmCliOptions {
  std::optional<std::string> farm;  // "slurm"; none: this machine.
  std::string folder;
  std::optional<int> jobs_per_task;
  std::vector<std::string> sbatch_arguments;
};

// `options` outlives the parse.
void AddFarmOptions(CLI::App& app, FarmCliOptions& options);

// Fails, naming the option, where one is missing or makes no sense.  `workers`
// is the run's --workers: that many a task, 0 for as many as Slurm gives it
// processors.  REQUIRES: options.farm.
Result<FarmOptions> FarmOptionsOf(const FarmCliOptions& options, int workers);

// Fails where farm options were given without --farm.
Status CheckNoFarmOptions(const FarmCliOptions& options);

}  // namespace gatedyno

#endif  // GATEDYNO_CLI_FARM_OPTIONS_H_
