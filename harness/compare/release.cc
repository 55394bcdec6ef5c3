#include "harness/compare/release.h"

#include <cassert>

#include <fmt/format.h>

namespace gatedyno {
namespace {

std::vector<std::string> ReasonsOfTheRun(const RunResult& result,
                                         int missing_jobs) {
  std::vector<std::string> reasons;
  if (result.comparisons.empty()) {
    reasons.emplace_back("there is no arc to judge");
  }
  if (missing_jobs > 0) {
    reasons.push_back(fmt::format("{} job{} of the plan {} not in the store",
                                  missing_jobs,
                                  missing_jobs == 1 ? "" : "s",
                                  missing_jobs == 1 ? "is" : "are"));
  }
  const AccuracyCheck& accuracy = result.accuracy;
  if (accuracy.delays == 0) {
    reasons.emplace_back("the accuracy of the delays could not be checked");
  } else if (!accuracy.met()) {
    reasons.push_back(
        fmt::format("the accuracy was not kept: settings one rung tighter move "
                    "{} by {:.2g} "
                    "% (promised: {:g} %)",
                    accuracy.worst,
                    100.0 * accuracy.largest,
                    100.0 * accuracy.promised));
  }
  return reasons;
}

void Weigh(const Comparison& row,
           const std::vector<Exemption>& exemptions,
           const std::string& today,
           ReleaseDecision* decision) {
  for (Trouble& trouble : TroublesOf(row)) {
    const Excuse excuse = ExcuseFor(row, trouble, exemptions, today);
    if (excuse.in_force) {
      decision->excused.push_back({&row, std::move(trouble), *excuse.in_force});
    } else {
      decision->obstacles.push_back({&row, std::move(trouble), excuse.expired});
    }
  }
}

}  // namespace

ReleaseDecision DecideRelease(const RunResult& result,
                              int missing_jobs,
                              const std::string& today) {
  assert(!today.empty());
  ReleaseDecision decision;
  decision.of_the_run = ReasonsOfTheRun(result, missing_jobs);
  decision.exemptions = UseOfExemptions(result, today);
  decision.counts = Summarise(result.comparisons);
  for (const Comparison& row : result.comparisons) {
    Weigh(row, result.facts.exemptions, today, &decision);
  }
  return decision;
}

}  // namespace gatedyno
