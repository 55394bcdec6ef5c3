// gatedyno task: what Slurm starts on a node, one share of a farm's jobs.

#include <chrono>
#include <cstdint>
#include <cstdlib>
#include <memory>
#include <optional>
#include <string>

#include "harness/cli/commands.h"
#include "harness/farm/held_termination.h"
#include "harness/farm/task.h"

namespace gatedyno {
namespace {

constexpr int kMostWorkers = 1024;

struct Options {
  std::string folder;
  std::string round;
  int share = 0;
  int workers = 0;
  std::string worker_program;
  std::optional<std::uint64_t> worker_memory_bytes;
  std::string simulator;
  double publish_every_s = 0.0;
};

// Slurm's own count of the processors this task may use on this node.
int ProcessorsGiven() {
  const char* given = std::getenv("SLURM_CPUS_ON_NODE");
  const int count = given == nullptr ? 0 : std::atoi(given);
  return count >= 1 && count <= kMostWorkers ? count : 1;
}

Result<ExitCode> Run(const Options& options) {
  HoldTermination();
  TaskOptions task;
  task.folder = options.folder;
  task.round = options.round;
  task.share = options.share;
  task.workers = options.workers > 0 ? options.workers : ProcessorsGiven();
  task.worker_program = options.worker_program;
  task.memory_limit_bytes = options.worker_memory_bytes;
  task.simulator = options.simulator;
  task.publish_every = std::chrono::duration_cast<std::chrono::milliseconds>(
      std::chrono::duration<double>(options.publish_every_s));
  task.should_stop = TerminationAsked;
  const Result<TaskEnd> end = RunTask(task);
  if (!end.ok()) {
    return Forward(end);
  }
  return *end == TaskEnd::kComplete ? kAllWithin : kStoppedEarly;
}

}  // namespace

Command TaskCommand() {
  Command command;
  command.name = "task";
  command.summary = "work one share of a farm's jobs (started by Slurm)";
  command.hidden = true;
  command.add = [](CLI::App& app) -> Action {
    constexpr double kLeastPublish_s = 0.05;
    constexpr double kMostPublish_s = 86'400.0;
    constexpr int kMostShares = 10'000'000;
    const auto options = std::make_shared<Options>();
    options->publish_every_s = 30.0;
    app.add_option("folder", options->folder, "the farm's folder")->required();
    app.add_option("round", options->round, "a round in it")->required();
    app.add_option("share", options->share, "number of the share")
        ->required()
        ->check(CLI::Range(0, kMostShares));
    app.add_option("--workers",
                   options->workers,
                   "simulator processes (default: one a processor given)")
        ->check(CLI::Range(1, kMostWorkers));
    app.add_option("--worker-program",
                   options->worker_program,
                   "another than the one installed");
    app.add_option("--worker-memory-bytes",
                   options->worker_memory_bytes,
                   "address space of each worker");
    app.add_option("--simulator",
                   options->simulator,
                   "the one this node must have, in its own words");
    app.add_option("--publish-every",
                   options->publish_every_s,
                   "seconds between two result files")
        ->check(CLI::Range(kLeastPublish_s, kMostPublish_s));
    return [options] { return Run(*options); };
  };
  return command;
}

}  // namespace gatedyno
