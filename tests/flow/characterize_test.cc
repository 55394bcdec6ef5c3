#include "harness/flow/characterize.h"

#include <map>
#include <string>

#include <fmt/format.h>
#include <gtest/gtest.h>

#include "harness/sim/table_runner.h"

namespace gatedyno {
namespace {

constexpr const char* kSimulator = "formula 1";
// A line through exact points: only arithmetic of doubles is in between.
constexpr double kRounding = 1e-9;

// A world in which every arc is a line: d = tau(edge) * g * h + tau * p.
struct Truth {
  double g_rise;
  double g_fall;
  double p_rise;
  double p_fall;
};
constexpr double kTauRise_s = 2e-12;
constexpr double kTauFall_s = 1.5e-12;
constexpr double kTau_s = (kTauRise_s + kTauFall_s) / 2;
constexpr double kPInv = 1.2;
// Hand numbers: nand2 g 4/3, p 2 (in p_inv); inv 1, 1.
const std::map<std::string, Truth>& Truths() {
  static const auto& lines = *new std::map<std::string, Truth>{
      {"reference inverter a->y", {1.0, 1.0, kPInv + 0.1, kPInv - 0.1}},
      {"inv a->y", {1.0, 1.1, 1.2, 1.3}},
      {"nand2 a->y", {1.25, 1.15, 2.0, 2.1}},
      {"nand2 b->y", {1.4, 2.0, 2.4, 4.0}},
  };
  return lines;
}

// "nand2 a->y h=4 typical".
struct Label {
  std::string arc;
  double fanout = 0.0;
  std::string corner;
};
Label Parse(const std::string& label) {
  const size_t fanout = label.find(" h=");
  const size_t corner = label.rfind(' ');
  return {label.substr(0, fanout),
          std::stod(label.substr(fanout + 3)),
          label.substr(corner + 1)};
}

Outcome Answer(const Job& job) {
  const Label label = Parse(job.label.substr(0, job.label.find(" (tighter)")));
  const Truth& line = Truths().at(label.arc);
  return MeasuredOutcome(
      {{"delay_rise",
        kTauRise_s * line.g_rise * label.fanout + kTau_s * line.p_rise},
       {"delay_fall",
        kTauFall_s * line.g_fall * label.fanout + kTau_s * line.p_fall},
       {"input_rise", 5e-12},
       {"input_fall", 5e-12},
       {"output_rise", 6e-12},
       {"output_fall", 6e-12}});
}

Outcome TimedOut() {
  Outcome outcome;
  outcome.ending = Ending::kTimedOut;
  outcome.message = "after 60 s";
  return outcome;
}

PreparedRun Prepared(const std::vector<std::string>& corners = {}) {
  Plan plan;
  plan.title = "a world of lines";
  plan.node = "p45";
  plan.cells = {"inv", "nand2"};
  plan.corners = corners;
  Result<PreparedRun> run = PrepareRun(plan);
  EXPECT_TRUE(run.ok()) << run.error().message;
  return *std::move(run);
}

RunResult Measure(const PreparedRun& run, const TableRunner::Answer& answer) {
  TableRunner runner(answer);
  Result<Store> store = Store::Open(":memory:");
  EXPECT_TRUE(store.ok()) << store.error().message;
  WorkDesk desk(&runner, &*store, {});
  Result<RunResult> result = Characterize(run, kSimulator, &desk);
  EXPECT_TRUE(result.ok()) << result.error().message;
  return *std::move(result);
}

TEST(CharacterizeTest, RecoversTheLinesItWasGiven) {
  const RunResult result = Measure(Prepared(), Answer);
  ASSERT_EQ(result.calibrations.size(), 1U);
  const Calibration& calibration = result.calibrations[0];
  EXPECT_NEAR(calibration.tau_rise_s.value, kTauRise_s, kRounding * kTauRise_s);
  EXPECT_NEAR(calibration.tau_fall_s.value, kTauFall_s, kRounding * kTauFall_s);
  EXPECT_NEAR(calibration.p_inv.value, kPInv, kRounding);
  EXPECT_NEAR(calibration.fo4_s, (4 + kPInv) * kTau_s, kRounding * kTau_s);
  ASSERT_EQ(result.comparisons.size(), 6U);
  for (const Comparison& row : result.comparisons) {
    const std::string arc =
        fmt::format("{} {}->{}", row.arc.cell, row.arc.pin, row.arc.output);
    const Truth& line = Truths().at(arc);
    const bool rises = row.arc.edge == Edge::kRise;
    EXPECT_NEAR(row.effort.value, rises ? line.g_rise : line.g_fall, kRounding)
        << arc;
    EXPECT_NEAR(
        row.parasitic.value, rises ? line.p_rise : line.p_fall, kRounding)
        << arc;
    EXPECT_EQ(row.points.size(), 3U);  // As few as prove it straight.
    EXPECT_FALSE(row.bent) << arc;
    const bool is_beyond = arc == "nand2 b->y" && !rises;
    EXPECT_EQ(row.verdict, is_beyond ? Verdict::kBeyond : Verdict::kWithin)
        << arc << ": " << row.reason;
  }
}

TEST(CharacterizeTest, SaysWhatWasRun) {
  const RunResult result = Measure(Prepared(), Answer);
  EXPECT_EQ(result.facts.title, "a world of lines");
  EXPECT_EQ(result.facts.node, "p45");
  EXPECT_EQ(result.facts.simulator, kSimulator);
  ASSERT_EQ(result.cells.size(), 2U);
  EXPECT_EQ(result.cells[1].name, "nand2");
  EXPECT_EQ(result.cells[1].functions,
            std::vector<std::string>{"y = !(a & b)"});
  EXPECT_EQ(result.cells[1].stages, 1);
  EXPECT_EQ(result.cells[1].tallest_pull_down, 2);
  EXPECT_EQ(result.cells[1].tallest_pull_up, 1);
  // Both edges of an arc are one job a fanout: reference, inv, nand2 a and b.
  // The sample is at least the reference's first.
  EXPECT_GE(result.jobs.wanted, 4 * 3 + 1);
  EXPECT_LE(result.jobs.wanted, 4 * 3 + 4);
  EXPECT_EQ(result.jobs.simulated, result.jobs.wanted);
  EXPECT_EQ(result.jobs.failed, 0);
  EXPECT_EQ(result.accuracy.promised, kDefaultAccuracy);
  EXPECT_GE(result.accuracy.delays, 2);
  EXPECT_TRUE(result.accuracy.met());
}

// Settings one rung tighter are answered with other delays.
TEST(CharacterizeTest, APromiseThatIsNotKeptIsSaidAndCarriedOn) {
  const auto off_by = [](double relative) {
    return [relative](const Job& job) {
      const bool tighter = job.label.ends_with(" (tighter)");
      Job plain = job;
      plain.label = job.label.substr(0, job.label.find(" (tighter)"));
      Outcome outcome = Answer(plain);
      for (auto& [name, value_s] : outcome.values_s) {
        value_s *= tighter ? 1.0 - relative : 1.0;
      }
      return outcome;
    };
  };
  const RunResult good = Measure(Prepared(), off_by(0.0005));
  EXPECT_TRUE(good.accuracy.met());
  EXPECT_TRUE(good.warnings.empty());
  const RunResult bad = Measure(Prepared(), off_by(0.005));
  EXPECT_FALSE(bad.accuracy.met());
  ASSERT_EQ(bad.warnings.size(), 1U);
  EXPECT_EQ(
      bad.warnings[0],
      "the accuracy of 0.2 % of each delay was not met: settings one rung "
      "tighter move reference inverter a->y h=1 typical by 0.50 %");
  for (size_t i = 0; i < bad.comparisons.size(); ++i) {
    EXPECT_GT(*bad.comparisons[i].effort.u, *good.comparisons[i].effort.u);
    EXPECT_GT(*bad.comparisons[i].parasitic.u,
              *good.comparisons[i].parasitic.u);
  }
}

TEST(CharacterizeTest, OneFailedJobLeavesItsArcsUnmeasured) {
  const RunResult result = Measure(Prepared(), [](const Job& job) {
    return job.label == "nand2 a->y h=4 typical" ? TimedOut() : Answer(job);
  });
  int unmeasured = 0;
  for (const Comparison& row : result.comparisons) {
    if (row.arc.cell == "nand2" && row.arc.pin == "a") {
      EXPECT_EQ(row.verdict, Verdict::kNotMeasured);
      EXPECT_FALSE(row.line.has_value());
      EXPECT_EQ(row.reason, "h=4: timed out: after 60 s");
      ++unmeasured;
    } else {
      EXPECT_TRUE(row.line.has_value());
    }
  }
  EXPECT_EQ(unmeasured, 2);
  ASSERT_EQ(result.failed_jobs.size(), 1U);
  EXPECT_EQ(result.failed_jobs[0].label, "nand2 a->y h=4 typical");
  EXPECT_EQ(result.jobs.failed, 1);
}

TEST(CharacterizeTest, WithoutTheReferenceACornerIsNotMeasured) {
  const PreparedRun run = Prepared({"typical", "slow_nom_25"});
  const RunResult result = Measure(run, [](const Job& job) {
    return job.label == "reference inverter a->y h=4 slow_nom_25" ? TimedOut()
                                                                  : Answer(job);
  });
  ASSERT_EQ(result.calibrations.size(), 1U);
  EXPECT_EQ(result.calibrations[0].corner.name, "typical");
  ASSERT_EQ(result.comparisons.size(), 12U);
  for (const Comparison& row : result.comparisons) {
    EXPECT_EQ(row.line.has_value(), row.corner == "typical");
    if (row.corner == "typical") {
      continue;
    }
    EXPECT_EQ(row.verdict, Verdict::kNotMeasured);
    EXPECT_EQ(row.reason,
              "the reference inverter was not measured: h=4: timed out: after "
              "60 s");
    EXPECT_GT(row.estimate.effort, 0.0);
  }
}

TEST(CharacterizeTest, AReferenceThatDoesNotSlowDownIsNoYardstick) {
  const RunResult result = Measure(Prepared(), [](const Job& job) {
    Outcome outcome = Answer(job);
    if (job.label.starts_with("reference")) {
      outcome.values_s["delay_fall"] = 1e-12;
    }
    return outcome;
  });
  EXPECT_TRUE(result.calibrations.empty());
  ASSERT_EQ(result.comparisons.size(), 6U);
  EXPECT_EQ(result.comparisons[0].reason,
            "reference inverter at typical, fall: the delay does not grow with "
            "the fanout");
}

// nand2 b->y fall is 50 % beyond g and 4.0 tau against 2.4 in p.
TEST(CharacterizeTest, RulesDecideWhatAnArcIsAllowed) {
  PreparedRun run = Prepared();
  run.plan.tolerance_rules = {
      {.where = {.cells = "nand2", .pins = "b", .edge = Edge::kFall},
       .effort = 0.6,
       .parasitic = 0.7},
      {.where = {.cells = "inv", .edge = {}},
       .effort = 0.05,
       .parasitic = std::nullopt}};
  run.plan.exemptions = {{.where = {},
                          .quantity = std::nullopt,
                          .reason = "known",
                          .author = "M. Ober",
                          .expires = "2027-03-31"}};
  const RunResult result = Measure(run, Answer);
  EXPECT_EQ(result.facts.tolerance_rules, run.plan.tolerance_rules);
  EXPECT_EQ(result.facts.exemptions, run.plan.exemptions);
  for (const Comparison& row : result.comparisons) {
    const bool rises = row.arc.edge == Edge::kRise;
    const bool widened = row.arc.pin == "b" && !rises;
    const bool narrowed = row.arc.cell == "inv";
    EXPECT_EQ(row.tolerance.effort, widened ? 0.6 : narrowed ? 0.05 : 0.25);
    EXPECT_EQ(row.tolerance.parasitic, widened ? 0.7 : 0.35);
    // g of the inverter's falling edge is 1.1.
    EXPECT_EQ(row.verdict,
              narrowed && !rises ? Verdict::kBeyond : Verdict::kWithin)
        << row.arc.cell << ": " << row.reason;
  }
}

// An arc that could not be calibrated keeps what it was allowed.
TEST(CharacterizeTest, RulesHoldWithoutACalibration) {
  PreparedRun run = Prepared();
  run.plan.tolerance_rules = {{.where = {.cells = "nand2", .edge = {}},
                               .effort = 0.6,
                               .parasitic = std::nullopt}};
  const RunResult result =
      Measure(run, [](const Job& /*job*/) { return TimedOut(); });
  ASSERT_EQ(result.comparisons.size(), 6U);
  for (const Comparison& row : result.comparisons) {
    EXPECT_EQ(row.tolerance.effort, row.arc.cell == "nand2" ? 0.6 : 0.25);
  }
}

}  // namespace
}  // namespace gatedyno
