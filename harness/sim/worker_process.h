// One worker: a child process and its private pipes.
//
// Passive: it never waits for the worker, except in Finish().  The pool owns
// the only loop, asks what to watch, and calls Exchange() when something moved.
// No other child of this program inherits the pipes.

#ifndef GATEDYNO_SIM_WORKER_PROCESS_H_
#define GATEDYNO_SIM_WORKER_PROCESS_H_

#include <chrono>
#include <filesystem>
#include <memory>
#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include <poll.h>

#include "harness/base/result.h"
#include "harness/sim/descriptor.h"
#include "harness/sim/frame.h"

namespace gatedyno {

struct ProcessEnd {
  // "left with exit code 3", "was killed by SIGSEGV", followed by the end of
  // what it wrote to its standard error.
  std::string words;
  // By a signal that a program does not send itself: an operator, the system
  // short of memory, a batch system.
  bool taken_away = false;
};

class WorkerProcess {
 public:
  // Fails, naming the program, when it cannot be executed.  The worker is told
  // nothing yet, and may still die before its hello.
  static Result<std::unique_ptr<WorkerProcess>> Start(
      const std::filesystem::path& program,
      const std::vector<std::string>& arguments);

  // Kills the worker if it still runs, and reaps it.
  ~WorkerProcess();
  WorkerProcess(const WorkerProcess&) = delete;
  WorkerProcess& operator=(const WorkerProcess&) = delete;

  // Queues one frame; Exchange() moves it.
  // REQUIRES: text.size() <= kMaxFrameBytes.
  void Send(std::string_view text);

  // Appends the descriptors worth polling now.
  void AppendWatched(std::vector<pollfd>* watched) const;

  // Writes and reads whatever is possible without waiting.
  // REQUIRES: SIGPIPE does not end this program (sim/sigpipe_guard.h).
  void Exchange();

  // The next whole text the worker sent.  Fails when it babbles or stopped
  // inside a frame.
  Result<std::optional<std::string>> Receive();

  // Nothing more will come from the worker.
  bool output_ended() const { return !output_.is_open(); }

  // Tells the worker that there is no more work.
  void CloseInput() { input_.Close(); }

  // Waits `grace` for the worker to leave, then kills it.
  ProcessEnd Finish(std::chrono::milliseconds grace);

  pid_t pid() const;

 private:
  struct Child;  // The process library's handle.

  WorkerProcess() = default;

  void WriteQueued();
  void ReadFrames();
  void ReadComplaints();

  std::unique_ptr<Child> child_;
  Descriptor input_;       // The worker's standard input.
  Descriptor output_;      // Its standard output.
  Descriptor complaints_;  // Its standard error.
  std::string queued_;     // Still to be written to input_.
  FrameReader frames_;
  std::string complaint_tail_;
};

}  // namespace gatedyno

#endif  // GATEDYNO_SIM_WORKER_PROCESS_H_
