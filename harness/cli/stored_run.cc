#include "harness/cli/stored_run.h"

#include <filesystem>
#include <utility>

#include <fmt/format.h>

#include "harness/cli/local_date.h"
#include "harness/record/run_result_json.h"
#include "harness/store/store.h"

namespace gatedyno {
namespace {

// What the user asked for.
struct Choice {
  const std::string& store;
  std::optional<RunId> run;
  const std::string& option;
};

Result<RunRecord> ChooseRun(const std::vector<RunRecord>& runs,
                            const Choice& choice) {
  for (auto run = runs.rbegin(); run != runs.rend(); ++run) {
    if (choice.run ? run->id == *choice.run : run->finished.has_value()) {
      return *run;
    }
  }
  if (choice.run) {
    return BadInput(
        fmt::format("{} {}: {} has no such run; see gatedyno status {}",
                    choice.option,
                    *choice.run,
                    choice.store,
                    choice.store));
  }
  return BadInput(fmt::format("{}: has no finished run; see gatedyno status {}",
                              choice.store,
                              choice.store));
}

Result<RunResult> ReadRun(const RunRecord& run,
                          const Choice& choice,
                          Store* store) {
  const Result<std::optional<RunText>> text = store->RunResults(run.id);
  if (!text.ok()) {
    return Forward(text);
  }
  if (!*text) {
    return BadInput(fmt::format(
        "{} {}: not finished; gatedyno run with the same plan goes on",
        choice.option,
        run.id));
  }
  Result<RunResult> result = RunResultFromTexts((*text)->head, (*text)->rows);
  if (!result.ok()) {
    return tl::unexpected<Error>(
        {result.error().kind,
         fmt::format(
             "{}: run {}: {}", choice.store, run.id, result.error().message)});
  }
  return result;
}

}  // namespace

Result<StoredRun> LoadRun(const std::string& store,
                          std::optional<RunId> run,
                          const std::string& option) {
  const Choice choice{store, run, option};
  Result<Store> opened = Store::Open(store, {.read_only = true});
  if (!opened.ok()) {
    return Forward(opened);
  }
  const Result<std::vector<RunRecord>> runs = opened->Runs();
  if (!runs.ok()) {
    return Forward(runs);
  }
  const Result<RunRecord> record = ChooseRun(*runs, choice);
  if (!record.ok()) {
    return Forward(record);
  }
  Result<RunResult> result = ReadRun(*record, choice, &*opened);
  if (!result.ok()) {
    return Forward(result);
  }
  return StoredRun{
      .result = *std::move(result),
      .source = {.store = std::filesystem::path(store).filename().string(),
                 .run = record->id,
                 .plan = record->info.plan,
                 .today = LocalDate()}};
}

Result<std::vector<RunId>> FinishedRuns(const std::string& store) {
  Result<Store> opened = Store::Open(store, {.read_only = true});
  if (!opened.ok()) {
    return Forward(opened);
  }
  const Result<std::vector<RunRecord>> runs = opened->Runs();
  if (!runs.ok()) {
    return Forward(runs);
  }
  std::vector<RunId> finished;
  for (const RunRecord& run : *runs) {
    if (run.finished) {
      finished.push_back(run.id);
    }
  }
  return finished;
}

}  // namespace gatedyno
