// The sample run with exemptions of every state.

#ifndef GATEDYNO_TESTS_REPORT_EXEMPT_RUN_H_
#define GATEDYNO_TESTS_REPORT_EXEMPT_RUN_H_

#include "harness/record/run_result.h"
#include "tests/report/sample_run.h"

namespace gatedyno {

// As of kToday: one in force for BeyondRow, one expired for what was not
// measured, one not needed, one that covers no arc.
inline RunResult ExemptRun() {
  RunResult result = SampleRun();
  result.facts.tolerance_rules = {
      {.where = {.cells = "nor*", .edge = Edge::kRise},
       .effort = 0.3,
       .parasitic = 0.5},
      {.where = {.corners = "slow_*", .edge = {}},
       .effort = {},
       .parasitic = 0.4}};
  result.facts.exemptions = {
      {.where = {.cells = "nand2", .pins = "b", .edge = Edge::kFall},
       .quantity = Quantity::kEffort,
       .reason = "skewed on purpose",
       .author = "M. Ober",
       .expires = "2027-03-31"},
      {.where = {.cells = "nand2", .edge = Edge::kRise},
       .quantity = {},
       .reason = "waits for new models",
       .author = "library lead",
       .expires = "2026-01-31"},
      {.where = {.cells = "inv", .edge = {}},
       .quantity = Quantity::kParasitic,
       .reason = "long output wire",
       .author = "M. Ober",
       .expires = "2026-12-02"},
      {.where = {.cells = "nadn2", .edge = {}},
       .quantity = {},
       .reason = "misspelt",
       .author = "M. Ober",
       .expires = "2027-03-31"}};
  return result;
}

inline constexpr const char* kExemptNote =
    "g exempt until 2027-03-31: skewed on purpose (M. Ober)";
inline constexpr const char* kExpiredNote =
    "was exempt until 2026-01-31: waits for new models (library lead)";

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_REPORT_EXEMPT_RUN_H_
