#include "harness/report/pace.h"

#include <algorithm>
#include <cassert>
#include <cmath>
#include <cstdint>
#include <iterator>

#include <fmt/format.h>

namespace gatedyno {
namespace {

// A duration below `below_s` is given in two units.
struct Scale {
  double below_s;
  std::int64_t large_s;
  std::int64_t small_s;
  const char* large;
  const char* small;
};

constexpr Scale kScales[] = {
    {3600.0, 60, 1, "min", "s"},
    {86'400.0, 3600, 60, "h", "min"},
    {HUGE_VAL, 86'400, 3600, "d", "h"},
};
// Rounding further would not fit an integer, and nobody waits so long.
constexpr double kLongest_s = 1e15;

std::string InUnitsOf(const Scale& scale, double seconds) {
  const std::int64_t smalls =
      std::llround(seconds / static_cast<double>(scale.small_s));
  const std::int64_t per_large = scale.large_s / scale.small_s;
  const std::int64_t larges = smalls / per_large;
  const std::int64_t rest = smalls % per_large;
  if (larges == 0) {
    return fmt::format("{} {}", rest, scale.small);
  }
  const std::string text = fmt::format("{} {}", larges, scale.large);
  return rest == 0 ? text : fmt::format("{} {} {}", text, rest, scale.small);
}

bool KnowsHowMany(const RunProgress& progress) {
  return progress.expected_jobs > 0 &&
         progress.expected_jobs >= JobsDone(progress);
}

std::string TwoDigits(double value) {
  constexpr double kFirstWithTwo = 9.95;  // Shown as 10.
  return fmt::format("{:.{}f}", value, value < kFirstWithTwo ? 1 : 0);
}

}  // namespace

int JobsDone(const RunProgress& progress) {
  return progress.jobs.reused + progress.jobs.simulated;
}

std::optional<double> JobsPerSecond(const RunProgress& progress,
                                    double session_s) {
  if (progress.jobs.simulated == 0 || !(session_s > 0.0)) {
    return std::nullopt;
  }
  return progress.jobs.simulated / session_s;
}

std::optional<double> SecondsLeft(const RunProgress& progress,
                                  double jobs_per_s) {
  assert(jobs_per_s > 0.0);
  if (!KnowsHowMany(progress)) {
    return std::nullopt;
  }
  return (progress.expected_jobs - JobsDone(progress)) / jobs_per_s;
}

std::string JobsText(const RunProgress& progress) {
  const int done = JobsDone(progress);
  return KnowsHowMany(progress)
             ? fmt::format("{} of {} jobs", done, progress.expected_jobs)
             : fmt::format("{} jobs", done);
}

std::string DurationText(double seconds) {
  const double shown = std::clamp(seconds, 0.0, kLongest_s);
  const Scale* scale = std::begin(kScales);
  // What would be rounded up to the next scale belongs there: never "60 min".
  while (std::round(shown / static_cast<double>(scale->small_s)) *
             static_cast<double>(scale->small_s) >=
         scale->below_s) {
    ++scale;
  }
  return InUnitsOf(*scale, shown);
}

std::string RateText(double jobs_per_s) {
  constexpr double kPerMinute = 60.0;
  return jobs_per_s < 1.0 ? TwoDigits(jobs_per_s * kPerMinute) + "/min"
                          : TwoDigits(jobs_per_s) + "/s";
}

}  // namespace gatedyno
