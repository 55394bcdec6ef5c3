// May the cells of a run be released on their hand numbers?  Yes or no, with
// everything that was weighed.
//
// No where
//   - there is no arc, or jobs of the plan are missing
//   - the promise about the delays was not kept (AccuracyCheck::met)
//   - something is wrong with an arc (compare/trouble.h), and no exemption that
//     is in force covers it
// and yes otherwise.  A bent arc is judged as any other, since how far it is
// from a line is in its uncertainty (fit/line_fit.h); its g holds over the
// fanouts it was measured at, so bent arcs are counted.  What moved since
// another run is for people to weigh (compare/versus.h); it decides nothing.

#ifndef GATEDYNO_COMPARE_RELEASE_H_
#define GATEDYNO_COMPARE_RELEASE_H_

#include <cstddef>
#include <optional>
#include <string>
#include <vector>

#include "harness/compare/excuse.h"
#include "harness/compare/summary.h"
#include "harness/record/run_result.h"

namespace gatedyno {

// A trouble that no exemption in force covers.
struct Obstacle {
  const Comparison* row = nullptr;
  Trouble trouble;
  std::optional<std::size_t> expired;  // The exemption that covered it.
};

struct ExcusedTrouble {
  const Comparison* row = nullptr;
  Trouble trouble;
  std::size_t exemption = 0;  // Its place in the run's.
};

struct ReleaseDecision {
  std::vector<std::string> of_the_run;  // Reasons that are no arc's.
  std::vector<Obstacle> obstacles;      // In the order of the run.
  std::vector<ExcusedTrouble> excused;
  std::vector<ExemptionUse> exemptions;  // Of every one of the run's.
  Summary counts;

  bool yes() const { return of_the_run.empty() && obstacles.empty(); }
};

// As of the day `today`.  `missing_jobs`: that the plan asks for and the store
// does not have.  The rows pointed to are those of `result`, which outlives the
// decision.
ReleaseDecision DecideRelease(const RunResult& result,
                              int missing_jobs,
                              const std::string& today);

}  // namespace gatedyno

#endif  // GATEDYNO_COMPARE_RELEASE_H_
