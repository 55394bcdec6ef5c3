// What a picture of an arc's waveforms is drawn from, and its table told by.

#ifndef GATEDYNO_PAGE_WAVE_VIEW_H_
#define GATEDYNO_PAGE_WAVE_VIEW_H_

#include <optional>
#include <string>

#include "harness/record/arc_waves.h"
#include "harness/record/run_result.h"

namespace gatedyno {

// Times are those of the deck.
struct WaveView {
  double zero_s = 0.0;  // Where the delay begins: the picture's time zero.
  // The picture's ends: all the arc's crossings, and half their span more on
  // either side for the rails that the edges come from and go to; wider where
  // the hand delay ends later, and no wider than what was simulated.
  double from_s = 0.0;
  double to_s = 0.0;
  double delay_s = 0.0;
  std::optional<double> supply_v;      // None where the corner is not known.
  std::optional<double> hand_delay_s;  // Of the hand line, at this fanout.
};

// REQUIRES: waves.trouble.empty().
WaveView ViewOf(const ArcWaves& waves, const RunResult& result);

// The name of a net for the reader of the netlist: the arc's pin for the net
// that its delay begins on, the output for the one it ends on.
std::string NetName(const std::string& net,
                    const ArcWaves& waves,
                    const Arc& arc);

// "delay", "transition of a".
std::string IntervalTitle(const SeenInterval& seen,
                          const ArcWaves& waves,
                          const Arc& arc);

}  // namespace gatedyno

#endif  // GATEDYNO_PAGE_WAVE_VIEW_H_
