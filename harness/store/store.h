// A store: one file that keeps jobs, their outcomes and runs.
//
// Every call is one transaction: whatever dies, what a call has returned from
// is in the file, and nothing is there by half.  (A power failure may take the
// last moments with it, but leaves the file sound.)  Outcomes are found by
// their job's key, so no job is ever simulated twice, by whatever run.
//
// One process writes at a time and any number read meanwhile, as of their call;
// a second writer waits up to StoreOptions::busy_timeout.  That one run at a
// time uses a store is another matter: see run_lock.h.  The file must be on
// a local disk: SQLite's write-ahead log does not work on network file systems.
// A Store belongs to one thread at a time.
//
// Errors name the file: "runs.db: database is locked (waited 5 s)".  After any
// of them the store can be used on, and trouble() tells what may pass.

#ifndef GATEDYNO_STORE_STORE_H_
#define GATEDYNO_STORE_STORE_H_

#include <chrono>
#include <cstddef>
#include <filesystem>
#include <functional>
#include <memory>
#include <optional>
#include <span>
#include <string>
#include <vector>

#include "harness/base/result.h"
#include "harness/record/job.h"
#include "harness/record/outcome.h"
#include "harness/store/run_record.h"
#include "harness/store/store_trouble.h"

namespace gatedyno {

struct StoreOptions {
  bool create = true;  // Make the file where there is none.
  // Nothing is written and no store made, whatever `create` says; every call
  // that would write fails.  Works beside a writer, and sees what it saves.
  // SQLite may leave its own two files beside the store, "runs.db-wal" and
  // "-shm", until the next writer takes them away.
  bool read_only = false;
  std::chrono::milliseconds busy_timeout{5000};
};

// A job as kept, and how it ended last, if it did.
struct StoredJob {
  Job job;
  std::optional<Outcome> outcome;
  UnixMilliseconds ended = 0;  // Meaningful with an outcome.
};

// A job that has ended, to be kept.
struct StoredOutcome {
  Job job;
  Outcome outcome;
};

// Gives one row after the other, then none.
using NextRow = std::function<std::optional<std::string>()>;

class Store {
 public:
  // Fails with kBadInput on a file of something else or of a newer gatedyno;
  // one of an older gatedyno is brought up to date, or refused when read only.
  // ":memory:" is a store that is gone with the object.
  static Result<Store> Open(const std::filesystem::path& path,
                            const StoreOptions& options = {});

  Store(Store&& other) noexcept;
  Store& operator=(Store&& other) noexcept;
  ~Store();

  // Keeps the job, its deck for replay, and the outcome, in place of an earlier
  // outcome of the same key unless that one was measured.
  Status SaveOutcome(const Job& job, const Outcome& outcome);

  // The same for many, all of them or none.
  Status SaveOutcomes(std::span<const StoredOutcome> ended);

  // None where the job is not known, has not ended or was not measured.
  Result<std::optional<Outcome>> FindMeasured(const std::string& key);

  Result<std::optional<StoredJob>> FindJob(const std::string& key);

  // The keys that begin so, in order; the first `limit` of them.
  Result<std::vector<std::string>> KeysLike(const std::string& prefix,
                                            size_t limit);

  // A new run, in its first session.
  Result<RunId> BeginRun(const RunInfo& info);

  // The newest run of equal info that is not finished.
  Result<std::optional<RunRecord>> FindUnfinished(const RunInfo& info);

  // Begins a new session of a run.
  Status ResumeRun(RunId run);

  // For who looks on from another process: how far the run is, and that it
  // lives.
  Status NoteProgress(RunId run, const RunProgress& progress);

  // Keeps what the run gave, in place of what it gave before.  The rows are
  // asked for one at a time, and never are in memory together.  `next_row` may
  // read this store, but not write.
  Status FinishRun(RunId run, const std::string& head, const NextRow& next_row);

  Result<std::vector<RunRecord>> Runs();  // Oldest first.
  // None while the run is not finished.  Of a run that was finished before
  // rows were kept apart, all is in the head.
  Result<std::optional<RunText>> RunResults(RunId run);

  // Why the call that failed last did; kOther before any has.
  StoreTrouble trouble() const;

 private:
  struct Rep;

  explicit Store(std::unique_ptr<Rep> rep);

  std::unique_ptr<Rep> rep_;
};

}  // namespace gatedyno

#endif  // GATEDYNO_STORE_STORE_H_
