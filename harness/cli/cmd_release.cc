// gatedyno release: whether the cells of a plan may be released, by what a
// store has; with every reason.

#include <algorithm>
#include <filesystem>
#include <iterator>
#include <memory>
#include <optional>
#include <string>
#include <system_error>
#include <utility>
#include <vector>

#include <fmt/format.h>
#include <unistd.h>

#include "harness/base/calendar_day.h"
#include "harness/base/file.h"
#include "harness/cli/commands.h"
#include "harness/cli/local_date.h"
#include "harness/cli/run_session.h"
#include "harness/cli/stored_run.h"
#include "harness/cli/value_kind.h"
#include "harness/flow/stored_only.h"
#include "harness/report/release_json.h"
#include "harness/report/release_text.h"
#include "harness/report/time_text.h"

namespace gatedyno {
namespace {

struct Options {
  std::string store;
  std::string plan;
  std::optional<std::string> baseline;
  std::optional<RunId> baseline_run;
  std::optional<std::string> date;
  std::optional<std::string> json;
  std::optional<std::string> markdown;
};

Status Check(const Options& options) {
  if (options.date && !IsCalendarDay(*options.date)) {
    return BadInput(
        fmt::format("--date {}: expected a day of the calendar, as 2026-12-31",
                    *options.date));
  }
  if (options.baseline_run && !options.baseline) {
    return BadInput("--baseline-run: name its store with --baseline");
  }
  return Ok();
}

// Its simulator is the one whose outcomes are looked for, so that a decision
// needs no simulator, and can be made on another machine.
Result<RunRecord> NewestRun(const Options& options, Store* store) {
  Result<std::vector<RunRecord>> runs = store->Runs();
  if (!runs.ok()) {
    return Forward(runs);
  }
  if (runs->empty()) {
    return BadInput(fmt::format("{}: has no run; gatedyno run {} --store {}",
                                options.store,
                                options.plan,
                                options.store));
  }
  return std::move(runs->back());
}

// What the plan gives, of what the store has.
Result<FromStore> Collect(const Options& options) {
  const Result<Plan> plan = LoadPlan(options.plan);
  if (!plan.ok()) {
    return Forward(plan);
  }
  const Result<PreparedRun> prepared = PrepareRun(*plan);
  if (!prepared.ok()) {
    return Forward(prepared);
  }
  Result<Store> store = Store::Open(options.store, {.read_only = true});
  if (!store.ok()) {
    return Forward(store);
  }
  const Result<RunRecord> run = NewestRun(options, &*store);
  if (!run.ok()) {
    return Forward(run);
  }
  Result<FromStore> collected =
      CharacterizeFromStore(*prepared, run->info.simulator_version, &*store);
  if (collected.ok()) {
    collected->result.facts.program = ProgramVersion();
    collected->result.facts.started = IsoTimeText(run->started);
  }
  return collected;
}

// The run named; else the newest that is finished, or, in the store that is
// decided on, the one before it.
Result<RunId> BaselineRun(const Options& options) {
  if (options.baseline_run) {
    return *options.baseline_run;
  }
  const Result<std::vector<RunId>> finished = FinishedRuns(*options.baseline);
  if (!finished.ok()) {
    return Forward(finished);
  }
  std::error_code ignored;
  const size_t newer =
      std::filesystem::equivalent(*options.baseline, options.store, ignored)
          ? 1
          : 0;
  if (finished->size() <= newer) {
    return BadInput(fmt::format(
        "--baseline {}: has no finished run{}; see gatedyno status {}",
        *options.baseline,
        newer == 1 ? " before its newest" : "",
        *options.baseline));
  }
  return *std::next(finished->rbegin(), static_cast<std::ptrdiff_t>(newer));
}

Status AddBaseline(const Options& options, ReleaseReport* report) {
  const Result<RunId> id = BaselineRun(options);
  if (!id.ok()) {
    return Forward(id);
  }
  Result<StoredRun> run = LoadRun(*options.baseline, *id, "--baseline-run");
  if (!run.ok()) {
    return Forward(run);
  }
  ReleaseBaseline& baseline = report->baseline.emplace();
  baseline.source = std::move(run->source);
  baseline.result = std::move(run->result);
  baseline.versus = PutSideBySide(baseline.result,
                                  report->result,
                                  PairCorners(baseline.result, report->result));
  return Ok();
}

Result<ReleaseReport> Decide(const Options& options) {
  Result<FromStore> collected = Collect(options);
  if (!collected.ok()) {
    return Forward(collected);
  }
  ReleaseReport report;
  report.result = std::move(collected->result);
  report.plan = options.plan;
  report.store = options.store;
  report.today = options.date ? *options.date : LocalDate();
  report.missing_jobs = collected->missing_jobs;
  report.decision =
      DecideRelease(report.result, report.missing_jobs, report.today);
  const Status compared =
      options.baseline ? AddBaseline(options, &report) : Ok();
  return compared.ok() ? Result<ReleaseReport>(std::move(report))
                       : Forward(compared);
}

Result<ExitCode> Release(const Options& options) {
  if (const Status fits = Check(options); !fits.ok()) {
    return Forward(fits);
  }
  const Result<ReleaseReport> report = Decide(options);
  if (!report.ok()) {
    return Forward(report);
  }
  fmt::print("{}", ReleaseText(*report, Style(TakesColour(STDOUT_FILENO))));
  for (const auto& [file, text] :
       {std::pair(options.json, &ReleaseJson),
        std::pair(options.markdown, &ReleaseMarkdown)}) {
    const Status written = file ? WriteFile(*file, text(*report)) : Ok();
    if (!written.ok()) {
      return Forward(written);
    }
  }
  return report->decision.yes() ? kAllWithin : kSomeBeyond;
}

}  // namespace

Command ReleaseCommand() {
  return {
      "release",
      "say whether a plan's cells may be released: exit code 0 yes, 1 no",
      [](CLI::App& app) -> Action {
        const auto options = std::make_shared<Options>();
        app.add_option("store", options->store, "file of the runs")
            ->type_name(kFile)
            ->required();
        app.add_option("--plan",
                       options->plan,
                       "what has to be measured, what is allowed, and the "
                       "exemptions")
            ->type_name(kFile)
            ->required();
        app.add_option("--baseline",
                       options->baseline,
                       "store of an earlier run: what moved since by more "
                       "than its uncertainty is named")
            ->type_name(kFile);
        app.add_option("--baseline-run",
                       options->baseline_run,
                       "its number (default: the newest that is finished; in "
                       "the same store, the one before)");
        app.add_option("--date",
                       options->date,
                       "the day exemptions have to hold on (default: today)")
            ->type_name("YYYY-MM-DD");
        app.add_option("--json", options->json, "write the decision as JSON")
            ->type_name(kFile);
        app.add_option("--markdown", options->markdown, "write it as Markdown")
            ->type_name(kFile);
        app.footer(
            "Nothing is simulated and nothing written to the store. What the "
            "store does not have is a reason for no.\nThe exit code of "
            "gatedyno run goes by verdicts alone, whatever exemptions say.");
        return [options] { return Release(*options); };
      }};
}

}  // namespace gatedyno
