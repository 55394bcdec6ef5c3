#include "harness/flow/arc_waves.h"

#include <string>
#include <utility>
#include <vector>

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "harness/deck/stage_measures.h"
#include "harness/sim/table_runner.h"

namespace gatedyno {
namespace {

using ::testing::ElementsAre;

constexpr double kDelay_s = 12e-12;

Comparison RowOf(const std::string& cell,
                 double difference,
                 std::vector<Point> points) {
  Comparison row;
  row.arc = {.cell = cell,
             .pin = "a",
             .output = "y",
             .input_edge = Edge::kRise,
             .edge = Edge::kFall,
             .side = {}};
  row.effort_difference = difference;
  row.verdict = Verdict::kWithin;
  row.points = std::move(points);
  return row;
}

Point PointAt(double fanout, const std::string& key) {
  return {.fanout = fanout,
          .delay_s = kDelay_s,
          .input_transition_s = 9e-12,
          .output_transition_s = 8e-12,
          .job_key = key};
}

Job StageJobOf(const std::string& key) {
  Job job;
  job.key = key;
  job.label = "label " + key;
  job.deck = "title\n.end\n";
  job.settings = {".options a\n", ".options b\n"};
  AddStageMeasures(/*inverting=*/true, /*supply_v=*/1.0, job);
  return job;
}

Outcome StoredAt(int rung) {
  Outcome outcome = MeasuredOutcome({{"delay_fall", kDelay_s}});
  outcome.rung = rung;
  return outcome;
}

// Every interval begins at 1 ns and lasts as long as its place says.
Outcome Drawn(const Job& job) {
  Outcome outcome = MeasuredOutcome({});
  Waves waves;
  waves.waveforms = {{"d_in", {0.0, 1e-9}, {0.0, 1.0}},
                     {"d_out", {0.0, 1e-9}, {1.0, 0.0}}};
  for (const Interval& interval : job.intervals) {
    const double length_s =
        1e-12 * static_cast<double>(waves.intervals.size() + 1);
    waves.intervals.push_back({interval.name, 1e-9, 1e-9 + length_s});
    outcome.values_s[interval.name] = length_s;
  }
  outcome.waves = std::move(waves);
  return outcome;
}

class ArcWavesTest : public testing::Test {
 protected:
  void Keep(const Job& job, const Outcome& outcome) {
    ASSERT_TRUE(store_.SaveOutcome(job, outcome).ok());
  }

  std::vector<ArcWaves> Worst(size_t count,
                              const TableRunner::Answer& answer = Drawn) {
    TableRunner runner(answer);
    Result<std::vector<ArcWaves>> waves =
        WorstWaves(result_, count, &store_, &runner);
    EXPECT_TRUE(waves.ok());
    asked_ = runner.asked();
    return waves.ok() ? *std::move(waves) : std::vector<ArcWaves>();
  }

