// gatedyno run: measures a plan's cells and compares them with the hand
// numbers.

#include <algorithm>
#include <ctime>
#include <filesystem>
#include <memory>
#include <optional>

#include <fmt/chrono.h>
#include <fmt/format.h>
#include <unistd.h>

#include "harness/base/file.h"
#include "harness/base/install.h"
#include "harness/cli/commands.h"
#include "harness/cli/plan_options.h"
#include "harness/cli/progress_line.h"
#include "harness/compare/summary.h"
#include "harness/flow/characterize.h"
#include "harness/record/run_result_json.h"
#include "harness/report/csv_report.h"
#include "harness/report/run_table.h"
#include "harness/report/wrap.h"
#include "harness/sim/simulator_identity.h"
#include "harness/sim/worker_pool.h"
#include "harness/store/store.h"

namespace gatedyno {
namespace {

constexpr int kMostWorkers = 1024;

struct Options {
  PlanOptions plan;
  std::string store = "gatedyno.db";
  std::optional<std::string> json;
  std::optional<std::string> csv;
  int workers = 0;
};

std::string NowUtc() {
  return fmt::format("{:%Y-%m-%dT%H:%M:%SZ}", fmt::gmtime(std::time(nullptr)));
}

// File names and a simulator's words may be no UTF-8; that must not lose a run.
std::string JsonText(const nlohmann::json& json, int indent = -1) {
  return json.dump(
      indent, ' ', false, nlohmann::json::error_handler_t::replace);
}

Status WriteReports(const Options& options, const RunResult& result) {
  if (options.json) {
    constexpr int kIndent = 1;
    Status written = WriteFile(
        *options.json, JsonText(RunResultToJson(result), kIndent) + "\n");
    if (!written.ok()) {
      return written;
    }
  }
  return options.csv ? WriteFile(*options.csv, CsvReport(result)) : Ok();
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

std::string ProgramVersion() {
  return fmt::format("gatedyno {}", GATEDYNO_VERSION);
}

// Simulates what the store does not have yet.
Result<RunResult> Measure(const PreparedRun& prepared,
                          const RunInfo& info,
                          WorkerPool* pool,
                          Store* store) {
  const std::string started = NowUtc();
  const Result<RunId> id = store->BeginRun(info);
  if (!id.ok()) {
    return Forward(id);
  }
  ProgressLine progress;
  OutcomeBook book(pool, store, *id, [&](const JobCounts& counts) {
    progress.Show(counts);
  });
  Result<RunResult> result =
      Characterize(prepared, info.simulator_version, &book);
  if (!result.ok()) {
    return result;
  }
  result->facts.program = ProgramVersion();
  result->facts.started = started;
  const Status finished =
      store->FinishRun(*id, JsonText(RunResultToJson(*result)));
  return finished.ok() ? std::move(result) : Forward(finished);
}

Result<RunResult> OpenAndMeasure(const Options& options,
                                 const PreparedRun& prepared) {
  const Result<std::string> simulator = SimulatorIdentity(WorkerProgram());
  if (!simulator.ok()) {
    return Forward(simulator);
  }
  PoolOptions pool_options;
  pool_options.workers = options.workers;
  Result<WorkerPool> pool = WorkerPool::Make(std::move(pool_options));
  if (!pool.ok()) {
    return Forward(pool);
  }
  Result<Store> store = Store::Open(options.store);
  if (!store.ok()) {
    return Forward(store);
  }
  return Measure(prepared,
                 {.plan = JsonText(PlanToJson(prepared.plan)),
                  .node = prepared.node.name,
                  .program_version = ProgramVersion(),
                  .simulator_version = *simulator},
                 &*pool,
                 &*store);
}

void PrintJobs(const RunResult& result, const std::string& store) {
  for (const FailedJob& job : result.failed_jobs) {
    fmt::print(
        "{}\n",
        Wrap(fmt::format("failed: {}: {} (deck kept in the store under {})",
                         job.label,
                         job.message,
                         job.key)));
  }
  fmt::print("{} jobs: {} simulated, {} taken from {}, {} failed\n",
             result.jobs.wanted,
             result.jobs.simulated,
             result.jobs.reused,
             store,
             result.jobs.failed);
}

Result<ExitCode> Run(const Options& options) {
  const Result<Plan> plan = PlanOf(options.plan);
  if (!plan.ok()) {
    return Forward(plan);
  }
  const Result<PreparedRun> prepared = PrepareRun(*plan);
  if (!prepared.ok()) {
    return Forward(prepared);
  }
  const Result<RunResult> result = OpenAndMeasure(options, *prepared);
  if (!result.ok()) {
    return Forward(result);
  }
  fmt::print("{}", RunTable(*result, Style(TakesColour(STDOUT_FILENO))));
  PrintJobs(*result, options.store);
  const Status written = WriteReports(options, *result);
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
            app.add_option("--store",
                           options->store,
                           "file that keeps every outcome (default: "
                           "gatedyno.db)");
            app.add_option("--json", options->json, "write the run as JSON");
            app.add_option("--csv", options->csv, "write the run as CSV");
            app.add_option("--workers",
                           options->workers,
                           "simulator processes (default: one a processor)")
                ->check(CLI::Range(1, kMostWorkers));
            return [options] { return Run(*options); };
          }};
}

}  // namespace gatedyno
