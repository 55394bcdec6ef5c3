// Which simulator a worker program brings.

#ifndef GATEDYNO_SIM_SIMULATOR_IDENTITY_H_
#define GATEDYNO_SIM_SIMULATOR_IDENTITY_H_

#include <filesystem>
#include <string>

#include "harness/base/result.h"
#include "harness/sim/protocol.h"

namespace gatedyno {

// Starts the worker program only to hear its hello.  Fails naming the program
// and its last words.
Result<Hello> AskWorker(const std::filesystem::path& worker_program);

// Name and version in the simulator's own words; part of every job's key.
Result<std::string> SimulatorIdentity(
    const std::filesystem::path& worker_program);

}  // namespace gatedyno

#endif  // GATEDYNO_SIM_SIMULATOR_IDENTITY_H_
