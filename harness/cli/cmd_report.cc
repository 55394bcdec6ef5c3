// gatedyno report: a finished run of a store as a page, and in the formats that
// other programs read.

#include <algorithm>
#include <functional>
#include <memory>
#include <optional>
#include <string>
#include <vector>

#include <fmt/format.h>

#include "harness/base/file.h"
#include "harness/cli/commands.h"
#include "harness/cli/stored_run.h"
#include "harness/cli/value_kind.h"
#include "harness/flow/arc_waves.h"
#include "harness/page/page.h"
#include "harness/report/csv_report.h"
#include "harness/report/json_report.h"
#include "harness/report/junit_report.h"
#include "harness/report/markdown_report.h"
#include "harness/report/verdict_text.h"
#include "harness/sim/worker_pool.h"
#include "harness/store/store.h"

namespace gatedyno {
namespace {

struct Options {
  std::string store;
  std::optional<RunId> run;
  std::optional<std::string> page;
  std::optional<std::string> json;
  std::optional<std::string> csv;
  std::optional<std::string> junit;
  std::optional<std::string> markdown;
  std::optional<int> waves;  // How many arcs' waveforms the page has.
};

Status CheckWaves(const Options& options) {
  if (options.waves && *options.waves < 1) {
    return BadInput(
        fmt::format("--waves {}: expected 1 or more arcs", *options.waves));
  }
  if (options.waves && !options.page) {
    return BadInput(
        "--waves: waveforms are part of the page; name its file with --page");
  }
  return Ok();
}

// Simulated now, on all processors.
Result<std::vector<ArcWaves>> SimulateWaves(const Options& options,
                                            const RunResult& result) {
  Result<Store> store = Store::Open(options.store, {.read_only = true});
  if (!store.ok()) {
    return Forward(store);
  }
  Result<WorkerPool> pool = WorkerPool::Make({});
  if (!pool.ok()) {
    return Forward(pool);
  }
  Result<std::vector<ArcWaves>> waves =
      WorstWaves(result, static_cast<size_t>(*options.waves), &*store, &*pool);
  if (waves.ok()) {
    const auto drawn =
        std::count_if(waves->begin(), waves->end(), [](const ArcWaves& one) {
          return one.trouble.empty();
        });
    fmt::print("waveforms: {} of {} arcs{}\n",
               drawn,
               waves->size(),
               waves->empty() ? ": none has a verdict"
               : static_cast<size_t>(drawn) == waves->size()
                   ? ""
                   : "; the page says why no more");
  }
  return waves;
}

Result<ExitCode> Report(const Options& options) {
  if (const Status fits = CheckWaves(options); !fits.ok()) {
    return Forward(fits);
  }
  const Result<StoredRun> run = LoadRun(options.store, options.run);
  if (!run.ok()) {
    return Forward(run);
  }
  fmt::print("run {}: {}\n", run->source.run, VerdictSentence(run->result));
  const Result<std::vector<ArcWaves>> waves =
      options.waves ? SimulateWaves(options, run->result)
                    : std::vector<ArcWaves>();
  if (!waves.ok()) {
    return Forward(waves);
  }
  struct Output {
    const std::optional<std::string>& file;
    std::function<std::string(const StoredRun& run)> text;
  };
  const Output outputs[] = {
      {options.page,
       [&](const StoredRun& r) { return Page(r.result, r.source, *waves); }},
      {options.json, [](const StoredRun& r) { return JsonReport(r.result); }},
      {options.csv,
       [](const StoredRun& r) { return CsvReport(r.result, r.source.today); }},
      {options.junit,
       [](const StoredRun& r) {
         return JunitReport(r.result, r.source.today);
       }},
      {options.markdown,
       [](const StoredRun& r) {
         return MarkdownReport(r.result, r.source.today);
       }},
  };
  for (const Output& output : outputs) {
    if (output.file) {
      const Status written = WriteFile(*output.file, output.text(*run));
      if (!written.ok()) {
        return Forward(written);
      }
      fmt::print("written: {}\n", *output.file);
    }
  }
  return kAllWithin;
}

}  // namespace

Command ReportCommand() {
  return {"report",
          "write a finished run as a page, or for other programs",
          [](CLI::App& app) -> Action {
            const auto options = std::make_shared<Options>();
            app.add_option("store", options->store, "file of the runs")
                ->type_name(kFile)
                ->required();
            app.add_option("--run",
                           options->run,
                           "its number (default: the newest that is finished)");
            app.add_option("-o,--page", options->page, "write it as a page")
                ->type_name(kFile);
            app.add_option("--json", options->json, "write it as JSON")
                ->type_name(kFile);
            app.add_option("--csv", options->csv, "write it as CSV")
                ->type_name(kFile);
            app.add_option("--junit", options->junit, "write it as JUnit XML")
                ->type_name(kFile);
            app.add_option(
                   "--markdown", options->markdown, "write it as Markdown")
                ->type_name(kFile);
            app.add_option("--waves",
                           options->waves,
                           "simulate so many arcs again, those whose g differs "
                           "most, and show their waveforms on the page");
            return [options] { return Report(*options); };
          }};
}

}  // namespace gatedyno
