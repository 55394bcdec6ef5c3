#include "harness/deck/stage_measures.h"

#include <fmt/format.h>

#include "harness/deck/deck_text.h"

namespace gatedyno {
namespace {

constexpr double kMiddle = 0.5;
constexpr double kLow = 0.2;
constexpr double kHigh = 0.8;
constexpr double kSettled = 0.05;  // Of the supply, to either rail.

std::string Name(const char* quantity, Edge edge) {
  return fmt::format("{}_{}", quantity, EdgeName(edge));
}

Interval Delay(Edge edge, bool inverting, double supply_v) {
  const Edge input = inverting ? Opposite(edge) : edge;
  return {.name = Name("delay", edge),
          .from = {kInputNet, kMiddle * supply_v, input, 1},
          .to = {kOutputNet, kMiddle * supply_v, edge, 1}};
}

Interval Transition(const char* quantity,
                    const char* net,
                    Edge edge,
                    double supply_v) {
  const bool rises = edge == Edge::kRise;
  return {.name = Name(quantity, edge),
          .from = {net, (rises ? kLow : kHigh) * supply_v, edge, 1},
          .to = {net, (rises ? kHigh : kLow) * supply_v, edge, 1}};
}

std::string CrossingText(const Crossing& crossing) {
  return fmt::format("v({}) val={} {}={}",
                     crossing.net,
                     DeckNumber(crossing.level_v),
                     EdgeName(crossing.edge),
                     crossing.occurrence);
}

}  // namespace

void AddStageMeasures(bool inverting, double supply_v, Job& job) {
  for (const Edge edge : {Edge::kRise, Edge::kFall}) {
    job.intervals.push_back(Delay(edge, inverting, supply_v));
    job.intervals.push_back(Transition("input", kInputNet, edge, supply_v));
    job.intervals.push_back(Transition("output", kOutputNet, edge, supply_v));
  }
  for (const char* net : {kInputNet, kOutputNet}) {
    job.swings.push_back(
        {net, kSettled * supply_v, (1.0 - kSettled) * supply_v});
  }
}

std::array<std::string, 3> IntervalNames(const Arc& arc) {
  return {Name("delay", arc.edge),
          Name("input", arc.input_edge),
          Name("output", arc.edge)};
}

std::string MeasureLines(const Job& job) {
  std::string text;
  for (const Interval& interval : job.intervals) {
    text += fmt::format(".meas tran {} trig {} targ {}\n",
                        interval.name,
                        CrossingText(interval.from),
                        CrossingText(interval.to));
  }
  return text;
}

double DelayOf(const Outcome& outcome, Edge edge) {
  return outcome.values_s.at(Name("delay", edge));
}

Point PointOf(const Outcome& outcome, const Arc& arc, double fanout) {
  const auto [delay, input, output] = IntervalNames(arc);
  return {.fanout = fanout,
          .delay_s = outcome.values_s.at(delay),
          .input_transition_s = outcome.values_s.at(input),
          .output_transition_s = outcome.values_s.at(output),
          .job_key = {}};
}

}  // namespace gatedyno
