#include "harness/flow/accuracy_sample.h"

#include <charconv>
#include <cmath>
#include <numbers>
#include <string_view>

#include "harness/deck/stage_measures.h"
#include "harness/fit/coverage.h"

namespace gatedyno {

bool AccuracySample::Wants(const std::string& job_key) const {
  // Keys are fingerprints, so any of their digits are as good as random.
  constexpr size_t kDigits = 6;
  constexpr int kHexadecimal = 16;
  const std::string_view digits = std::string_view(job_key).substr(0, kDigits);
  unsigned number = 0;
  std::from_chars(
      digits.data(), digits.data() + digits.size(), number, kHexadecimal);
  return number % kOneIn == 0;
}

void AccuracySample::Add(const std::string& job_key,
                         const std::string& label,
                         const Outcome& run,
                         const Outcome& tighter) {
  const auto relative = [&](Edge edge) {
    return DelayOf(run, edge) / DelayOf(tighter, edge) - 1.0;
  };
  changes_[job_key] = {label, {relative(Edge::kRise), relative(Edge::kFall)}};
}

AccuracyCheck AccuracySample::Check() const {
  AccuracyCheck check;
  check.promised = promised_;
  double squares = 0.0;
  for (const auto& [key, change] : changes_) {
    for (const double relative : change.relative) {
      ++check.delays;
      squares += relative * relative;
      if (std::abs(relative) > check.largest) {
        check.largest = std::abs(relative);
        check.worst = change.label;
      }
    }
  }
  if (check.delays > 0) {
    check.rms = std::sqrt(squares / check.delays);
  }
  return check;
}

double AccuracySample::DelayUncertainty() const {
  const AccuracyCheck check = Check();
  if (check.delays == 0) {
    return promised_ / std::numbers::sqrt3;
  }
  constexpr double kManyDegrees = 2.0;
  return check.rms * CoverageFactor(check.delays) / kManyDegrees;
}

}  // namespace gatedyno
