// Inside of a Store: the database and the statements it keeps prepared.
//
// For harness/store/*.cc only: it names SQLite.

#ifndef GATEDYNO_STORE_REP_H_
#define GATEDYNO_STORE_REP_H_

#include <cerrno>
#include <chrono>
#include <string>
#include <utility>

#include <SQLiteCpp/SQLiteCpp.h>
#include <fmt/format.h>

#include "harness/store/failure.h"
#include "harness/store/job_text.h"
#include "harness/store/store.h"

namespace gatedyno {

// What was measured stays: see the header.
inline constexpr char kSaveSql[] =
    "INSERT INTO job (key, label, ending, outcome, ended_ms, deck, measures) "
    "VALUES (?1, ?2, ?3, ?4, ?5, ?6, ?7) "
    "ON CONFLICT (key) DO UPDATE SET ending = excluded.ending, "
    "outcome = excluded.outcome, ended_ms = excluded.ended_ms "
    "WHERE ending IS NOT 'measured'";
inline constexpr char kFindMeasuredSql[] =
    "SELECT outcome FROM job WHERE key = ?1 AND ending = 'measured'";
inline constexpr char kFindJobSql[] =
    "SELECT label, deck, measures, outcome, ended_ms FROM job WHERE key = ?1";

// A kept statement in use.  One left in the middle of its rows would hold the
// file's state of that moment and keep the log from being cleared.
class InUse {
 public:
  explicit InUse(SQLite::Statement& statement) : statement_(statement) {}
  InUse(const InUse&) = delete;
  InUse& operator=(const InUse&) = delete;
  ~InUse() {
    statement_.tryReset();
    statement_.clearBindings();
  }

  SQLite::Statement* operator->() { return &statement_; }
  std::string Text(int column) {
    return statement_.getColumn(column).getString();
  }
  std::int64_t Number(int column) {
    return statement_.getColumn(column).getInt64();
  }

 private:
  SQLite::Statement& statement_;
};

struct Store::Rep {
  Rep(SQLite::Database opened, std::string name, std::chrono::milliseconds wait)
      : database(std::move(opened)),
        file(std::move(name)),
        busy_timeout(wait),
        save(database, kSaveSql),
        find_measured(database, kFindMeasuredSql),
        find_job(database, kFindJobSql) {}

  // Runs `work`, which returns a Result and may throw SQLite's exceptions.
  template <class Work>
  auto Guarded(Work work) -> decltype(work()) {
    errno = 0;
    try {
      auto result = work();
      trouble = result.ok() ? trouble : StoreTrouble::kOther;
      return result;
    } catch (const SQLite::Exception& thrown) {
      // Not sqlite3_system_errno(): it does not know why a commit failed.
      StoreFailure failure = DescribeFailure(file, thrown, busy_timeout, errno);
      trouble = failure.trouble;
      return tl::unexpected<Error>(std::move(failure.error));
    }
  }

  // Guarded, and all of it or nothing.
  template <class Work>
  auto InTransaction(Work work) -> decltype(work()) {
    return Guarded([&]() -> decltype(work()) {
      SQLite::Transaction transaction(database,
                                      SQLite::TransactionBehavior::IMMEDIATE);
      auto result = work();
      if (result.ok()) {
        transaction.commit();
      }
      return result;
    });
  }

  void Save(const Job& job, const Outcome& outcome) {
    const std::string ending(EndingName(outcome.ending));
    const std::string outcome_text = OutcomeToText(outcome);
    const std::string measures = MeasuresToText(job);
    InUse statement(save);
    statement->bindNoCopy(1, job.key);
    statement->bindNoCopy(2, job.label);
    statement->bindNoCopy(3, ending);
    statement->bindNoCopy(4, outcome_text);
    statement->bind(5, UnixNow());
    statement->bindNoCopy(6, job.deck);
    statement->bindNoCopy(7, measures);
    statement->exec();
  }

  // What a row says is ours to get right; the message still names the file.
  tl::unexpected<Error> Unreadable(const std::string& key, const Error& error) {
    return Internal(fmt::format("{}: job {}: {}", file, key, error.message));
  }

  tl::unexpected<Error> NoSuchRun(RunId run) {
    return BadInput(fmt::format("{}: there is no run {}", file, run));
  }

  SQLite::Database database;
  std::string file;
  std::chrono::milliseconds busy_timeout;
  SQLite::Statement save;
  SQLite::Statement find_measured;
  SQLite::Statement find_job;
  StoreTrouble trouble = StoreTrouble::kOther;
};

}  // namespace gatedyno

#endif  // GATEDYNO_STORE_REP_H_
