#include "harness/sim/simulator_identity.h"

#include <chrono>
#include <vector>

#include <fmt/format.h>

#include "harness/sim/poll_until.h"
#include "harness/sim/pool_worker.h"
#include "harness/sim/sigpipe_guard.h"

namespace gatedyno {

Result<Hello> AskWorker(const std::filesystem::path& worker_program) {
  constexpr std::chrono::milliseconds kLeaveGrace(1000);
  const SigpipeGuard guard;
  Result<PoolWorker> worker = PoolWorker::Start(worker_program, {});
  if (!worker.ok()) {
    return Forward(worker);
  }
  Status greeting = worker->Greet();
  while (greeting.ok() && worker->awaits_greeting()) {
    std::vector<pollfd> watched;
    worker->process().AppendWatched(&watched);
    PollUntil(&watched, worker->deadline());
    greeting = worker->Greet();
  }
  if (!worker->greeted()) {
    return Unavailable(fmt::format(
        "{}: {}", worker_program.string(), worker->EndUngreeted(greeting)));
  }
  worker->process().Finish(kLeaveGrace);
  return worker->hello();
}

Result<std::string> SimulatorIdentity(
    const std::filesystem::path& worker_program) {
  const Result<Hello> hello = AskWorker(worker_program);
  return hello.ok() ? Result<std::string>(hello->simulator) : Forward(hello);
}

}  // namespace gatedyno
