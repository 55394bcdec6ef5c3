#include "harness/farm/task_command.h"

#include <chrono>
#include <string_view>

#include <fmt/format.h>

namespace gatedyno {
namespace {

// 'it'\''s': nothing inside single quotes means anything to a shell.
std::string Quoted(std::string_view text) {
  std::string quoted = "'";
  for (const char c : text) {
    quoted += c == '\'' ? "'\\''" : std::string(1, c);
  }
  return quoted + "'";
}

}  // namespace

std::string TaskShellText(const FarmOptions& options,
                          const RoundFolder& round) {
  const std::chrono::duration<double> publish_s = options.publish_every;
  std::string command = fmt::format(
      "exec {} task {} {} \"$SLURM_ARRAY_TASK_ID\" --publish-every "
      "{}",
      Quoted(options.program.string()),
      Quoted(round.farm().string()),
      round.name(),
      publish_s.count());
  if (options.workers_per_task > 0) {
    command += fmt::format(" --workers {}", options.workers_per_task);
  }
  if (!options.worker_program.empty()) {
    command += " --worker-program " + Quoted(options.worker_program.string());
  }
  if (options.memory_limit_bytes) {
    command +=
        fmt::format(" --worker-memory-bytes {}", *options.memory_limit_bytes);
  }
  if (!options.simulator.empty()) {
    command += " --simulator " + Quoted(options.simulator);
  }
  return command;
}

}  // namespace gatedyno
