// Pipes between this program and a child, closed in every other child.

#ifndef GATEDYNO_SIM_PIPE_H_
#define GATEDYNO_SIM_PIPE_H_

#include <string>
#include <string_view>

#include "harness/base/result.h"
#include "harness/sim/descriptor.h"

namespace gatedyno {

struct Pipe {
  Descriptor read_end;
  Descriptor write_end;
};

// Both ends are closed on exec, and neither is one of 0, 1, 2, so that a child
// can be given them there.
Result<Pipe> MakePipe();

Status SetNonBlocking(const Descriptor& descriptor);

enum class PipeState { kOpen, kEnded };

// Reads all there is into `bytes`; kEnded when no more can come.
// REQUIRES: `end` does not block.
PipeState ReadAvailable(const Descriptor& end, std::string* bytes);

// Writes what fits and removes it from `bytes`; kEnded when nobody reads.
// REQUIRES: `end` does not block; SIGPIPE does not end this program.
PipeState WriteAvailable(const Descriptor& end, std::string* bytes);

}  // namespace gatedyno

#endif  // GATEDYNO_SIM_PIPE_H_
