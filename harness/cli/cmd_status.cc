// gatedyno status: how the runs of a store stand, from another terminal.

#include <memory>
#include <string>

#include <fmt/format.h>
#include <unistd.h>

#include "harness/cli/commands.h"
#include "harness/cli/value_kind.h"
#include "harness/report/status_table.h"
#include "harness/store/run_lock.h"
#include "harness/store/store.h"

namespace gatedyno {
namespace {

struct Options {
  std::string store;
  bool json = false;
};

Result<StoreView> Look(const std::string& file) {
  Result<Store> store = Store::Open(file, {.read_only = true});
  if (!store.ok()) {
    return Forward(store);
  }
  // Asked before and after: a run may begin or end while the runs are read, and
  // must not look as if it had been stopped.
  const bool locked_before = RunsLocked(file);
  Result<std::vector<RunRecord>> runs = store->Runs();
  if (!runs.ok()) {
    return Forward(runs);
  }
  return StoreView{.store = file,
                   .runs = *std::move(runs),
                   .locked = locked_before || RunsLocked(file),
                   .now = UnixNow()};
}

Result<ExitCode> Show(const Options& options) {
  const Result<StoreView> view = Look(options.store);
  if (!view.ok()) {
    return Forward(view);
  }
  if (options.json) {
    constexpr int kIndent = 1;
    fmt::print(
        "{}\n",
        StatusToJson(*view).dump(
            kIndent, ' ', false, nlohmann::json::error_handler_t::replace));
  } else {
    fmt::print("{}", StatusTable(*view, Style(TakesColour(STDOUT_FILENO))));
  }
  return kAllWithin;
}

}  // namespace

Command StatusCommand() {
  return {"status",
          "show how far the runs of a store are",
          [](CLI::App& app) -> Action {
            const auto options = std::make_shared<Options>();
            app.add_option("store", options->store, "file of the runs")
                ->type_name(kFile)
                ->required();
            app.add_flag("--json", options->json, "show it as JSON");
            return [options] { return Show(*options); };
          }};
}

}  // namespace gatedyno
