#include "harness/farm/slurm_farm.h"

#include <chrono>
#include <system_error>
#include <thread>
#include <utility>

#include <fmt/format.h>

#include "harness/base/install.h"
#include "harness/farm/farm_run.h"
#include "harness/farm/leftovers.h"
#include "harness/store/run_lock.h"

namespace gatedyno {
namespace {

constexpr const char* kProgram = "gatedyno";

// One run at a time.  The lock goes with the process that holds it, but a
// command that one was just starting has it a moment longer.
Result<RunLock> LockFolder(const std::filesystem::path& folder) {
  using Clock = std::chrono::steady_clock;
  constexpr std::chrono::seconds kMoment(1);
  constexpr std::chrono::milliseconds kPause(50);
  const Clock::time_point give_up = Clock::now() + kMoment;
  while (true) {
    Result<RunLock> lock = LockRuns(folder / "farm");
    if (lock.ok()) {
      return lock;
    }
    if (Clock::now() >= give_up) {
      return Unavailable(
          fmt::format("{}: two runs cannot share a farm's folder: {}",
                      folder.string(),
                      lock.error().message));
    }
    std::this_thread::sleep_for(kPause);
  }
}

Status CheckAtLeastOne(const char* name, int value) {
  return value >= 1
             ? Ok()
             : BadInput(fmt::format("{} = {}: must be >= 1", name, value));
}

}  // namespace

Result<SlurmFarm> SlurmFarm::Make(FarmOptions options) {
  for (const Status& check :
       {CheckAtLeastOne("jobs_per_task", options.jobs_per_task),
        CheckAtLeastOne("fruitless_tasks", options.fruitless_tasks)}) {
    if (!check.ok()) {
      return Forward(check);
    }
  }
  if (options.workers_per_task < 0) {
    return BadInput(fmt::format("workers_per_task = {}: must be >= 0",
                                options.workers_per_task));
  }
  std::error_code failed;
  std::filesystem::create_directories(options.folder, failed);
  // Tasks are started elsewhere: a relative name would mean another folder.
  if (!failed) {
    options.folder = std::filesystem::canonical(options.folder, failed);
  }
  if (failed) {
    return Unavailable(fmt::format("{}: the farm's folder cannot be made: {}",
                                   options.folder.string(),
                                   failed.message()));
  }
  if (options.program.empty()) {
    options.program = ProgramFolder() / kProgram;
  }
  return SlurmFarm(std::move(options));
}

SlurmFarm::SlurmFarm(FarmOptions options)
    : options_(std::move(options)), slurm_(options_.command_limit) {}

Status SlurmFarm::Run(JobSource& jobs, const OnOutcome& on_outcome) {
  const Result<RunLock> lock = LockFolder(options_.folder);
  if (!lock.ok()) {
    return Forward(lock);
  }
  if (Status recovered = HandOnLeftovers(options_, slurm_, on_outcome);
      !recovered.ok()) {
    return recovered;
  }
  const Result<int> most_shares = slurm_.MaxArraySize();
  if (!most_shares.ok()) {
    return Forward(most_shares);
  }
  return FarmRun(options_, slurm_, *most_shares, &jobs, on_outcome).Run();
}

Status SlurmFarm::Recover(const OnOutcome& on_outcome) {
  const Result<RunLock> lock = LockFolder(options_.folder);
  return lock.ok() ? HandOnLeftovers(options_, slurm_, on_outcome)
                   : Forward(lock);
}

}  // namespace gatedyno
