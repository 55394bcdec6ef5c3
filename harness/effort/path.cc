#include "harness/effort/path.h"

#include <cassert>
#include <cmath>

namespace gatedyno {

PathSums SumPath(std::span<const PathStage> stages, double electrical_effort) {
  assert(!stages.empty());
  PathSums sums;
  sums.electrical_effort = electrical_effort;
  for (const PathStage& stage : stages) {
    sums.logical_effort *= stage.effort;
    sums.branching_effort *= stage.branching;
    sums.parasitic += stage.parasitic;
  }
  const auto count = static_cast<double>(stages.size());
  sums.path_effort =
      sums.logical_effort * sums.branching_effort * electrical_effort;
  sums.stage_effort = std::pow(sums.path_effort, 1.0 / count);
  sums.delay = count * sums.stage_effort + sums.parasitic;
  return sums;
}

std::vector<double> SizePath(std::span<const PathStage> stages,
                             double input_capacitance,
                             double load_capacitance) {
  const double stage_effort =
      SumPath(stages, load_capacitance / input_capacitance).stage_effort;
  std::vector<double> inputs(stages.size());
  double load = load_capacitance;
  for (size_t i = stages.size(); i-- > 0;) {
    load *= stages[i].effort * stages[i].branching / stage_effort;
    inputs[i] = load;
  }
  return inputs;
}

double ChainDelay(double path_effort, int stages, double parasitic) {
  const double count = stages;
  return count * (std::pow(path_effort, 1.0 / count) + parasitic);
}

int BestStageCount(double path_effort, double parasitic) {
  int best = 1;
  while (ChainDelay(path_effort, best + 1, parasitic) <
         ChainDelay(path_effort, best, parasitic)) {
    ++best;
  }
  return best;
}

double StageCountCrossover(int stages, double parasitic) {
  const auto longer_wins = [&](double log_effort) {
    const double effort = std::exp(log_effort);
    return ChainDelay(effort, stages + 1, parasitic) <
           ChainDelay(effort, stages, parasitic);
  };
  // Bisection on ln F: at F = 1 the shorter chain always wins.
  double low = 0.0;
  double high = 1.0;
  while (!longer_wins(high)) {
    high *= 2.0;
  }
  constexpr int kHalvings = 60;  // To the last digits of a double.
  for (int i = 0; i < kHalvings; ++i) {
    const double middle = (low + high) / 2.0;
    (longer_wins(middle) ? high : low) = middle;
  }
  return std::exp((low + high) / 2.0);
}

double BestStageEffort(double parasitic, double effort) {
  // Newton on rho * (ln rho - 1) - p / g, whose slope is ln rho; convex from
  // rho = e up, so it comes down to the root from above after one step.
  const double ratio = parasitic / effort;
  double rho = std::exp(1.0);
  constexpr int kSteps = 50;  // A handful is needed.
  for (int i = 0; i < kSteps; ++i) {
    rho -= (rho * (std::log(rho) - 1.0) - ratio) / std::log(rho);
  }
  return effort * rho;
}

}  // namespace gatedyno
