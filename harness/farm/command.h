// Runs one command to its end, and no longer than a limit.

#ifndef GATEDYNO_FARM_COMMAND_H_
#define GATEDYNO_FARM_COMMAND_H_

#include <chrono>
#include <string>
#include <vector>

#include "harness/base/result.h"

namespace gatedyno {

struct CommandEnd {
  int exit_code = 0;  // 128 + the signal's number where one ended it.
  std::string output;
  std::string complaints;  // What it wrote to its standard error.
};

// `program` is searched for on PATH, and gets no input.  It does not see the
// terminal's Ctrl-C.  Fails where it is not there, cannot be started, or is not
// done within `limit`: then it is killed, with all it started.
Result<CommandEnd> RunCommand(const std::string& program,
                              const std::vector<std::string>& arguments,
                              std::chrono::milliseconds limit);

}  // namespace gatedyno

#endif  // GATEDYNO_FARM_COMMAND_H_
