// A run with every kind of row, for reports.

#ifndef GATEDYNO_TESTS_REPORT_SAMPLE_RUN_H_
#define GATEDYNO_TESTS_REPORT_SAMPLE_RUN_H_

#include <string>

#include "harness/record/run_result.h"

namespace gatedyno {

// The day its reports are made.
inline constexpr const char* kToday = "2026-12-02";

inline Comparison SampleRow(const std::string& cell,
                            const std::string& pin,
                            Edge edge) {
  Comparison row;
  row.arc = {.cell = cell,
             .pin = pin,
             .output = "y",
             .input_edge = Opposite(edge),
             .edge = edge,
             .side = {}};
  row.corner = "typical";
  row.estimate.effort = 4.0 / 3.0;
  row.estimate.parasitic_by_nodes = 2.0;
  row.estimate.parasitic_by_elmore = 7.0 / 3.0;
  row.line = Line{.slope_s = 2.5e-12,
                  .intercept_s = 4.25e-12,
                  .largest_residual_s = 1e-14,
                  .points = 5};
  row.effort = {1.296, 0.004};
  row.effort_mean = {1.3, 0.004};
  row.parasitic = {1.71, 0.02};
  row.hand_parasitic = 2.51;
  row.effort_difference = -0.028;
  row.parasitic_difference = -0.32;
  row.effort_difference_expanded = 0.0099;
  row.parasitic_difference_expanded = 0.027;
  row.verdict = Verdict::kWithin;
  return row;
}

inline Comparison BeyondRow() {
  Comparison row = SampleRow("nand2", "b", Edge::kFall);
  row.arc.side = {{"a", true}};
  row.effort = {1.9, 0.01};
  row.effort_difference = 0.425;
  row.verdict = Verdict::kBeyond;
  row.bent = true;
  row.reason = "g 1.90 against 1.33 by hand: +42.5 % (allowed 25 %)";
  return row;
}

inline Comparison UnmeasuredRow() {
  Comparison row = SampleRow("nand2", "b", Edge::kRise);
  row.line.reset();
  row.arc.side = {{"a", true}};
  row.verdict = Verdict::kNotMeasured;
  row.reason =
      "h=3: failed: doAnalyses: TRAN:  Timestep too small; initial timepoint: "
      "trouble with node \"d_out\" (and 4 more)";
  return row;
}

inline Comparison UncertainRow() {
  Comparison row = SampleRow("nand2", "a", Edge::kRise);
  row.bent = true;
  row.effort = {1.3, 0.4};
  row.effort_difference_expanded = 0.876;
  row.verdict = Verdict::kNotMeasured;
  row.reason =
      "g is too uncertain to tell: -2.8 % with an uncertainty of 87.6 % "
      "(allowed 25 %)";
  return row;
}

// Names as synthesis and extraction tools make them.
inline Comparison LongNamesRow() {
  Comparison row = SampleRow("arbiter_grant_priority_stage_complex_gat",
                             "interrupt_request_07",
                             Edge::kFall);
  row.arc.output = "grant_acknowledged_n";
  row.arc.side = {{"interrupt_request_06", true},
                  {"interrupt_request_05", false},
                  {"interrupt_request_04", true},
                  {"interrupt_enabled_07", false}};
  row.verdict = Verdict::kBeyond;
  row.reason =
      "g 1.90 against 1.33 by hand: +42.5 % (allowed 25 %); p 9.90 against "
      "4.12 by hand: +140.3 % (allowed 35 %)";
  return row;
}

inline Calibration SampleCalibration() {
  return {.corner = {.name = "typical",
                     .process = "typical",
                     .supply_v = 1.0,
                     .temperature_c = 25},
          .tau_rise_s = {2.181e-12, 1e-15},
          .tau_fall_s = {2.278e-12, 1e-15},
          .tau_s = {2.2295e-12, 1e-15},
          .p_inv = {1.254, 0.002},
          .fo4_s = 11.71e-12};
}

inline RunResult SampleRun() {
  RunResult result;
  result.facts = {.title = "gates of an interrupt arbiter",
                  .node = "p45",
                  .node_title = "predictive 45 nm bulk, high performance",
                  .drive = Drive::kMatched,
                  .fanouts = {0.5, 2, 4},
                  .accuracy = 0.002,
                  .tolerance = {},
                  .program = "gatedyno 0.1.0",
                  .simulator = "simulator 1",
                  .started = "2024-01-02T03:04:05Z"};
  result.accuracy = {.promised = 0.002,
                     .delays = 8,
                     .rms = 0.00034,
                     .largest = 0.0012,
                     .worst = "nand2 a->y h=2 typical"};
  const Comparison long_names = LongNamesRow();
  result.cells = {{"inv", {"y = !a"}, 1, 1, 1},
                  {"nand2", {"y = !(a & b)"}, 1, 2, 1},
                  {long_names.arc.cell,
                   {"grant_acknowledged_n = !(interrupt_request_07 & "
                    "interrupt_request_06 | interrupt_request_05 & "
                    "interrupt_request_04 | interrupt_enabled_07)"},
                   2,
                   3,
                   3}};
  result.calibrations = {SampleCalibration()};
  result.comparisons = {SampleRow("inv", "a", Edge::kRise),
                        SampleRow("inv", "a", Edge::kFall),
                        UncertainRow(),
                        UnmeasuredRow(),
                        BeyondRow(),
                        long_names};
  Comparison cold = UnmeasuredRow();
  cold.corner = "slow_lo_m40";
  cold.hand_parasitic = 0.0;
  cold.reason =
      "the reference inverter was not measured: h=4: crashed: signal 11";
  result.comparisons.push_back(cold);
  result.failed_jobs = {{"k1", "nand2 b->y h=3 typical", "Timestep \"small\""}};
  result.warnings = {
      "arbiter_grant_priority_stage_complex_gat: m1 w=93n is off the 5 nm "
      "grid: rounded to 95n, g(a, fall) 1.667 -> 1.640"};
  result.jobs = {.wanted = 30, .reused = 10, .simulated = 20, .failed = 1};
  return result;
}

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_REPORT_SAMPLE_RUN_H_