  RunResult result_;
  Store store_ = Store::Open(":memory:").value();
  std::vector<Job> asked_;
};

TEST_F(ArcWavesTest, TakesTheArcsThatDifferMostLargestFirst) {
  for (const double difference : {0.1, -0.4, 0.2, 0.3}) {
    result_.comparisons.push_back(
        RowOf("c" + std::to_string(result_.comparisons.size()),
              difference,
              {PointAt(4, std::to_string(result_.comparisons.size()))}));
    Keep(StageJobOf(result_.comparisons.back().points[0].job_key), StoredAt(0));
  }
  result_.comparisons[3].verdict = Verdict::kNotMeasured;
  std::vector<size_t> places;
  for (const ArcWaves& waves : Worst(2)) {
    EXPECT_EQ(waves.trouble, "");
    places.push_back(waves.place);
  }
  EXPECT_THAT(places, ElementsAre(1, 2));
  EXPECT_EQ(asked_.size(), 2U);
  EXPECT_EQ(Worst(20).size(), 3U);
  EXPECT_TRUE(Worst(0).empty());
}

TEST_F(ArcWavesTest, LooksAtTheFanoutNearestToFour) {
  struct Case {
    std::vector<double> fanouts;
    double chosen;
  };
  const Case cases[] = {{{1, 4, 6}, 4},
                        {{1, 2}, 2},
                        {{6, 8}, 6},
                        {{3, 5}, 3},
                        {{1, 6, 2.5}, 2.5}};
  for (const Case& test : cases) {
    Comparison row = RowOf("c", 0.1, {});
    for (const double fanout : test.fanouts) {
      row.points.push_back(PointAt(fanout, std::to_string(fanout)));
      Keep(StageJobOf(std::to_string(fanout)), StoredAt(0));
    }
    result_.comparisons = {row};
    const std::vector<ArcWaves> waves = Worst(1);
    ASSERT_EQ(waves.size(), 1U);
    EXPECT_EQ(waves[0].fanout, test.chosen);
    EXPECT_EQ(waves[0].job_key, std::to_string(test.chosen));
  }
}

TEST_F(ArcWavesTest, ShowsTheIntervalsOfTheArcsOwnEdges) {
  result_.comparisons = {RowOf("c", 0.1, {PointAt(4, "k")})};
  Keep(StageJobOf("k"), StoredAt(0));
  const std::vector<ArcWaves> all = Worst(1);
  ASSERT_EQ(all.size(), 1U);
  const ArcWaves& waves = all[0];
  ASSERT_EQ(waves.trouble, "");
  struct Expected {
    const char* name;
    double to_s;  // By the place in the job; see Drawn.
  };
  const Expected expected[] = {{"delay_fall", 1e-9 + 4e-12},
                               {"input_rise", 1e-9 + 2e-12},
                               {"output_fall", 1e-9 + 6e-12}};
  ASSERT_EQ(waves.intervals.size(), std::size(expected));
  const Job job = StageJobOf("k");
  for (size_t i = 0; i < std::size(expected); ++i) {
    const SeenInterval& seen = waves.intervals[i];
    EXPECT_EQ(seen.interval.name, expected[i].name);
    EXPECT_THAT(job.intervals, ::testing::Contains(seen.interval));
    EXPECT_EQ(seen.from_s, 1e-9);
    EXPECT_EQ(seen.to_s, expected[i].to_s);
  }
  EXPECT_EQ(waves.waveforms, Drawn(job).waves->waveforms);
  EXPECT_EQ(waves.stored_delay_s, kDelay_s);
}

TEST_F(ArcWavesTest, SimulatesAtTheRungTheJobEndedWith) {
  result_.comparisons = {RowOf("c", 0.1, {PointAt(4, "k")})};
  Keep(StageJobOf("k"), StoredAt(1));
  Worst(1);
  ASSERT_EQ(asked_.size(), 1U);
  EXPECT_EQ(asked_[0].settings, std::vector<std::string>{".options b\n"});
  EXPECT_TRUE(asked_[0].wants_waves);
  EXPECT_EQ(asked_[0].key, "k");
}

TEST_F(ArcWavesTest, AJobOfTwoArcsRunsOnce) {
  Comparison rise = RowOf("c", 0.2, {PointAt(4, "k")});
  std::swap(rise.arc.input_edge, rise.arc.edge);
  result_.comparisons = {RowOf("c", 0.1, {PointAt(4, "k")}), rise};
  Keep(StageJobOf("k"), StoredAt(0));
  const std::vector<ArcWaves> waves = Worst(2);
  ASSERT_EQ(waves.size(), 2U);
  EXPECT_EQ(asked_.size(), 1U);
  EXPECT_EQ(waves[0].intervals[0].interval.name, "delay_rise");
  EXPECT_EQ(waves[1].intervals[0].interval.name, "delay_fall");
}

TEST_F(ArcWavesTest, TroubleIsOfOneArcAndInWords) {
  Job without = StageJobOf("without");
  std::erase_if(without.intervals, [](const Interval& interval) {
    return interval.name == "input_rise";
  });
  Keep(without, StoredAt(0));
  for (const char* key : {"good", "failing", "plain"}) {
    Keep(StageJobOf(key), StoredAt(0));
  }
  struct Case {
    std::vector<Point> points;
    std::string trouble;
  };
  const Case cases[] = {
      {{PointAt(4, "good")}, ""},
      {{}, "the run keeps no point of it"},
      {{PointAt(4, "")}, "the run keeps no point of it"},
      {{PointAt(4, "gone")}, "the store has no job gone"},
      {{PointAt(4, "failing")}, "failed again: cannot open models/cards.inc"},
      {{PointAt(4, "plain")}, "the worker gave no waveforms"},
      {{PointAt(4, "without")}, "its job measures no 'input_rise'"},
  };
  for (const Case& test : cases) {
    result_.comparisons.push_back(RowOf("c", 0.1, test.points));
  }
  const std::vector<ArcWaves> all = Worst(std::size(cases), [](const Job& job) {
    if (job.key == "failing") {
      Outcome outcome;
      outcome.message = "cannot open models/cards.inc";
      return outcome;
    }
    return job.key == "plain" ? MeasuredOutcome({}) : Drawn(job);
  });
  ASSERT_EQ(all.size(), std::size(cases));
  for (size_t i = 0; i < std::size(cases); ++i) {
    EXPECT_EQ(all[i].trouble, cases[i].trouble);
    EXPECT_EQ(all[i].waveforms.empty(), !cases[i].trouble.empty());
    EXPECT_EQ(all[i].intervals.empty(), !cases[i].trouble.empty());
  }
}

// What is looked at is not kept: the store gives back what it had.
TEST_F(ArcWavesTest, TheStoreStaysAsItWas) {
  result_.comparisons = {RowOf("c", 0.1, {PointAt(4, "k")})};
  Keep(StageJobOf("k"), StoredAt(1));
  Worst(1);
  const auto kept = store_.FindJob("k").value();
  ASSERT_TRUE(kept.has_value());
  EXPECT_EQ(kept->job, StageJobOf("k"));
  EXPECT_EQ(kept->outcome->rung, 1);
  EXPECT_EQ(kept->outcome->waves, std::nullopt);
}

}  // namespace
}  // namespace gatedyno
