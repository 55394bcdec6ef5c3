#include "tests/bench/scene.h"

#include <utility>

#include "harness/flow/accuracy_sample.h"
#include "harness/flow/characterize.h"
#include "harness/store/store.h"

namespace gatedyno {
namespace {

Result<ReferenceArcs> References(const Scene& scene,
                                 const FanoutRule& fanouts,
                                 WorkDesk* desk) {
  AccuracySample sample(scene.run->plan.accuracy);
  auto references =
      MeasureReferences(*scene.run,
                        {{scene.bench.corner.name, scene.bench}},
                        {.fanouts = &fanouts, .sample = &sample, .desk = desk});
  if (!references.ok()) {
    return Forward(references);
  }
  return references->at(scene.bench.corner.name);
}

}  // namespace

std::vector<StageTest> Scene::Tests() const {
  std::vector<StageTest> tests;
  for (size_t cell = 0; cell < run->cells.size(); ++cell) {
    for (const StageTest& test : ArcTests(*run, cell, calibration())) {
      tests.push_back(test);
    }
  }
  return tests;
}

Result<Scene> MeasureScene(const Plan& plan,
                           WorkerPool* pool,
                           SimRunner* runner) {
  Result<PreparedRun> run = PrepareRun(plan);
  const Result<std::string> simulator = pool->Simulator();
  Result<Store> store = Store::Open(":memory:");
  if (!run.ok()) {
    return Forward(run);
  }
  if (!simulator.ok() || !store.ok()) {
    return simulator.ok() ? Forward(store) : Forward(simulator);
  }
  Scene scene{.run = std::make_unique<PreparedRun>(*std::move(run)),
              .bench = {},
              .result = {},
              .references = {}};
  const Result<Benches> benches = BenchesOf(*scene.run, *simulator);
  if (!benches.ok()) {
    return Forward(benches);
  }
  scene.bench = benches->at(scene.run->corners.front().name);
  WorkDesk desk(runner, &*store, {});
  Result<RunResult> result = Characterize(*scene.run, *simulator, &desk);
  if (!result.ok()) {
    return Forward(result);
  }
  if (result->calibrations.empty()) {
    return Unavailable("the reference inverter was not measured");
  }
  scene.result = *std::move(result);
  // All of it is in the store by now.
  WorkDesk again(runner, &*store, {});
  Result<ReferenceArcs> references =
      References(scene, FanoutRuleOf(plan), &again);
  if (!references.ok()) {
    return Forward(references);
  }
  scene.references = *std::move(references);
  return scene;
}

Result<ReferenceArcs> MeasureReference(const Scene& scene,
                                       const std::vector<double>& fanouts,
                                       SimRunner* runner) {
  Result<Store> store = Store::Open(":memory:");
  if (!store.ok()) {
    return Forward(store);
  }
  WorkDesk desk(runner, &*store, {});
  return References(scene, {.fixed = fanouts}, &desk);
}

}  // namespace gatedyno
