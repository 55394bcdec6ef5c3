// gatedyno replay: a job of the store once more, alone.

#include <cstddef>
#include <memory>
#include <optional>
#include <string>
#include <utility>
#include <vector>

#include <fmt/format.h>
#include <fmt/ranges.h>

#include "harness/base/file.h"
#include "harness/base/text.h"
#include "harness/cli/commands.h"
#include "harness/cli/value_kind.h"
#include "harness/report/replay_table.h"
#include "harness/sim/replay.h"
#include "harness/sim/worker_pool.h"
#include "harness/store/store.h"

namespace gatedyno {
namespace {

struct Options {
  std::string key;
  std::string store = "gatedyno.db";
  std::optional<int> rung;
  std::optional<std::string> deck;
};

Result<std::string> KeyOf(const Options& options, Store* store) {
  constexpr size_t kMostShown = 8;
  const Result<std::vector<std::string>> keys =
      store->KeysLike(ToLower(options.key), kMostShown + 1);
  if (!keys.ok()) {
    return Forward(keys);
  }
  if (keys->empty()) {
    return BadInput(fmt::format(
        "{}: no job's key begins with '{}'", options.store, options.key));
  }
  if (keys->size() > 1 && keys->front() != options.key) {
    const bool all = keys->size() <= kMostShown;
    return BadInput(fmt::format(
        "{}: the keys of several jobs begin with '{}': {}{}; give more of it",
        options.store,
        options.key,
        fmt::join(keys->begin(),
                  all ? keys->end() : keys->begin() + kMostShown,
                  ", "),
        all ? "" : " and more"));
  }
  return keys->front();
}

Result<StoredJob> Find(const Options& options) {
  Result<Store> store = Store::Open(options.store, {.read_only = true});
  if (!store.ok()) {
    return Forward(store);
  }
  const Result<std::string> key = KeyOf(options, &*store);
  if (!key.ok()) {
    return Forward(key);
  }
  Result<std::optional<StoredJob>> job = store->FindJob(*key);
  if (!job.ok()) {
    return Forward(job);
  }
  return **std::move(job);  // A key of the store is of a job.
}

Result<size_t> RungOf(const Options& options, const StoredJob& stored) {
  const int rungs = static_cast<int>(RungCount(stored.job));
  const int last_time = stored.outcome ? stored.outcome->rung : 0;
  const int rung = options.rung.value_or(last_time);
  if (rung < 0 || rung >= rungs) {
    return BadInput(fmt::format(
        "--rung: {}: the job's rungs are 0 to {}", rung, rungs - 1));
  }
  return static_cast<size_t>(rung);
}

// One attempt, whatever becomes of its worker.
Result<Outcome> Simulate(Job job) {
  PoolOptions options;
  options.workers = 1;
  options.kills_before_aside = 1;
  Result<WorkerPool> pool = WorkerPool::Make(std::move(options));
  if (!pool.ok()) {
    return Forward(pool);
  }
  Result<std::vector<Outcome>> again = SimulateAgain({std::move(job)}, &*pool);
  return again.ok() ? Result<Outcome>(std::move(again->front()))
                    : Forward(again);
}

Result<ExitCode> Replay(const Options& options) {
  const Result<StoredJob> stored = Find(options);
  if (!stored.ok()) {
    return Forward(stored);
  }
  const Result<size_t> rung = RungOf(options, *stored);
  if (!rung.ok()) {
    return Forward(rung);
  }
  fmt::print("{}", StoredJobText(*stored));
  if (options.deck) {
    const Status written =
        WriteFile(*options.deck, DeckText(stored->job, *rung));
    if (!written.ok()) {
      return Forward(written);
    }
    fmt::print("deck of rung {} in {}\n", *rung, *options.deck);
    return kAllWithin;
  }
  const Result<Outcome> again = Simulate(OnlyRung(stored->job, *rung));
  if (!again.ok()) {
    return Forward(again);
  }
  fmt::print("{}", ReplayTable(*stored, *rung, *again));
  return again->measured() ? kAllWithin : kNotAllMeasured;
}

}  // namespace

Command ReplayCommand() {
  return {"replay",
          "run one job of a store again, or write its deck",
          [](CLI::App& app) -> Action {
            const auto options = std::make_shared<Options>();
            app.add_option(
                   "key", options->key, "the job's key, or how it begins")
                ->required();
            app.add_option("--store",
                           options->store,
                           "file that keeps the job (default: gatedyno.db)")
                ->type_name(kFile);
            app.add_option("--rung",
                           options->rung,
                           "which of its simulator settings, from 0 (default: "
                           "those it ended with)");
            app.add_option("--deck",
                           options->deck,
                           "write the deck to this file instead of running it")
                ->type_name(kFile);
            return [options] { return Replay(*options); };
          }};
}

}  // namespace gatedyno
