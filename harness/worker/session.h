// The embedded simulator, ngspice.
//
// One per process: the library is global state.  It may also end the process,
// or leave itself unusable; that is why it lives in workers.

#ifndef GATEDYNO_WORKER_SESSION_H_
#define GATEDYNO_WORKER_SESSION_H_

#include <memory>
#include <set>
#include <string>
#include <vector>

#include "harness/base/result.h"
#include "harness/worker/printout.h"
#include "harness/worker/waveform.h"

namespace gatedyno {

class Session {
 public:
  // Starts the simulator with one thread and without anybody's .spiceinit,
  // which would change results unseen.
  // REQUIRES: called once in this process.
  static Result<std::unique_ptr<Session>> Start();

  Session(const Session&) = delete;
  Session& operator=(const Session&) = delete;

  // "ngspice-39, built Sun Feb  5 13:44:35 UTC 2023", in the library's words.
  const std::string& simulator() const { return simulator_; }

  // Runs one deck from nothing and returns v(net) of each of `nets`, in their
  // order.  Fails, in the simulator's words, unless the run made a new
  // transient plot whose last time point reached `stop_s`.
  // REQUIRES: usable().
  Result<std::vector<Waveform>> Run(const std::string& deck,
                                    const std::set<std::string>& nets,
                                    double stop_s);

  // False once the simulator has asked to be unloaded.
  bool usable() const { return usable_; }

  // Processor time of this process spent in the last Run, all of it the
  // simulator's but for copying the waveforms.
  double last_run_s() const { return last_run_s_; }

 private:
  Session() = default;

  // The library's callbacks; `self` is the session.
  static int OnLine(char* line, int id, void* self);
  static int OnExit(
      int status, bool immediate, bool on_quit, int id, void* self);

  void Command(std::string command);
  Status Simulate(const std::string& deck);
  Status CheckReached(double stop_s);
  Result<std::vector<double>> Vector(const std::string& name);
  Result<std::vector<Waveform>> RunAndRead(const std::string& deck,
                                           const std::set<std::string>& nets,
                                           double stop_s);

  Printout printout_;
  std::string simulator_;
  bool usable_ = true;
  double last_run_s_ = 0.0;
};

}  // namespace gatedyno

#endif  // GATEDYNO_WORKER_SESSION_H_
