// Two runs side by side: node against node, before against after, corner
// against corner.

#ifndef GATEDYNO_COMPARE_VERSUS_H_
#define GATEDYNO_COMPARE_VERSUS_H_

#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include "harness/compare/change.h"
#include "harness/record/quantity.h"
#include "harness/record/run_result.h"

namespace gatedyno {

// A corner of each run.
struct CornerPair {
  std::string a;
  std::string b;
};

// Those that have rows, in the order of the run.
std::vector<std::string> CornersOf(const RunResult& result);

// The corners of equal name; where there is none and each run has but one
// corner, those two.
std::vector<CornerPair> PairCorners(const RunResult& a, const RunResult& b);

// What can be said of an arc that is in both.
enum class Finding {
  kAlike,        // g and p, within the uncertainty of their change.
  kChanged,      // g or p, by more than that.
  kSameJobs,     // The same jobs on both sides, so nothing can have changed.
  kBentApart,    // By more than that, but a bent arc's line hangs on its
                 // fanouts, and those are not the same.
  kUnknown,      // The uncertainty is.
  kNotMeasured,  // Without a line on either side.
};

std::string_view FindingName(Finding finding);  // "alike", "changed", ...

// An arc of both runs: same cell, pin, output, edges and side vector.
struct ArcPair {
  const Comparison* a = nullptr;
  const Comparison* b = nullptr;
  std::optional<Change> effort;     // None where not measured on both sides.
  std::optional<Change> parasitic;  // In tau of its own corner.
  // In p_inv of its own corner; without an uncertainty, as that of p holds
  // p_inv's in part.  None without both p_inv.
  std::optional<Change> parasitic_in_p_inv;
  Finding finding = Finding::kNotMeasured;

  bool measured() const { return a->line && b->line; }
  bool changed() const { return finding == Finding::kChanged; }
  bool verdicts_differ() const { return a->verdict != b->verdict; }
};

const std::optional<Change>& ChangeIn(const ArcPair& pair, Quantity quantity);

// The hand g of both sides are not the same to three decimals, as where the
// cell was resized: then a change of g is meant.
bool HandEffortDiffers(const ArcPair& pair);

// Of the corner; null where it has none.
const Calibration* CalibrationAt(const std::string& corner,
                                 const RunResult& result);

struct Versus {
  std::vector<CornerPair> corners;
  std::vector<ArcPair> arcs;              // In the order of a.
  std::vector<const Comparison*> only_a;  // At the corners compared.
  std::vector<const Comparison*> only_b;
};

// The rows pointed to are those of `a` and `b`, which outlive the result.
Versus PutSideBySide(const RunResult& a,
                     const RunResult& b,
                     std::vector<CornerPair> corners);

}  // namespace gatedyno

#endif  // GATEDYNO_COMPARE_VERSUS_H_
