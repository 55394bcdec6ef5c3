// A release decision as JSON, all digits, for what acts on it.
//
//   {"format": "gatedyno-release/1", "decision": "yes" or "no",
//    "date", "plan", "store", "title", "node", "simulator", "program",
//    "tolerances": {"effort", "parasitic", "rules": [...]},
//    "arcs": {"all", "within", "beyond", "not_measured", "bent"},
//    "missing_jobs": at least so many,
//    "reasons_of_the_run": [text],
//    "reasons": [{"arc": {...}, "corner", "kind", "quantity", "text",
//                 "expired_exemption": place in exemptions}],
//    "excused": [{"arc", "corner", "kind", "quantity", "text", "exemption"}],
//    "exemptions": [{as in the plan, "state", "arcs", "arcs_in_need"}],
//    "baseline": {"store", "run", "arcs", "only_before", "only_now",
//                 "moved": [{"arc", "corner", "finding", "verdict_before",
//                            "verdict", "effort": {"before", "after",
//                            "relative", "expanded"}, "parasitic": same}]}}
//
// "kind" is "beyond", "too uncertain" or "not measured".  Arcs and numbers with
// uncertainty are written as in record/comparison_json.h, rules and exemptions
// as in record/agreement_json.h.  What is not there is null: "quantity" where
// the whole arc is meant, "baseline" where none was named.

#ifndef GATEDYNO_REPORT_RELEASE_JSON_H_
#define GATEDYNO_REPORT_RELEASE_JSON_H_

#include <string>

#include "harness/report/release_report.h"

namespace gatedyno {

// Indented, with a line end.  Bytes of names that are no UTF-8 are replaced.
std::string ReleaseJson(const ReleaseReport& report);

}  // namespace gatedyno

#endif  // GATEDYNO_REPORT_RELEASE_JSON_H_
