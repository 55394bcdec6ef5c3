// Waveforms of an arc of SampleRun(), for reports.

#ifndef GATEDYNO_TESTS_PAGE_SAMPLE_WAVES_H_
#define GATEDYNO_TESTS_PAGE_SAMPLE_WAVES_H_

#include "harness/record/arc_waves.h"

namespace gatedyno {

// Of nand2 b->y fall, the fifth row: b rises from 1.000 to 1.020 ns, y falls
// from 1.006 to 1.036 ns, both straight, from rail to rail of 1 V.
inline ArcWaves SampleWaves() {
  ArcWaves waves;
  waves.place = 4;
  waves.fanout = 4.0;
  waves.job_key = "00ff";
  waves.intervals = {{{"delay_fall",
                       {"d_in", 0.5, Edge::kRise, 1},
                       {"d_out", 0.5, Edge::kFall, 1}},
                      1.010e-9,
                      1.021e-9},
                     {{"input_rise",
                       {"d_in", 0.2, Edge::kRise, 1},
                       {"d_in", 0.8, Edge::kRise, 1}},
                      1.004e-9,
                      1.016e-9},
                     {{"output_fall",
                       {"d_out", 0.8, Edge::kFall, 1},
                       {"d_out", 0.2, Edge::kFall, 1}},
                      1.012e-9,
                      1.030e-9}};
  waves.waveforms = {
      {"d_in", {0, 1.000e-9, 1.010e-9, 1.020e-9, 2e-9}, {0, 0, 0.5, 1, 1}},
      {"d_out", {0, 1.006e-9, 1.021e-9, 1.036e-9, 2e-9}, {1, 1, 0.5, 0, 0}}};
  waves.stored_delay_s = 1.021e-9 - 1.010e-9;
  return waves;
}

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_PAGE_SAMPLE_WAVES_H_
