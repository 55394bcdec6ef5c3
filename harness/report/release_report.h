// A release decision with what it was made of, for its reports.

#ifndef GATEDYNO_REPORT_RELEASE_REPORT_H_
#define GATEDYNO_REPORT_RELEASE_REPORT_H_

#include <optional>
#include <string>
#include <vector>

#include "harness/compare/release.h"
#include "harness/compare/versus.h"
#include "harness/record/run_result.h"
#include "harness/report/run_source.h"

namespace gatedyno {

// An earlier run, and how the one decided on differs from it.
struct ReleaseBaseline {
  RunSource source;
  RunResult result;
  Versus versus;  // a: `result`; b: the run decided on.
};

// Holds pointers into itself: to be moved, never copied.
struct ReleaseReport {
  RunResult result;
  ReleaseDecision decision;  // Its rows are those of `result`.
  std::string plan;          // Files, as the user named them.
  std::string store;
  std::string today;
  int missing_jobs = 0;
  std::optional<ReleaseBaseline> baseline;
};

// Arcs of the baseline that moved by more than the uncertainty, or whose
// verdict is another; in its order.
std::vector<const ArcPair*> MovedArcs(const ReleaseBaseline& baseline);

// The decision in parts, in the order and words of every report for people.
struct ReleaseItem {
  std::string subject;  // An arc or an exemption; empty: the run.
  std::string text;
  std::string note;  // On the line below; may be empty.
};
struct ReleasePart {
  std::string title;
  std::vector<ReleaseItem> items;
};

// Reasons for no, then what is excused, exemptions to look after, and what
// moved; parts without items are left out.
std::vector<ReleasePart> ReleaseParts(const ReleaseReport& report);

// "26 arcs: 22 within, 3 beyond, 1 not measured, 2 bent".
std::string ReleaseCounts(const ReleaseReport& report);

}  // namespace gatedyno

#endif  // GATEDYNO_REPORT_RELEASE_REPORT_H_
