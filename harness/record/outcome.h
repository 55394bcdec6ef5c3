// How a job ended.

#ifndef GATEDYNO_RECORD_OUTCOME_H_
#define GATEDYNO_RECORD_OUTCOME_H_

#include <map>
#include <optional>
#include <string>
#include <string_view>

#include "harness/record/waveform.h"

namespace gatedyno {

enum class Ending { kMeasured, kFailed, kTimedOut, kCrashed };

struct Outcome {
  Ending ending = Ending::kFailed;
  // By Interval::name, seconds; filled only when measured.
  std::map<std::string, double> values_s;
  // The simulator's words, or what killed the worker; empty when measured.
  std::string message;
  double simulator_s = 0.0;  // Processor time spent inside the simulator.
  int rung = 0;              // Of Job::settings, in the attempt that ended it.
  std::optional<Waves> waves = std::nullopt;  // Asked for, and measured.

  bool measured() const { return ending == Ending::kMeasured; }
};

std::string_view EndingName(Ending ending);

}  // namespace gatedyno

#endif  // GATEDYNO_RECORD_OUTCOME_H_
