// How far a run is; what its progress line and `gatedyno status` say.

#ifndef GATEDYNO_RECORD_RUN_PROGRESS_H_
#define GATEDYNO_RECORD_RUN_PROGRESS_H_

#include <string>

#include "harness/record/run_result.h"

namespace gatedyno {

struct RunProgress {
  JobCounts jobs;
  // Jobs of the whole run; an estimate until it ends, since bent arcs take
  // more.
  int expected_jobs = 0;
  int arcs_ended = 0;
  int arcs = 0;
  std::string current;  // Label of the job that ended last.
};

}  // namespace gatedyno

#endif  // GATEDYNO_RECORD_RUN_PROGRESS_H_
