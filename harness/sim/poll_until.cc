#include "harness/sim/poll_until.h"

#include <algorithm>

namespace gatedyno {

void PollUntil(std::vector<pollfd>* watched,
               std::optional<std::chrono::steady_clock::time_point> deadline) {
  using std::chrono::milliseconds;
  constexpr milliseconds kLongestWait(60'000);
  milliseconds wait = kLongestWait;
  if (deadline.has_value()) {
    const auto left = std::chrono::ceil<milliseconds>(
        *deadline - std::chrono::steady_clock::now());
    wait = std::clamp(left, milliseconds(0), kLongestWait);
  }
  ::poll(watched->data(), watched->size(), static_cast<int>(wait.count()));
}

}  // namespace gatedyno
