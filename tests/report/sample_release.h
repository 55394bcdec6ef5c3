// A release decision with every part.

#ifndef GATEDYNO_TESTS_REPORT_SAMPLE_RELEASE_H_
#define GATEDYNO_TESTS_REPORT_SAMPLE_RELEASE_H_

#include <utility>

#include "harness/report/release_report.h"
#include "tests/report/exempt_run.h"

namespace gatedyno {

inline ReleaseReport ReleaseOf(RunResult result, int missing_jobs = 0) {
  ReleaseReport report;
  report.result = std::move(result);
  report.plan = "plan.json";
  report.store = "night/a.db";
  report.today = kToday;
  report.missing_jobs = missing_jobs;
  report.decision = DecideRelease(report.result, missing_jobs, report.today);
  return report;
}

inline void CompareWith(RunResult baseline, ReleaseReport* report) {
  ReleaseBaseline& compared = report->baseline.emplace();
  compared.source = {.store = "b.db", .run = 3, .plan = "", .today = kToday};
  compared.result = std::move(baseline);
  compared.versus = PutSideBySide(compared.result,
                                  report->result,
                                  PairCorners(compared.result, report->result));
}

// Against a run in which inv's rising g was 1.2, its falling arc was beyond,
// and one arc more was measured.
inline ReleaseReport SampleRelease() {
  ReleaseReport report = ReleaseOf(ExemptRun(), 2);
  RunResult baseline = SampleRun();
  baseline.comparisons[0].effort = {1.2, 0.004};
  baseline.comparisons[1].verdict = Verdict::kBeyond;
  baseline.comparisons.push_back(SampleRow("nor2", "a", Edge::kRise));
  CompareWith(std::move(baseline), &report);
  return report;
}

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_REPORT_SAMPLE_RELEASE_H_
