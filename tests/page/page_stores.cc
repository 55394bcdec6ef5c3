// page_stores FOLDER: writes a store of each run of runs.h there, for the tests
// of the reports that `gatedyno report` makes of them.

#include <cstdio>
#include <filesystem>
#include <optional>
#include <string>

#include <fmt/format.h>

#include "harness/store/finish_run.h"
#include "harness/store/store.h"
#include "tests/page/runs.h"
#include "tests/page/wave_job.h"
#include "tests/report/exempt_run.h"

namespace gatedyno {
namespace {

Status Save(const std::filesystem::path& path, const RunResult& result) {
  std::filesystem::remove(path);
  Result<Store> store = Store::Open(path);
  if (!store.ok()) {
    return Forward(store);
  }
  const Result<RunId> run =
      store->BeginRun({.plan = R"({"node": "p45", "cells": ["nand2"]})",
                       .node = result.facts.node,
                       .program_version = result.facts.program,
                       .simulator_version = result.facts.simulator});
  if (!run.ok()) {
    return Forward(run);
  }
  Outcome ended;
  ended.ending = Ending::kMeasured;
  if (Status kept = store->SaveOutcome(WaveJob(), ended); !kept.ok()) {
    return kept;
  }
  return FinishRun(*run, result, &*store);
}

int Main(const std::filesystem::path& folder) {
  std::filesystem::create_directories(folder);
  struct Named {
    const char* file;
    RunResult result;
  };
  const Named runs[] = {{"sample.db", WithCircuits(SampleRun())},
                        {"hostile.db", HostileRun()},
                        {"large.db", LargeRun()},
                        {"exempt.db", ExemptRun()},
                        {"empty.db", RunResult()},
                        {"sample_b.db", OtherRun(WithCircuits(SampleRun()))},
                        {"hostile_b.db", OtherRun(HostileRun())},
                        {"large_b.db", OtherRun(LargeRun())}};
  for (const Named& run : runs) {
    const Status saved = Save(folder / run.file, run.result);
    if (!saved.ok()) {
      fmt::print(stderr, "page_stores: {}\n", saved.error().message);
      return 1;
    }
  }
  return 0;
}

}  // namespace
}  // namespace gatedyno

int main(int argc, char** argv) {
  if (argc != 2) {
    fmt::print(stderr, "usage: page_stores FOLDER\n");
    return 2;
  }
  return gatedyno::Main(argv[1]);
}
