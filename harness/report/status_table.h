// The runs of a store for the terminal, and as JSON.

#ifndef GATEDYNO_REPORT_STATUS_TABLE_H_
#define GATEDYNO_REPORT_STATUS_TABLE_H_

#include <string>

#include <nlohmann/json.hpp>

#include "harness/report/run_status.h"
#include "harness/report/style.h"

namespace gatedyno {

// One block a run, at most 100 columns wide:
//
//   run 3: arbiter, running
//     started 2026-03-01 21:30:02 UTC, 12 min ago
//     1234 of 5600 jobs done, 400 of them taken from stores, 3 failed
//     41/s, 1 min 46 s left
//     34 of 240 arcs ended; last job nand2 a->y h=4 typical
std::string StatusTable(const StoreView& view, const Style& style);

// {"format": "gatedyno-status/1", "store": ..., "runs": [{"run": 3, ...}]}:
// what the table says; null for what is not known or does not apply.
nlohmann::json StatusToJson(const StoreView& view);

}  // namespace gatedyno

#endif  // GATEDYNO_REPORT_STATUS_TABLE_H_
