// Times and levels read off a waveform.
//
// Between two time points a waveform is the cubic that passes through both with
// the slopes there (cubic Hermite interpolation); the slope at a point is that
// of the parabola through it and its neighbours.  The simulator's own .meas
// draws a straight line, which at steps as long as the settings allow costs a
// third of the accuracy: tried on 86 delays at 45 nm, 0.14 % at worst against
// 0.10 %, root mean square 0.065 % against 0.047 %.

#ifndef GATEDYNO_WORKER_WAVEFORM_H_
#define GATEDYNO_WORKER_WAVEFORM_H_

#include "harness/base/result.h"
#include "harness/record/job.h"
#include "harness/record/waveform.h"

namespace gatedyno {

// Between the neighbours with v0 < level <= v1 (a rise) or v0 > level >= v1 (a
// fall) for the `occurrence`-th time.  Fails, with the levels reached, when
// there are fewer.
// REQUIRES: crossing.net == waveform.net; crossing.occurrence >= 1.
Result<double> CrossingTime(const Waveform& waveform, const Crossing& crossing);

// Fails when v(net) does not go below and above what it must.
// REQUIRES: swing.net == waveform.net.
Status CheckSwing(const Waveform& waveform, const SwingCheck& swing);

}  // namespace gatedyno

#endif  // GATEDYNO_WORKER_WAVEFORM_H_
