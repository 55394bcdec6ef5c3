// A store: one file that keeps jobs, their outcomes and runs.
//
// Every call is one transaction: whatever dies, what a call has returned from
// is in the file, and nothing is there by half.  (A power failure may take the
// last moments with it, but leaves the file sound.)  Outcomes are found by
// their job's key, so no job is ever simulated twice, by whatever run.
//
// One process writes at a time and any number read meanwhile, as of their call;
// a second writer waits up to StoreOptions::busy_timeout.  The file must be on
// a local disk: SQLite's write-ahead log does not work on network file systems.
// A Store belongs to one thread at a time.
//
// Errors name the file: "runs.db: database is locked (waited 5 s)".

#ifndef GATEDYNO_STORE_STORE_H_
#define GATEDYNO_STORE_STORE_H_

#include <chrono>
#include <cstdint>
#include <filesystem>
#include <memory>
#include <optional>
#include <span>
#include <string>
#include <vector>

#include "harness/base/result.h"
#include "harness/record/job.h"
#include "harness/record/outcome.h"

namespace gatedyno {

struct StoreOptions {
  bool create = true;  // Make the file where there is none.
  std::chrono::milliseconds busy_timeout{5000};
};

using UnixMilliseconds = std::int64_t;  // Since 1970, UTC.
using RunId = std::int64_t;             // Counts from 1 in each store.

// What a run is told of when it begins.
struct RunInfo {
  std::string plan;  // JSON text.
  std::string node;
  std::string program_version;
  std::string simulator_version;
};

struct RunRecord {
  RunId id = 0;
  RunInfo info;
  UnixMilliseconds started = 0;
  std::optional<UnixMilliseconds> finished;
};

// A job as kept, and how it ended last, if it did.
struct StoredJob {
  Job job;
  std::optional<Outcome> outcome;
  UnixMilliseconds ended = 0;  // Meaningful with an outcome.
};

class Store {
 public:
  // Fails with kBadInput on a file of something else or of a newer gatedyno.
  // ":memory:" is a store that is gone with the object.
  static Result<Store> Open(const std::filesystem::path& path,
                            const StoreOptions& options = {});

  Store(Store&& other) noexcept;
  Store& operator=(Store&& other) noexcept;
  ~Store();

  // Keeps the job, its deck for replay, and the outcome, in place of an earlier
  // outcome of the same key unless that one was measured.
  Status SaveOutcome(const Job& job, const Outcome& outcome);

  // None where the job is not known, has not ended or was not measured.
  Result<std::optional<Outcome>> FindMeasured(const std::string& key);

  Result<std::optional<StoredJob>> FindJob(const std::string& key);

  Result<RunId> BeginRun(const RunInfo& info);

  // Notes the jobs a run consists of, ended or not; a job already noted stays.
  // One transaction a call: hand over a very large plan in pieces.
  Status AddJobs(RunId run, std::span<const Job> jobs);

  // `results` is JSON text: the run's comparisons.
  Status FinishRun(RunId run, const std::string& results);

  Result<std::vector<RunRecord>> Runs();  // Oldest first.
  // In the order the store first saw them.
  Result<std::vector<std::string>> RunJobKeys(RunId run);
  // None while the run is not finished.
  Result<std::optional<std::string>> RunResults(RunId run);

 private:
  struct Rep;

  explicit Store(std::unique_ptr<Rep> rep);

  std::unique_ptr<Rep> rep_;
};

}  // namespace gatedyno

#endif  // GATEDYNO_STORE_STORE_H_
