// Inside of a Store: the database and the statements it keeps prepared.
//
// For harness/store/*.cc only: it names SQLite.

#ifndef GATEDYNO_STORE_REP_H_
#define GATEDYNO_STORE_REP_H_

#include <chrono>
#include <string>
#include <utility>

#include <SQLiteCpp/SQLiteCpp.h>
#include <fmt/format.h>

#include "harness/store/failure.h"
#include "harness/store/job_text.h"
#include "harness/store/store.h"

namespace gatedyno {

// The upserts end in DO NOTHING or keep what was measured: see the header.
inline constexpr char kInsertJobSql[] =
    "INSERT INTO job (key, label, deck, measures) VALUES (?1, ?2, ?3, ?4) "
    "ON CONFLICT (key) DO NOTHING";
inline constexpr char kSaveOutcomeSql[] =
    "INSERT INTO outcome (job_id, ending, outcome, ended_ms) "
    "SELECT job_id, ?2, ?3, ?4 FROM job WHERE key = ?1 "
    "ON CONFLICT (job_id) DO UPDATE SET ending = excluded.ending, "
    "outcome = excluded.outcome, ended_ms = excluded.ended_ms "
    "WHERE outcome.ending <> 'measured'";
inline constexpr char kFindMeasuredSql[] =
    "SELECT outcome FROM outcome JOIN job USING (job_id) "
    "WHERE key = ?1 AND ending = 'measured'";
inline constexpr char kFindJobSql[] =
    "SELECT label, deck, measures, outcome, ended_ms "
    "FROM job LEFT JOIN outcome USING (job_id) WHERE key = ?1";
inline constexpr char kAddRunJobSql[] =
    "INSERT INTO run_job (run_id, job_id) "
    "SELECT ?1, job_id FROM job WHERE key = ?2 ON CONFLICT DO NOTHING";

inline UnixMilliseconds Now() {
  const auto since_1970 = std::chrono::system_clock::now().time_since_epoch();
  return std::chrono::duration_cast<std::chrono::milliseconds>(since_1970)
      .count();
}

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
        insert_job(database, kInsertJobSql),
        save_outcome(database, kSaveOutcomeSql),
        find_measured(database, kFindMeasuredSql),
        find_job(database, kFindJobSql),
        add_run_job(database, kAddRunJobSql) {}

  // Runs `work`, which returns a Result and may throw SQLite's exceptions.
  template <class Work>
  auto Guarded(Work work) -> decltype(work()) {
    try {
      return work();
    } catch (const SQLite::Exception& thrown) {
      return tl::unexpected<Error>(DescribeFailure(file, thrown, busy_timeout));
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

  void InsertJob(const Job& job) {
    const std::string measures = MeasuresToText(job);
    InUse statement(insert_job);
    statement->bindNoCopy(1, job.key);
    statement->bindNoCopy(2, job.label);
    statement->bindNoCopy(3, job.deck);
    statement->bindNoCopy(4, measures);
    statement->exec();
  }

  // What a row says is ours to get right; the message still names the file.
  tl::unexpected<Error> Unreadable(const std::string& key, const Error& error) {
    return Internal(fmt::format("{}: job {}: {}", file, key, error.message));
  }

  bool HasRun(RunId run) {
    SQLite::Statement statement(database, "SELECT 1 FROM run WHERE run_id = ?");
    statement.bind(1, run);
    return statement.executeStep();
  }

  tl::unexpected<Error> NoSuchRun(RunId run) {
    return BadInput(fmt::format("{}: there is no run {}", file, run));
  }

  SQLite::Database database;
  std::string file;
  std::chrono::milliseconds busy_timeout;
  SQLite::Statement insert_job;
  SQLite::Statement save_outcome;
  SQLite::Statement find_measured;
  SQLite::Statement find_job;
  SQLite::Statement add_run_job;
};

}  // namespace gatedyno

#endif  // GATEDYNO_STORE_REP_H_
