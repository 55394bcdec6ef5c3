// gatedyno report: a finished run of a store as a page, and in the formats that
// other programs read.

#include <filesystem>
#include <memory>
#include <optional>
#include <string>
#include <utility>
#include <vector>

#include <fmt/format.h>

#include "harness/base/file.h"
#include "harness/cli/commands.h"
#include "harness/record/run_result_json.h"
#include "harness/report/csv_report.h"
#include "harness/report/json_report.h"
#include "harness/report/junit_report.h"
#include "harness/report/markdown_report.h"
#include "harness/report/page.h"
#include "harness/report/verdict_text.h"
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
};

struct StoredRun {
  RunResult result;
  RunSource source;
};

// The one asked for, or the newest that is finished.
Result<RunRecord> ChooseRun(const std::vector<RunRecord>& runs,
                            const Options& options) {
  for (auto run = runs.rbegin(); run != runs.rend(); ++run) {
    if (options.run ? run->id == *options.run : run->finished.has_value()) {
      return *run;
    }
  }
  if (options.run) {
    return BadInput(
        fmt::format("--run {}: {} has no such run; see gatedyno status {}",
                    *options.run,
                    options.store,
                    options.store));
  }
  return BadInput(fmt::format("{}: has no finished run; see gatedyno status {}",
                              options.store,
                              options.store));
}

Result<RunResult> ReadRun(const RunRecord& run,
                          const Options& options,
                          Store* store) {
  const Result<std::optional<RunText>> text = store->RunResults(run.id);
  if (!text.ok()) {
    return Forward(text);
  }
  if (!*text) {
    return BadInput(fmt::format(
        "--run {}: not finished; gatedyno run with the same plan goes on",
        run.id));
  }
  Result<RunResult> result = RunResultFromTexts((*text)->head, (*text)->rows);
  if (!result.ok()) {
    return tl::unexpected<Error>(
        {result.error().kind,
         fmt::format(
             "{}: run {}: {}", options.store, run.id, result.error().message)});
  }
  return result;
}

Result<StoredRun> Load(const Options& options) {
  Result<Store> store = Store::Open(options.store, {.read_only = true});
  if (!store.ok()) {
    return Forward(store);
  }
  const Result<std::vector<RunRecord>> runs = store->Runs();
  if (!runs.ok()) {
    return Forward(runs);
  }
  const Result<RunRecord> run = ChooseRun(*runs, options);
  if (!run.ok()) {
    return Forward(run);
  }
  Result<RunResult> result = ReadRun(*run, options, &*store);
  if (!result.ok()) {
    return Forward(result);
  }
  const std::string file =
      std::filesystem::path(options.store).filename().string();
  return StoredRun{
      .result = *std::move(result),
      .source = {.store = file, .run = run->id, .plan = run->info.plan}};
}

Result<ExitCode> Report(const Options& options) {
  const Result<StoredRun> run = Load(options);
  if (!run.ok()) {
    return Forward(run);
  }
  struct Output {
    const std::optional<std::string>& file;
    std::string (*text)(const StoredRun& run);
  };
  const Output outputs[] = {
      {options.page,
       [](const StoredRun& r) { return Page(r.result, r.source); }},
      {options.json, [](const StoredRun& r) { return JsonReport(r.result); }},
      {options.csv, [](const StoredRun& r) { return CsvReport(r.result); }},
      {options.junit, [](const StoredRun& r) { return JunitReport(r.result); }},
      {options.markdown,
       [](const StoredRun& r) { return MarkdownReport(r.result); }},
  };
  fmt::print("run {}: {}\n", run->source.run, VerdictSentence(run->result));
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
  return {
      "report",
      "write a finished run as a page, or for other programs",
      [](CLI::App& app) -> Action {
        const auto options = std::make_shared<Options>();
        app.add_option("store", options->store, "file of the runs")->required();
        app.add_option("--run",
                       options->run,
                       "its number (default: the newest that is finished)");
        app.add_option("-o,--page", options->page, "write it as a page");
        app.add_option("--json", options->json, "write it as JSON");
        app.add_option("--csv", options->csv, "write it as CSV");
        app.add_option("--junit", options->junit, "write it as JUnit XML");
        app.add_option("--markdown", options->markdown, "write it as Markdown");
        return [options] { return Report(*options); };
      }};
}

}  // namespace gatedyno
