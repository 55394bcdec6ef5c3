// gatedyno versus: two finished runs side by side, or two corners of one.

#include <filesystem>
#include <memory>
#include <optional>
#include <string>
#include <system_error>
#include <utility>
#include <vector>

#include <fmt/format.h>
#include <fmt/ranges.h>
#include <unistd.h>

#include "harness/base/file.h"
#include "harness/cli/commands.h"
#include "harness/cli/stored_run.h"
#include "harness/cli/value_kind.h"
#include "harness/compare/versus.h"
#include "harness/page/versus_page.h"
#include "harness/report/versus_csv.h"
#include "harness/report/versus_json.h"
#include "harness/report/versus_table.h"

namespace gatedyno {
namespace {

struct Options {
  std::string a;
  std::string b;
  std::vector<RunId> runs;           // None, or two.
  std::vector<std::string> corners;  // None, or two.
  std::optional<std::string> page;
  std::optional<std::string> json;
  std::optional<std::string> csv;
};

// Where each side's run is to be had: none for the newest that is finished.
struct Choice {
  std::optional<RunId> a;
  std::optional<RunId> b;
};

bool SameFile(const Options& options) {
  std::error_code none;
  return options.a == options.b ||
         std::filesystem::equivalent(options.a, options.b, none);
}

// Of one store alone, the two newest that are finished, older first: before and
// after.
Result<Choice> ChooseRuns(const Options& options) {
  if (!options.runs.empty()) {
    return Choice{options.runs[0], options.runs[1]};
  }
  if (!SameFile(options) || !options.corners.empty()) {
    return Choice{};
  }
  const Result<std::vector<RunId>> finished = FinishedRuns(options.a);
  if (!finished.ok()) {
    return Forward(finished);
  }
  if (finished->size() < 2) {
    return BadInput(fmt::format(
        "{}: has {} finished run{}, and two are needed to compare; --corners "
        "X,Y compares corners of one",
        options.a,
        finished->size(),
        finished->size() == 1 ? "" : "s"));
  }
  return Choice{finished->end()[-2], finished->end()[-1]};
}

std::string NamesOrNone(const std::vector<std::string>& names) {
  return names.empty() ? "none" : fmt::format("{}", fmt::join(names, ", "));
}

Status CheckCorner(const std::string& corner, const StoredRun& run) {
  for (const std::string& known : CornersOf(run.result)) {
    if (known == corner) {
      return Ok();
    }
  }
  return BadInput(
      fmt::format("--corners: run {} of {} has no corner {}; has {}",
                  run.source.run,
                  run.source.store,
                  corner,
                  NamesOrNone(CornersOf(run.result))));
}

Result<std::vector<CornerPair>> ChooseCorners(const Options& options,
                                              const StoredRun& a,
                                              const StoredRun& b) {
  if (!options.corners.empty()) {
    for (const Status& known : {CheckCorner(options.corners[0], a),
                                CheckCorner(options.corners[1], b)}) {
      if (!known.ok()) {
        return Forward(known);
      }
    }
    return std::vector<CornerPair>{{options.corners[0], options.corners[1]}};
  }
  std::vector<CornerPair> pairs = PairCorners(a.result, b.result);
  if (pairs.empty()) {
    return BadInput(fmt::format(
        "no corner is in both: A has {}, B has {}; --corners X,Y compares X of "
        "A with Y of B",
        NamesOrNone(CornersOf(a.result)),
        NamesOrNone(CornersOf(b.result))));
  }
  return pairs;
}

std::string CellNames(const RunResult& result) {
  std::vector<std::string> names;
  for (const CellSummary& cell : result.cells) {
    names.push_back(cell.name);
  }
  return NamesOrNone(names);
}

Status WriteAll(const Options& options, const VersusView& view) {
  struct Output {
    const std::optional<std::string>& file;
    std::string (*text)(const VersusView& view);
  };
  const Output outputs[] = {
      {options.page, VersusPage},
      {options.json, VersusJson},
      {options.csv, [](const VersusView& v) { return VersusCsv(v.versus); }},
  };
  for (const Output& output : outputs) {
    if (output.file) {
      Status written = WriteFile(*output.file, output.text(view));
      if (!written.ok()) {
        return written;
      }
      fmt::print("written: {}\n", *output.file);
    }
  }
  return Ok();
}

Result<ExitCode> Compare(const Options& options,
                         const StoredRun& a,
                         const StoredRun& b) {
  Result<std::vector<CornerPair>> corners = ChooseCorners(options, a, b);
  if (!corners.ok()) {
    return Forward(corners);
  }
  const Versus versus = PutSideBySide(a.result, b.result, *std::move(corners));
  if (versus.arcs.empty()) {
    return BadInput(
        fmt::format("no arc is in both at the corners compared: A has cells "
                    "{}; B has cells {}",
                    CellNames(a.result),
                    CellNames(b.result)));
  }
  const VersusView view = {
      .a = {a.result, a.source}, .b = {b.result, b.source}, .versus = versus};
  fmt::print("{}", VersusTable(view, Style(TakesColour(STDOUT_FILENO))));
  const Status written = WriteAll(options, view);
  if (!written.ok()) {
    return Forward(written);
  }
  return kAllWithin;
}

Result<ExitCode> LoadAndCompare(Options options) {
  if (options.b.empty()) {
    options.b = options.a;
  }
  const Result<Choice> choice = ChooseRuns(options);
  if (!choice.ok()) {
    return Forward(choice);
  }
  const Result<StoredRun> a = LoadRun(options.a, choice->a, "--runs");
  if (!a.ok()) {
    return Forward(a);
  }
  const Result<StoredRun> b = LoadRun(options.b, choice->b, "--runs");
  if (!b.ok()) {
    return Forward(b);
  }
  return Compare(options, *a, *b);
}

void AddOptions(CLI::App& app, Options* options) {
  app.add_option("a", options->a, "store of the run before")
      ->type_name(kFile)
      ->required();
  app.add_option("b", options->b, "store of the run after (default: the same)")
      ->type_name(kFile);
  app.add_option("--runs",
                 options->runs,
                 "their numbers, N,M (default: the newest that is finished of "
                 "each; of one store, its two newest)")
      ->delimiter(',')
      ->expected(2);
  app.add_option("--corners",
                 options->corners,
                 "X,Y: corner X of A with Y of B (default: those of equal "
                 "name)")
      ->type_name(kCorner)
      ->delimiter(',')
      ->expected(2);
  app.add_option("-o,--page", options->page, "write it as a page")
      ->type_name(kFile);
  app.add_option("--json", options->json, "write it as JSON")->type_name(kFile);
  app.add_option("--csv", options->csv, "write it as CSV")->type_name(kFile);
}

}  // namespace

Command VersusCommand() {
  return {"versus",
          "put two runs side by side: nodes, corners, before and after",
          [](CLI::App& app) -> Action {
            const auto options = std::make_shared<Options>();
            AddOptions(app, options.get());
            return [options] { return LoadAndCompare(*options); };
          }};
}

}  // namespace gatedyno
