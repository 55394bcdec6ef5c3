// Waiting for file descriptors, up to a moment.

#ifndef GATEDYNO_SIM_POLL_UNTIL_H_
#define GATEDYNO_SIM_POLL_UNTIL_H_

#include <chrono>
#include <optional>
#include <vector>

#include <poll.h>

namespace gatedyno {

// Returns when any of `watched` moved, or at `deadline`, or now and then for
// no reason (a signal, a minute gone): the caller looks again.
void PollUntil(std::vector<pollfd>* watched,
               std::optional<std::chrono::steady_clock::time_point> deadline);

}  // namespace gatedyno

#endif  // GATEDYNO_SIM_POLL_UNTIL_H_
