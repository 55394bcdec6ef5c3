#include "harness/cli/farm_options.h"

#include <fmt/format.h>

#include "harness/cli/value_kind.h"

namespace gatedyno {

void AddFarmOptions(CLI::App& app, FarmCliOptions& options) {
  constexpr int kMostJobs = 1'000'000;
  app.add_option("--farm",
                 options.farm,
                 "where jobs run instead of this machine: slurm")
      ->check(CLI::IsMember({"slurm"}));
  app.add_option("--farm-folder",
                 options.folder,
                 "folder that this machine and all nodes know by this name")
      ->type_name(kFolder);
  app.add_option("--farm-jobs",
                 options.jobs_per_task,
                 "jobs a task, some minutes of work (default: 500)")
      ->check(CLI::Range(1, kMostJobs));
  app.add_option("--farm-sbatch",
                 options.sbatch_arguments,
                 "argument for sbatch, repeatable: --farm-sbatch=--time=60")
      ->allow_extra_args(false);
}

Result<FarmOptions> FarmOptionsOf(const FarmCliOptions& options, int workers) {
  if (options.folder.empty()) {
    return BadInput(
        "--farm: also needs --farm-folder, a folder that all nodes share");
  }
  for (const std::string& argument : options.sbatch_arguments) {
    // Anything else sbatch would take for the script to run.
    if (!argument.starts_with('-')) {
      return BadInput(fmt::format(
          "--farm-sbatch: {}: must begin with -, as in --time=60", argument));
    }
  }
  FarmOptions farm;
  farm.folder = options.folder;
  farm.jobs_per_task = options.jobs_per_task.value_or(farm.jobs_per_task);
  farm.workers_per_task = workers;
  farm.sbatch_arguments = options.sbatch_arguments;
  return farm;
}

Status CheckNoFarmOptions(const FarmCliOptions& options) {
  const char* given = !options.folder.empty()             ? "--farm-folder"
                      : options.jobs_per_task.has_value() ? "--farm-jobs"
                      : !options.sbatch_arguments.empty() ? "--farm-sbatch"
                                                          : nullptr;
  return given == nullptr
             ? Ok()
             : BadInput(fmt::format("{}: only with --farm slurm", given));
}

}  // namespace gatedyno
