#include "harness/store/store.h"

#include <chrono>
#include <cmath>
#include <system_error>
#include <thread>
#include <utility>

#include <SQLiteCpp/SQLiteCpp.h>
#include <fmt/format.h>
#include <sqlite3.h>

#include "harness/store/failure.h"
#include "harness/store/job_text.h"
#include "harness/store/rep.h"
#include "harness/store/schema.h"

namespace gatedyno {
namespace {

// The write-ahead log lets others read during a write.  SQLite does not wait
// where two processes turn a new file to it at once, so this does.
void UseLog(SQLite::Database& database, std::chrono::milliseconds wait) {
  constexpr std::chrono::milliseconds kPause(5);
  const auto deadline = std::chrono::steady_clock::now() + wait;
  while (database.tryExec("PRAGMA journal_mode = WAL") == SQLITE_BUSY &&
         std::chrono::steady_clock::now() < deadline) {
    std::this_thread::sleep_for(kPause);
  }
  database.exec("PRAGMA journal_mode = WAL");
}

Status CheckFinite(const Job& job, const Outcome& outcome) {
  for (const auto& [name, value_s] : outcome.values_s) {
    if (!std::isfinite(value_s)) {
      return Internal(
          fmt::format("{}: '{}' was measured as {}", job.label, name, value_s));
    }
  }
  return Ok();
}

}  // namespace

Store::Store(std::unique_ptr<Rep> rep) : rep_(std::move(rep)) {}
Store::Store(Store&& other) noexcept = default;
Store& Store::operator=(Store&& other) noexcept = default;
Store::~Store() = default;

Result<Store> Store::Open(const std::filesystem::path& path,
                          const StoreOptions& options) {
  const std::string file = path.string();
  std::error_code ignored;
  if (!options.create && !std::filesystem::exists(path, ignored)) {
    return BadInput(fmt::format("{}: no such store", file));
  }
  try {
    const int flags =
        SQLite::OPEN_READWRITE | (options.create ? SQLite::OPEN_CREATE : 0);
    SQLite::Database database(
        file, flags, static_cast<int>(options.busy_timeout.count()));
    if (const Status ready = PrepareSchema(database, file); !ready.ok()) {
      return Forward(ready);
    }
    // NORMAL waits for the disk when the log is cleared, not after every
    // transaction.
    UseLog(database, options.busy_timeout);
    database.exec("PRAGMA synchronous = NORMAL");
    database.exec("PRAGMA foreign_keys = ON");
    return Store(
        std::make_unique<Rep>(std::move(database), file, options.busy_timeout));
  } catch (const SQLite::Exception& thrown) {
    return tl::unexpected<Error>(
        DescribeFailure(file, thrown, options.busy_timeout));
  }
}

Status Store::SaveOutcome(const Job& job, const Outcome& outcome) {
  if (Status finite = CheckFinite(job, outcome); !finite.ok()) {
    return finite;
  }
  return rep_->InTransaction([&]() -> Status {
    rep_->InsertJob(job);
    InUse statement(rep_->save_outcome);
    statement->bindNoCopy(1, job.key);
    statement->bind(2, std::string(EndingName(outcome.ending)));
    statement->bind(3, OutcomeToText(outcome));
    statement->bind(4, Now());
    statement->exec();
    return Ok();
  });
}

Result<std::optional<Outcome>> Store::FindMeasured(const std::string& key) {
  return rep_->Guarded([&]() -> Result<std::optional<Outcome>> {
    InUse statement(rep_->find_measured);
    statement->bindNoCopy(1, key);
    if (!statement->executeStep()) {
      return std::nullopt;
    }
    Result<Outcome> outcome = OutcomeFromText(statement.Text(0));
    if (!outcome.ok()) {
      return rep_->Unreadable(key, outcome.error());
    }
    return std::move(*outcome);
  });
}

Result<std::optional<StoredJob>> Store::FindJob(const std::string& key) {
  return rep_->Guarded([&]() -> Result<std::optional<StoredJob>> {
    InUse statement(rep_->find_job);
    statement->bindNoCopy(1, key);
    if (!statement->executeStep()) {
      return std::nullopt;
    }
    Job named;
    named.key = key;
    named.label = statement.Text(0);
    named.deck = statement.Text(1);
    Result<Job> job = JobFromText(named, statement.Text(2));
    if (!job.ok()) {
      return rep_->Unreadable(key, job.error());
    }
    StoredJob stored;
    stored.job = std::move(*job);
    if (!statement->isColumnNull(3)) {
      Result<Outcome> outcome = OutcomeFromText(statement.Text(3));
      if (!outcome.ok()) {
        return rep_->Unreadable(key, outcome.error());
      }
      stored.outcome = std::move(*outcome);
      stored.ended = statement.Number(4);
    }
    return stored;
  });
}

}  // namespace gatedyno
