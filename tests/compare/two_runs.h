// Runs to be put side by side.

#ifndef GATEDYNO_TESTS_COMPARE_TWO_RUNS_H_
#define GATEDYNO_TESTS_COMPARE_TWO_RUNS_H_

#include <string>

#include <fmt/format.h>

#include "harness/record/run_result.h"

namespace gatedyno {

// Measured at three fanouts, by jobs that only `run` has.
inline Comparison RowOf(const std::string& run,
                        const std::string& cell,
                        Edge edge,
                        double effort,
                        double parasitic) {
  Comparison row;
  row.arc = {.cell = cell,
             .pin = "a",
             .output = "y",
             .input_edge = Opposite(edge),
             .edge = edge,
             .side = {{"b", true}}};
  row.corner = "typical";
  row.estimate.effort = 1.0;
  row.estimate.parasitic_by_nodes = 1.0;
  row.hand_parasitic = 1.0;
  row.line = Line{
      .slope_s = effort * 1e-12, .intercept_s = parasitic * 1e-12, .points = 3};
  row.effort = row.effort_mean = {effort, 0.0};
  row.parasitic = {parasitic, 0.0};
  row.verdict = Verdict::kWithin;
  for (const double fanout : {1.0, 2.0, 4.0}) {
    row.points.push_back(
        {.fanout = fanout,
         .delay_s = (effort * fanout + parasitic) * 1e-12,
         .job_key =
             fmt::format("{} {} {} {}", run, cell, EdgeName(edge), fanout)});
  }
  return row;
}

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_COMPARE_TWO_RUNS_H_
