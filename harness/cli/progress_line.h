// How far a run is: one live line on a terminal, nothing elsewhere.

#ifndef GATEDYNO_CLI_PROGRESS_LINE_H_
#define GATEDYNO_CLI_PROGRESS_LINE_H_

#include <chrono>

#include "harness/record/run_result.h"

namespace gatedyno {

class ProgressLine {
 public:
  ProgressLine();
  ~ProgressLine();  // Wipes the line.
  ProgressLine(const ProgressLine&) = delete;
  ProgressLine& operator=(const ProgressLine&) = delete;

  void Show(const JobCounts& counts);

 private:
  using Clock = std::chrono::steady_clock;

  bool live_;
  Clock::time_point last_;
};

}  // namespace gatedyno

#endif  // GATEDYNO_CLI_PROGRESS_LINE_H_
