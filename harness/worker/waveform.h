// Times and levels read off a waveform.
//
// Between two time points a waveform is a straight line, which is also how the
// simulator's own .meas reads it.

#ifndef GATEDYNO_WORKER_WAVEFORM_H_
#define GATEDYNO_WORKER_WAVEFORM_H_

#include <string>
#include <vector>

#include "harness/base/result.h"
#include "harness/record/job.h"

namespace gatedyno {

// One net's voltage over time.
struct Waveform {
  std::string net;
  std::vector<double> time_s;     // Increasing; at least one.
  std::vector<double> voltage_v;  // As many.
};

// t0 + (level - v0) / (v1 - v0) * (t1 - t0), between the neighbours with
// v0 < level <= v1 (a rise) or v0 > level >= v1 (a fall) for the
// `occurrence`-th time.  Fails, with the levels reached, when there are fewer.
// REQUIRES: crossing.net == waveform.net; crossing.occurrence >= 1.
Result<double> CrossingTime(const Waveform& waveform, const Crossing& crossing);

// Fails when v(net) does not go below and above what it must.
// REQUIRES: swing.net == waveform.net.
Status CheckSwing(const Waveform& waveform, const SwingCheck& swing);

}  // namespace gatedyno

#endif  // GATEDYNO_WORKER_WAVEFORM_H_
