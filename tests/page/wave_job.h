// The job that every point of runs.h names, for pages with waveforms.

#ifndef GATEDYNO_TESTS_PAGE_WAVE_JOB_H_
#define GATEDYNO_TESTS_PAGE_WAVE_JOB_H_

#include "harness/deck/stage_measures.h"
#include "harness/record/job.h"

namespace gatedyno {

// An ideal inverter behind which 1 kohm charge 20 fF: a delay of 13.9 ps (RC ln
// 2), which no row of runs.h has.
inline Job WaveJob() {
  Job job;
  job.key = "k";
  job.label = "an ideal inverter";
  job.deck =
      "* an ideal inverter\n"
      "vin d_in 0 pwl(0 0 100p 0 120p 1 500p 1 520p 0 1n 0)\n"
      "vone one 0 1\n"
      "einv x 0 one d_in 1\n"
      "r1 x d_out 1k\n"
      "c1 d_out 0 20f\n"
      ".tran 1p 1n 0 1p\n"
      ".end\n";
  job.stop_s = 1e-9;
  AddStageMeasures(/*inverting=*/true, /*supply_v=*/1.0, job);
  return job;
}

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_PAGE_WAVE_JOB_H_
