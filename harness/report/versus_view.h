// What the reports of two runs side by side are made of.

#ifndef GATEDYNO_REPORT_VERSUS_VIEW_H_
#define GATEDYNO_REPORT_VERSUS_VIEW_H_

#include "harness/compare/versus.h"
#include "harness/record/run_result.h"
#include "harness/report/run_source.h"

namespace gatedyno {

// All of it outlives the view.
struct VersusSide {
  const RunResult& result;
  const RunSource& source;
};

struct VersusView {
  VersusSide a;
  VersusSide b;
  const Versus& versus;
};

}  // namespace gatedyno

#endif  // GATEDYNO_REPORT_VERSUS_VIEW_H_
