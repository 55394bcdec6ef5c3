#include "harness/deck/stage_measures.h"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

namespace gatedyno {
namespace {

using ::testing::ElementsAre;

Outcome SixValues() {
  Outcome outcome;
  outcome.ending = Ending::kMeasured;
  outcome.values_s = {{"delay_rise", 1e-12},
                      {"delay_fall", 2e-12},
                      {"input_rise", 3e-12},
                      {"input_fall", 4e-12},
                      {"output_rise", 5e-12},
                      {"output_fall", 6e-12}};
  return outcome;
}

struct Case {
  Edge input_edge;
  Edge edge;
  double delay_s;
  double input_s;
  double output_s;
};
constexpr Case kCases[] = {
    {Edge::kRise, Edge::kFall, 2e-12, 3e-12, 6e-12},
    {Edge::kFall, Edge::kRise, 1e-12, 4e-12, 5e-12},
    {Edge::kRise, Edge::kRise, 1e-12, 3e-12, 5e-12},
    {Edge::kFall, Edge::kFall, 2e-12, 4e-12, 6e-12},
};

TEST(StageMeasuresTest, PointTakesTheValuesOfItsEdges) {
  for (const Case& tried : kCases) {
    Arc arc;
    arc.input_edge = tried.input_edge;
    arc.edge = tried.edge;
    const Point point = PointOf(SixValues(), arc, 3.0);
    EXPECT_EQ(point.fanout, 3.0);
    EXPECT_EQ(point.delay_s, tried.delay_s);
    EXPECT_EQ(point.input_transition_s, tried.input_s);
    EXPECT_EQ(point.output_transition_s, tried.output_s);
  }
}

TEST(StageMeasuresTest, AnArcHasThreeIntervals) {
  Arc arc;
  arc.input_edge = Edge::kRise;
  arc.edge = Edge::kFall;
  EXPECT_THAT(IntervalNames(arc),
              ElementsAre("delay_fall", "input_rise", "output_fall"));
  arc.edge = Edge::kRise;
  EXPECT_THAT(IntervalNames(arc),
              ElementsAre("delay_rise", "input_rise", "output_rise"));
}

TEST(StageMeasuresTest, LevelsFollowTheSupply) {
  Job job;
  AddStageMeasures(false, 0.8, job);
  EXPECT_EQ(
      MeasureLines(job),
      ".meas tran delay_rise trig v(d_in) val=0.4 rise=1 targ v(d_out) val=0.4 "
      "rise=1\n"
      ".meas tran input_rise trig v(d_in) val=0.16 rise=1 targ v(d_in) "
      "val=0.64 rise=1\n"
      ".meas tran output_rise trig v(d_out) val=0.16 rise=1 targ v(d_out) "
      "val=0.64 rise=1\n"
      ".meas tran delay_fall trig v(d_in) val=0.4 fall=1 targ v(d_out) val=0.4 "
      "fall=1\n"
      ".meas tran input_fall trig v(d_in) val=0.64 fall=1 targ v(d_in) "
      "val=0.16 fall=1\n"
      ".meas tran output_fall trig v(d_out) val=0.64 fall=1 targ v(d_out) "
      "val=0.16 fall=1\n");
  ASSERT_EQ(job.swings.size(), 2U);
  EXPECT_EQ(job.swings[0].net, "d_in");
  EXPECT_EQ(job.swings[1].net, "d_out");
  EXPECT_DOUBLE_EQ(job.swings[1].low_v, 0.04);
  EXPECT_DOUBLE_EQ(job.swings[1].high_v, 0.76);
}

}  // namespace
}  // namespace gatedyno
