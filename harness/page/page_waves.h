// The page's waveforms, where they were asked for: the crossings and the
// intervals between them as tables, which the script adds the pictures to.

#ifndef GATEDYNO_PAGE_PAGE_WAVES_H_
#define GATEDYNO_PAGE_PAGE_WAVES_H_

#include <span>
#include <string>

#include "harness/record/arc_waves.h"
#include "harness/record/run_result.h"

namespace gatedyno {

// A simulation that gives another delay, by more than this part of it, is not
// the one the run made.
inline constexpr double kSameDelay = 1e-6;

// The section, and the link to it; both empty where there are no waves.  An
// arc that has none says why.
std::string WavesSection(std::span<const ArcWaves> waves,
                         const RunResult& result);
std::string WavesLink(std::span<const ArcWaves> waves);

}  // namespace gatedyno

#endif  // GATEDYNO_PAGE_PAGE_WAVES_H_
