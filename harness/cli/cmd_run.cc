// gatedyno run: measures a plan's cells and compares them with the hand
// numbers.

#include <algorithm>
#include <memory>

#include <fmt/format.h>
#include <unistd.h>

#include "harness/base/file.h"
#include "harness/cli/commands.h"
#include "harness/cli/farm_options.h"
#include "harness/cli/interrupt.h"
#include "harness/cli/local_date.h"
#include "harness/cli/plan_options.h"
#include "harness/cli/run_options.h"
#include "harness/cli/run_session.h"
#include "harness/compare/summary.h"
#include "harness/farm/slurm_farm.h"
#include "harness/report/csv_report.h"
#include "harness/report/json_report.h"
#include "harness/report/run_table.h"
#include "harness/report/wrap.h"
#include "harness/sim/worker_pool.h"

namespace gatedyno {
namespace {

struct Options {
  PlanOptions plan;
  RunOptions run;
  FarmCliOptions farm;
};

Status WriteReports(const RunOptions& options, const RunResult& result) {
  if (options.json) {
    Status written = WriteFile(*options.json, JsonReport(result));
    if (!written.ok()) {
      return written;
    }
  }
  return options.csv ? WriteFile(*options.csv, CsvReport(result, LocalDate()))
                     : Ok();
}

ExitCode Judge(const RunResult& result) {
  const bool all_have_lines =
      std::all_of(result.comparisons.begin(),
                  result.comparisons.end(),
                  [](const Comparison& row) { return row.line.has_value(); });
  const Summary summary = Summarise(result.comparisons);
  if (!all_have_lines) {
    return kNotAllMeasured;
  }
  return summary.beyond + summary.not_measured > 0 ? kSomeBeyond : kAllWithin;
}

void PrintJobs(const RunResult& result, const std::string& store) {
  for (const FailedJob& job : result.failed_jobs) {
    fmt::print("{}\n",
               Wrap(fmt::format("failed: {}: {} (again: gatedyno replay {} "
                                "--store {})",
                                job.label,
                                job.message,
                                job.key,
                                store)));
  }
  fmt::print("{} jobs: {} simulated, {} taken from stores, {} failed\n",
             result.jobs.wanted,
             result.jobs.simulated,
             result.jobs.reused,
             result.jobs.failed);
}

Result<RunResult> MeasureOnFarm(const Options& options,
                                const PreparedRun& prepared,
                                const std::string& simulator) {
  Result<FarmOptions> farm_options =
      FarmOptionsOf(options.farm, options.run.workers);
  if (!farm_options.ok()) {
    return Forward(farm_options);
  }
  farm_options->simulator = simulator;
  farm_options->memory_limit_bytes = options.run.worker_memory_bytes;
  farm_options->should_stop = &Interrupted;
  Result<SlurmFarm> farm = SlurmFarm::Make(*std::move(farm_options));
  if (!farm.ok()) {
    return Forward(farm);
  }
  return RunInSession(prepared, options.run, simulator, &*farm);
}

Result<RunResult> Measure(const Options& options, const PreparedRun& prepared) {
  Result<WorkerPool> pool = WorkerPool::Make(PoolOptionsOf(options.run));
  if (!pool.ok()) {
    return Forward(pool);
  }
  const Result<std::string> simulator = pool->Simulator();
  if (!simulator.ok()) {
    return Forward(simulator);
  }
  return options.farm.farm
             ? MeasureOnFarm(options, prepared, *simulator)
             : RunInSession(prepared, options.run, *simulator, &*pool);
}

Result<ExitCode> Run(const Options& options) {
  if (const Status farm =
          options.farm.farm ? Ok() : CheckNoFarmOptions(options.farm);
      !farm.ok()) {
    return Forward(farm);
  }
  Result<Plan> plan = PlanOf(options.plan);
  if (!plan.ok()) {
    return Forward(plan);
  }
  plan->time_limit_s = options.run.time_limit_s;
  const Result<PreparedRun> prepared = PrepareRun(*plan);
  if (!prepared.ok()) {
    return Forward(prepared);
  }
  const Result<RunResult> result = Measure(options, *prepared);
  if (!result.ok() && Interrupted()) {
    fmt::print(stderr,
               "gatedyno: stopped; what was measured is in {}, and the same "
               "command goes on\n",
               options.run.store);
    return kStopped;
  }
  if (!result.ok()) {
    return Forward(result);
  }
  fmt::print("{}",
             RunTable(*result, Style(TakesColour(STDOUT_FILENO)), LocalDate()));
  PrintJobs(*result, options.run.store);
  const Status written = WriteReports(options.run, *result);
  if (!written.ok()) {
    return Forward(written);
  }
  return Judge(*result);
}

}  // namespace

Command RunCommand() {
  return {"run",
          "measure cells and compare them with the hand numbers",
          [](CLI::App& app) -> Action {
            const auto options = std::make_shared<Options>();
            AddPlanOptions(app, options->plan);
            AddRunOptions(app, options->run);
            AddFarmOptions(app, options->farm);
            return [options] { return Run(*options); };
          }};
}

}  // namespace gatedyno
