// A waveform with fewer points that looks the same.

#ifndef GATEDYNO_PAGE_THIN_OUT_H_
#define GATEDYNO_PAGE_THIN_OUT_H_

#include "harness/record/waveform.h"

namespace gatedyno {

// Less than a pixel of a picture of a supply, and a tenth of what could be
// mistaken for a feature of the circuit.
inline constexpr double kUnseenV = 1e-3;

// Those points of `waveform` from `from_s` to `to_s`, and the next one on
// either side, without which straight lines would depart from one of them by
// more than `tolerance_v`: of a stretch, the point furthest from the chord is
// kept until none is too far (Ramer 1972, Douglas and Peucker 1973), with the
// distance in volts at the point's time.
// REQUIRES: from_s < to_s; the waveform has a point.
Waveform ThinOut(const Waveform& waveform,
                 double from_s,
                 double to_s,
                 double tolerance_v = kUnseenV);

}  // namespace gatedyno

#endif  // GATEDYNO_PAGE_THIN_OUT_H_
