// Runs that the page is tested with.

#ifndef GATEDYNO_TESTS_PAGE_RUNS_H_
#define GATEDYNO_TESTS_PAGE_RUNS_H_

#include <cmath>
#include <string>
#include <vector>

#include <fmt/format.h>

#include "harness/record/run_result.h"
#include "tests/page/circuits.h"
#include "tests/report/sample_run.h"

namespace gatedyno {

// An arc measured at five fanouts, `difference` away from a hand effort of
// 4/3, p as by hand.
inline Comparison MeasuredRow(const std::string& cell,
                              const std::string& pin,
                              Edge edge,
                              double difference) {
  const Calibration reference = SampleCalibration();
  Comparison row = SampleRow(cell, pin, edge);
  row.effort_difference = difference;
  row.effort = {row.estimate.effort * (1.0 + difference), 0.004};
  row.effort_mean = row.effort;
  row.parasitic_difference = difference / 2;
  row.parasitic = {row.hand_parasitic * (1.0 + difference / 2), 0.02};
  const Measured& tau =
      edge == Edge::kRise ? reference.tau_rise_s : reference.tau_fall_s;
  row.line->slope_s = row.effort.value * tau.value;
  row.line->intercept_s = row.parasitic.value * reference.tau_s.value;
  for (const double fanout : {1.0, 2.0, 3.0, 4.0, 6.0}) {
    row.points.push_back(
        {.fanout = fanout,
         .delay_s = row.line->slope_s * fanout + row.line->intercept_s,
         .input_transition_s = 8e-12,
         .output_transition_s = 9e-12,
         .job_key = "k"});
  }
  if (std::abs(difference) > row.tolerance.effort) {
    row.verdict = Verdict::kBeyond;
    row.reason = fmt::format(
        "g {:.2f} against {:.2f} by hand: {:+.1f} % "
        "(allowed 25 %)",
        row.effort.value,
        row.estimate.effort,
        100.0 * difference);
  }
  return row;
}

inline void AddCells(const std::vector<std::string>& names, RunResult* result) {
  for (const std::string& name : names) {
    result->cells.push_back({name, {"y = !(a & b)"}, 1, 2, 1});
  }
}

// Names meant to break out of every format.
inline RunResult HostileRun() {
  RunResult result = SampleRun();
  result.facts.title = "</title><script>document.title='broken'</script>";
  const std::vector<std::string> names = {
      "</script><img src=x onerror=\"document.title='broken'\">",
      std::string(200, 'w'),
      "\xD8\xA8\xD9\x88\xD8\xA7\xD8\xA8\xD8\xA9",  // Arabic: "gate".
      "\xE5\x8F\x8D\xE5\x8F\x8A\xE9\x96\x98",      // Chinese: "nand gate".
      "{{data}}<!--",
      "a,\"b\"|`c`\n=d ]]>&amp;"};
  result.cells.clear();
  result.comparisons.clear();
  AddCells(names, &result);
  for (CellSummary& cell : result.cells) {
    cell.circuit = NamedCircuit(cell.name);
  }
  double difference = -0.45;
  for (const std::string& name : names) {
    for (const Edge edge : {Edge::kRise, Edge::kFall}) {
      result.comparisons.push_back(
          MeasuredRow(name, name, edge, difference += 0.07));
      result.comparisons.back().arc.side = {{name, true}};
    }
  }
  // At fanout 4: the one whose waveforms are looked for.
  result.comparisons[1].points[3].job_key = "gone";
  Comparison failed = UnmeasuredRow();
  failed.arc.cell = names[0];
  failed.reason = names[0];
  result.comparisons.push_back(failed);
  result.warnings = {names[0], names[1]};
  result.facts.exemptions = {
      {.where = {.cells = names[0], .pins = names[0], .edge = {}},
       .quantity = {},
       .reason = names[0],
       .author = names.back(),
       .expires = "2999-12-31"},
      {.where = {.edge = Edge::kRise},
       .quantity = Quantity::kEffort,
       .reason = names[4],
       .author = names[2],
       .expires = "2020-01-01"}};
  result.failed_jobs = {{"k", names[0], names[1]}};
  return result;
}

// 5,000 arcs: 100 cells of five inputs at five corners.
inline RunResult LargeRun() {
  constexpr int kCells = 100;
  constexpr int kPins = 5;
  constexpr int kCorners = 5;
  constexpr double kSpread = 0.3;
  RunResult result = SampleRun();
  result.cells.clear();
  result.calibrations.clear();
  result.comparisons.clear();
  std::vector<std::string> names;
  for (int i = 0; i < kCells; ++i) {
    names.push_back(fmt::format("arbiter_gate_{}", i + 1));
  }
  AddCells(names, &result);
  for (CellSummary& cell : result.cells) {
    cell.circuit = FiveInputCircuit();
  }
  int count = 0;
  for (int corner = 0; corner < kCorners; ++corner) {
    Calibration calibration = SampleCalibration();
    calibration.corner.name = fmt::format("corner_{}", corner + 1);
    result.calibrations.push_back(calibration);
    for (const std::string& name : names) {
      for (int pin = 0; pin < kPins; ++pin) {
        for (const Edge edge : {Edge::kRise, Edge::kFall}) {
          const double difference = kSpread * std::sin(++count * 0.7);
          result.comparisons.push_back(
              MeasuredRow(name, fmt::format("in{}", pin), edge, difference));
          result.comparisons.back().corner = calibration.corner.name;
          result.comparisons.back().arc.side = {{"enable", true}};
        }
      }
    }
  }
  return result;
}

// `run` as another node has it: every number moved, measured by jobs of its
// own; the last arc is gone and another has come.
inline RunResult OtherRun(RunResult run) {
  constexpr double kSlower = 1.5;
  constexpr double kSpread = 0.12;
  run.facts.node = "p65";
  run.facts.node_title = "predictive 65 nm bulk, general purpose";
  run.facts.started = "2024-02-03T04:05:06Z";
  for (Calibration& calibration : run.calibrations) {
    for (Measured* tau : {&calibration.tau_s,
                          &calibration.tau_rise_s,
                          &calibration.tau_fall_s}) {
      tau->value *= kSlower;
    }
    calibration.fo4_s *= kSlower;
    calibration.p_inv.value *= 1.0 + kSpread / 2;
  }
  int count = 0;
  for (Comparison& row : run.comparisons) {
    const double change = kSpread * std::sin(++count * 1.3);
    row.effort.value *= 1.0 + change;
    row.parasitic.value *= 1.0 - change;
    for (Point& point : row.points) {
      point.job_key += "of another node";
    }
    if (count % 5 == 1 && row.line) {
      row.verdict = Verdict::kNotMeasured;
    }
  }
  run.comparisons.back().arc.pin += "_of_b";
  return run;
}

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_PAGE_RUNS_H_
