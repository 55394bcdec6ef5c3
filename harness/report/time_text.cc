#include "harness/report/time_text.h"

#include <ctime>

#include <fmt/chrono.h>

namespace gatedyno {
namespace {

std::tm UtcOf(UnixMilliseconds at) {
  constexpr UnixMilliseconds kPerSecond = 1000;
  return fmt::gmtime(static_cast<std::time_t>(at / kPerSecond));
}

}  // namespace

std::string TimeText(UnixMilliseconds at) {
  return fmt::format("{:%Y-%m-%d %H:%M:%S} UTC", UtcOf(at));
}

std::string IsoTimeText(UnixMilliseconds at) {
  return fmt::format("{:%Y-%m-%dT%H:%M:%SZ}", UtcOf(at));
}

}  // namespace gatedyno
