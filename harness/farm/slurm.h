// Slurm, through the commands every installation has: scontrol, sbatch, squeue
// and scancel.  Tried with 22.05.
//
// What they say is a hint.  A controller that died at the wrong moment forgets
// a task that then runs on by itself; a task may run twice; one cancelled while
// pending leaves no trace; states name no reason.  So nothing here tells how a
// task ended: only what it published does (round_folder.h).

#ifndef GATEDYNO_FARM_SLURM_H_
#define GATEDYNO_FARM_SLURM_H_

#include <chrono>
#include <span>
#include <string>
#include <vector>

#include "harness/base/result.h"

namespace gatedyno {

struct ArrayRequest {
  std::string queue_name;
  std::vector<int> indices;  // Ascending.
  std::string command;       // Shell text; one task runs it for its index.
  std::string log_pattern;
  std::vector<std::string> arguments;  // For sbatch, of the user's choice.
};

struct QueuedTask {
  std::string queue_name;
  int index = 0;
  std::string array;  // Slurm's number of the array.
  // Slurm could not start it and holds it back until someone looks.
  bool failed_to_launch = false;
};

class Slurm {
 public:
  explicit Slurm(std::chrono::milliseconds command_limit)
      : limit_(command_limit) {}

  // An array holds indices below this.
  Result<int> MaxArraySize() const;

  // Returns the array's number.
  Result<std::string> Submit(const ArrayRequest& request) const;

  // What waits, runs or is ending of the arrays so named, one entry a task.
  Result<std::vector<QueuedTask>> Queue(
      std::span<const std::string> queue_names) const;

  // Ends all of these; those that run are told first (TERM).  None there is
  // fine.
  Status Cancel(std::span<const std::string> queue_names) const;
  Status CancelTask(const QueuedTask& task) const;

 private:
  Result<std::string> Ask(const std::string& program,
                          const std::vector<std::string>& arguments) const;

  std::chrono::milliseconds limit_;
};

}  // namespace gatedyno

#endif  // GATEDYNO_FARM_SLURM_H_
