// Ctrl-C: once to stop when the jobs in flight have ended, twice to stop at
// once.  TERM counts the same.

#ifndef GATEDYNO_CLI_INTERRUPT_H_
#define GATEDYNO_CLI_INTERRUPT_H_

namespace gatedyno {

// From now on the first signal is only noted, and says so on standard error.
void CatchInterrupts();

bool Interrupted();

}  // namespace gatedyno

#endif  // GATEDYNO_CLI_INTERRUPT_H_
