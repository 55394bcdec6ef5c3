// What the page's script draws waveforms from.

#ifndef GATEDYNO_PAGE_WAVES_DATA_H_
#define GATEDYNO_PAGE_WAVES_DATA_H_

#include <span>
#include <string>

#include "harness/record/arc_waves.h"
#include "harness/record/run_result.h"

namespace gatedyno {

// JSON text, one element an arc that has waveforms:
//
//   [{"place": in the run's comparisons,
//     "view": [from, to], "supply": volts or null,
//     "hand": [delay, "12.3 ps"] or null,
//     "nets": [{"name": "a", "line": [[time, volts] ...]} ...],
//     "marks": [{"name": "delay", "text": "12.3 ps",
//                "from": [place in nets, time, volts, "rise"],
//                "to": the same} ...]} ...]
//
// The delay is the first of the marks.  Times are in picoseconds from where it
// begins, to 0.001 ps; volts to 0.1 mV.  Lines are thinned out, and only as
// long as the view (page/thin_out.h).
std::string WavesData(std::span<const ArcWaves> waves, const RunResult& result);

}  // namespace gatedyno

#endif  // GATEDYNO_PAGE_WAVES_DATA_H_
