// Two runs side by side with every kind of arc, for reports.

#ifndef GATEDYNO_TESTS_REPORT_SAMPLE_VERSUS_H_
#define GATEDYNO_TESTS_REPORT_SAMPLE_VERSUS_H_

#include <string>

#include "harness/report/versus_view.h"
#include "tests/compare/two_runs.h"

namespace gatedyno {

inline Calibration VersusCalibration(const std::string& corner,
                                     double tau_s,
                                     double p_inv) {
  return {.corner = {.name = corner,
                     .process = "typical",
                     .supply_v = 1.0,
                     .temperature_c = 25},
          .tau_rise_s = {tau_s, 0.0},
          .tau_fall_s = {tau_s, 0.0},
          .tau_s = {tau_s, 0.0},
          .p_inv = {p_inv, 0.0},
          .fo4_s = (4.0 + p_inv) * tau_s};
}

// A: node p45, tau 2 ps, p_inv 1.  B: node p65, tau 5 ps, p_inv 1.25.
//   inv fall    g 1.0 to 1.0, p 1.0 to 1.25: changed in p
//   inv rise    g 1.0 to 1.0, p 1.0 to 1.0: alike
//   nand2 fall  g 1.5 to 1.8: changed in g; verdicts differ; hand g too
//   nand2 rise  B without a line
//   nor2 fall   of A; nor3 fall of B
//   a corner of A alone
struct SampleVersus {
  RunResult a;
  RunResult b;
  RunSource source_a{.store = "first.db", .run = 1, .plan = "{}", .today = ""};
  RunSource source_b{.store = "second.db", .run = 3, .plan = "{}", .today = ""};
  Versus versus;

  SampleVersus() {
    a.facts.title = "gates of an interrupt arbiter";
    a.facts.node = "p45";
    a.facts.node_title = "45 nm";
    a.facts.started = "2026-12-01T08:00:00Z";
    a.facts.simulator = "simulator 1";
    a.facts.accuracy = 0.002;
    b.facts = a.facts;
    b.facts.node = "p65";
    b.facts.node_title = "65 nm";
    b.facts.started = "2026-12-02T08:00:00Z";
    a.cells = {{"inv", {"y = !a"}, 1, 1, 1},
               {"nand2", {"y = !(a & b)"}, 1, 2, 1}};
    b.cells = a.cells;
    a.calibrations = {VersusCalibration("typical", 2e-12, 1.0)};
    b.calibrations = {VersusCalibration("typical", 5e-12, 1.25)};
    AddRows();
    PairUp();
  }
  SampleVersus(const SampleVersus&) = delete;
  SampleVersus& operator=(const SampleVersus&) = delete;

  void PairUp() { versus = PutSideBySide(a, b, PairCorners(a, b)); }

  VersusView view() const {
    return {.a = {a, source_a}, .b = {b, source_b}, .versus = versus};
  }

 private:
  void AddRows() {
    a.comparisons = {RowOf("a", "inv", Edge::kFall, 1.0, 1.0),
                     RowOf("a", "inv", Edge::kRise, 1.0, 1.0),
                     RowOf("a", "nand2", Edge::kFall, 1.5, 2.0),
                     RowOf("a", "nand2", Edge::kRise, 1.5, 2.0),
                     RowOf("a", "nor2", Edge::kFall, 1.5, 2.0),
                     RowOf("a", "inv", Edge::kFall, 1.1, 1.0)};
    a.comparisons.back().corner = "slow_hot";
    b.comparisons = {RowOf("b", "inv", Edge::kFall, 1.0, 1.25),
                     RowOf("b", "inv", Edge::kRise, 1.0, 1.0),
                     RowOf("b", "nand2", Edge::kFall, 1.8, 2.0),
                     RowOf("b", "nand2", Edge::kRise, 1.5, 2.0),
                     RowOf("b", "nor3", Edge::kFall, 1.7, 3.0)};
    b.comparisons[2].effort.u = 0.003;  // k = 13.97: U = 2.8 %.
    b.comparisons[2].verdict = Verdict::kBeyond;
    b.comparisons[2].estimate.effort = 1.25;
    b.comparisons[3].line.reset();
    b.comparisons[3].verdict = Verdict::kNotMeasured;
    b.comparisons[3].reason = "h=4: timed out after 60 s";
  }
};

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_REPORT_SAMPLE_VERSUS_H_
