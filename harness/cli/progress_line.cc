#include "harness/cli/progress_line.h"

#include <cstdio>

#include <fmt/format.h>
#include <unistd.h>

namespace gatedyno {
namespace {

constexpr std::chrono::milliseconds kBetween{100};
constexpr const char* kWipe = "\r\x1b[K";

}  // namespace

ProgressLine::ProgressLine() : live_(::isatty(STDERR_FILENO) != 0) {}

ProgressLine::~ProgressLine() {
  if (live_) {
    fmt::print(stderr, "{}", kWipe);
  }
}

void ProgressLine::Show(const JobCounts& counts) {
  const Clock::time_point now = Clock::now();
  if (!live_ || now - last_ < kBetween) {
    return;
  }
  last_ = now;
  fmt::print(stderr,
             "{}{} of {} jobs, {} failed",
             kWipe,
             counts.reused + counts.simulated,
             counts.wanted,
             counts.failed);
  std::fflush(stderr);
}

}  // namespace gatedyno
