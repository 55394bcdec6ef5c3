// One task of a farm: works one share on this machine's workers.

#ifndef GATEDYNO_FARM_TASK_H_
#define GATEDYNO_FARM_TASK_H_

#include <chrono>
#include <cstdint>
#include <filesystem>
#include <functional>
#include <optional>
#include <string>

#include "harness/base/result.h"

namespace gatedyno {

struct TaskOptions {
  std::filesystem::path folder;  // The farm's.
  std::string round;             // "round-3f9a1c22".
  int share = 0;
  int workers = 1;
  std::filesystem::path worker_program;  // Empty: the one installed with us.
  std::optional<std::uint64_t> memory_limit_bytes;  // See PoolOptions.
  // What WorkerPool::Simulator() must say here; empty: anything.  Part of the
  // jobs' keys, and so of what their outcomes are taken for.
  std::string simulator;
  // A task that is killed loses at most what it did in this time.
  std::chrono::milliseconds publish_every{30'000};
  // Asked often, from two threads.  Once true, what is done is published at
  // once, no job is begun any more, and those with workers end.
  std::function<bool()> should_stop;
};

enum class TaskEnd {
  kComplete,  // All the share's jobs are published.
  kStopped,   // The rest is to be run by another task.
};

// Runs what no other task has published of the share, and publishes it.  Where
// that fails, what was done till then is published if at all possible.
Result<TaskEnd> RunTask(const TaskOptions& options);

}  // namespace gatedyno

#endif  // GATEDYNO_FARM_TASK_H_
