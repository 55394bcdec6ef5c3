// What the nets of an arc's cell did in one of its jobs: how a delay came
// about.

#ifndef GATEDYNO_RECORD_ARC_WAVES_H_
#define GATEDYNO_RECORD_ARC_WAVES_H_

#include <cstddef>
#include <string>
#include <vector>

#include "harness/record/job.h"
#include "harness/record/waveform.h"

namespace gatedyno {

// An interval and where it lies on the waveforms.
struct SeenInterval {
  Interval interval;
  double from_s = 0.0;
  double to_s = 0.0;
};

struct ArcWaves {
  std::size_t place = 0;  // In RunResult::comparisons.
  double fanout = 0.0;
  std::string job_key;
  // Why there is nothing to see; the rest is empty then.
  std::string trouble = {};
  // Those of the arc: first its delay, from the input's net to the output's.
  std::vector<SeenInterval> intervals = {};
  std::vector<Waveform> waveforms = {};
  // What the run measured, for who doubts that it was the same simulation.
  double stored_delay_s = 0.0;
};

}  // namespace gatedyno

#endif  // GATEDYNO_RECORD_ARC_WAVES_H_
