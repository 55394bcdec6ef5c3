// Rows with something wrong, and exemptions, for the tests of both.

#ifndef GATEDYNO_TESTS_COMPARE_EXEMPT_ROWS_H_
#define GATEDYNO_TESTS_COMPARE_EXEMPT_ROWS_H_

#include <optional>
#include <string>

#include "harness/record/comparison.h"
#include "harness/record/exemption.h"

namespace gatedyno {

// What Compare makes of a difference `d` with uncertainty `u`, by figure;
// allowed are 25 % of g and 35 % of p.  "nand2 a->y rise".
struct Differences {
  double g = 0.0;
  std::optional<double> g_u = 0.01;
  double p = 0.0;
  std::optional<double> p_u = 0.01;
};

inline Comparison RowOf(const Differences& d, Verdict verdict) {
  Comparison row;
  row.arc = {.cell = "nand2",
             .pin = "a",
             .output = "y",
             .input_edge = Edge::kFall,
             .edge = Edge::kRise,
             .side = {{"b", true}}};
  row.corner = "typical";
  row.estimate.effort = 1.0;
  row.hand_parasitic = 2.0;
  row.line = Line{.slope_s = 1e-12, .points = 3};
  row.effort = {1.0 + d.g, 0.001};
  row.parasitic = {2.0 * (1.0 + d.p), 0.001};
  row.effort_difference = d.g;
  row.parasitic_difference = d.p;
  row.effort_difference_expanded = d.g_u;
  row.parasitic_difference_expanded = d.p_u;
  row.verdict = verdict;
  row.reason = verdict == Verdict::kWithin ? "" : "the row's own reason";
  return row;
}

inline Comparison WithinRow() {
  return RowOf({}, Verdict::kWithin);
}
inline Comparison EffortBeyondRow() {
  return RowOf({.g = 0.5}, Verdict::kBeyond);
}
inline Comparison ParasiticBeyondRow() {
  return RowOf({.p = -0.5}, Verdict::kBeyond);
}
inline Comparison BothBeyondRow() {
  return RowOf({.g = 0.5, .p = -0.5}, Verdict::kBeyond);
}
inline Comparison BeyondAndUncertainRow() {
  return RowOf({.g = 0.5, .p = 0.1, .p_u = 0.6}, Verdict::kBeyond);
}
inline Comparison DoubtfulRow() {
  return RowOf({.g = 0.1, .g_u = 0.3}, Verdict::kNotMeasured);
}
inline Comparison WithoutUncertaintyRow() {
  return RowOf({.g = 0.5, .p_u = std::nullopt}, Verdict::kNotMeasured);
}
inline Comparison WithoutLineRow() {
  Comparison row = RowOf({}, Verdict::kNotMeasured);
  row.line.reset();
  row.effort_difference_expanded.reset();
  row.parasitic_difference_expanded.reset();
  row.reason = "h=3: timed out: after 60 s";
  return row;
}

inline Exemption ExemptionFor(std::optional<Quantity> quantity,
                              const std::string& expires = "2027-03-31",
                              const ArcPattern& where = {}) {
  return {.where = where,
          .quantity = quantity,
          .reason = "known",
          .author = "M. Ober",
          .expires = expires};
}

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_COMPARE_EXEMPT_ROWS_H_
