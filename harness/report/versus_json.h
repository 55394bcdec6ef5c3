// Two runs side by side as JSON, all digits.
//
//   {"format": "gatedyno-versus/1",
//    "a": {"store", "run", "title", "node", "started", "simulator", "program",
//          "accuracy"}, "b": the same,
//    "corners": [{"a": calibration, "b": calibration}],
//    "spread": {"g": {"count", "mean", "deviation", "within_10_percent"},
//               "p": ..., "p_in_p_inv": ...},
//    "arcs": [{"arc": {...}, "corner_a", "corner_b", "finding",
//              "a": {"effort", "parasitic", "effort_by_hand",
//                    "parasitic_by_hand", "bent", "verdict", "reason"},
//              "b": the same,
//              "effort_change": {"relative", "expanded"},
//              "parasitic_change": the same}],
//    "only_a": [{"arc": {...}, "corner"}], "only_b": the same}
//
// Arcs, calibrations and numbers with uncertainty are written as in
// record/comparison_json.h; a calibration that is not there is null, and so is
// what is not known or not measured.

#ifndef GATEDYNO_REPORT_VERSUS_JSON_H_
#define GATEDYNO_REPORT_VERSUS_JSON_H_

#include <string>

#include "harness/report/versus_view.h"

namespace gatedyno {

// Indented, with a line end.  Bytes of names that are no UTF-8 are replaced.
std::string VersusJson(const VersusView& view);

}  // namespace gatedyno

#endif  // GATEDYNO_REPORT_VERSUS_JSON_H_
