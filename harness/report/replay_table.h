// A job of the store, how it ended, and what it gives when run again.

#ifndef GATEDYNO_REPORT_REPLAY_TABLE_H_
#define GATEDYNO_REPORT_REPLAY_TABLE_H_

#include <cstddef>
#include <string>

#include "harness/store/store.h"

namespace gatedyno {

// Label, key, and how the job ended last, in the simulator's words:
//
//   nand2 a->y h=4 typical
//     key 7c21...
//     failed at rung 1, 2026-03-01 21:30:02 UTC: timestep too small
std::string StoredJobText(const StoredJob& stored);

// Each interval now and as stored, or why there is nothing:
//
//   again at rung 1:
//     interval          now      stored  difference
//     delay_rise   12.34 ps    12.34 ps        same
std::string ReplayTable(const StoredJob& stored,
                        size_t rung,
                        const Outcome& again);

}  // namespace gatedyno

#endif  // GATEDYNO_REPORT_REPLAY_TABLE_H_
