// What the program's exit tells a script.

#ifndef GATEDYNO_CLI_EXIT_CODE_H_
#define GATEDYNO_CLI_EXIT_CODE_H_

#include "harness/base/result.h"

namespace gatedyno {

enum ExitCode : int {
  kAllWithin = 0,       // Everything asked for was done, and is within; of a
                        // release: yes.
  kSomeBeyond = 1,      // Measured, and somewhere beyond the tolerance or too
                        // uncertain to tell; of a release: no.
  kBadUsage = 2,        // An option, netlist, node or plan is wrong.
  kNotAllMeasured = 3,  // Jobs that could not be measured.
  kOwnFault = 4,        // Ours, or the system's.
  kStopped = 5,         // By Ctrl-C; the same command goes on.
  // A farm's task that was told to stop: what is done is published, the rest is
  // to be run again (sysexits.h: EX_TEMPFAIL).
  kStoppedEarly = 75,
};

inline ExitCode ExitCodeOf(const Error& error) {
  return error.kind == ErrorKind::kBadInput ? kBadUsage : kOwnFault;
}

}  // namespace gatedyno

#endif  // GATEDYNO_CLI_EXIT_CODE_H_
