#include "harness/store/schema.h"

#include <iterator>

#include <SQLiteCpp/Database.h>
#include <SQLiteCpp/Transaction.h>
#include <fmt/format.h>

namespace gatedyno {
namespace {

struct Migration {
  int to_version;
  const char* sql;
};

// Times are milliseconds since 1970, UTC.
constexpr Migration kMigrations[] = {
    {1, R"sql(
      -- One row a distinct job; `measures` is the job without key, label and
      -- deck, as JSON.
      CREATE TABLE job (
        job_id INTEGER PRIMARY KEY,
        key TEXT NOT NULL UNIQUE,
        label TEXT NOT NULL,
        deck TEXT NOT NULL,
        measures TEXT NOT NULL
      ) STRICT;
      -- How it ended last; `outcome` is the whole outcome as JSON.
      CREATE TABLE outcome (
        job_id INTEGER PRIMARY KEY REFERENCES job,
        ending TEXT NOT NULL,
        outcome TEXT NOT NULL,
        ended_ms INTEGER NOT NULL
      ) STRICT;
      CREATE TABLE run (
        run_id INTEGER PRIMARY KEY AUTOINCREMENT,
        plan TEXT NOT NULL,
        node TEXT NOT NULL,
        program_version TEXT NOT NULL,
        simulator_version TEXT NOT NULL,
        started_ms INTEGER NOT NULL,
        finished_ms INTEGER,
        results TEXT
      ) STRICT;
      CREATE TABLE run_job (
        run_id INTEGER NOT NULL REFERENCES run,
        job_id INTEGER NOT NULL REFERENCES job,
        PRIMARY KEY (run_id, job_id)
      ) STRICT, WITHOUT ROWID;
    )sql"},
    {2, R"sql(
      -- One row a distinct job and how it ended last, so that keeping both
      -- writes to one place.  `outcome` is the whole outcome as JSON, all three
      -- NULL of a job that has not ended; `measures` is the job without key,
      -- label and deck, as JSON.  What is asked for most comes before the deck,
      -- which spills over into pages of its own.
      ALTER TABLE job RENAME TO job_1;
      CREATE TABLE job (
        job_id INTEGER PRIMARY KEY,
        key TEXT NOT NULL UNIQUE,
        label TEXT NOT NULL,
        ending TEXT,
        outcome TEXT,
        ended_ms INTEGER,
        deck TEXT NOT NULL,
        measures TEXT NOT NULL
      ) STRICT;
      -- Jobs had one set of simulator settings, in the deck.
      INSERT INTO job
        SELECT job_id, key, label, ending,
               iif(json_valid(outcome),
                   json_insert(outcome, '$.rung', 0), outcome),
               ended_ms, deck,
               iif(json_valid(measures),
                   json_insert(measures, '$.settings', json('[]')), measures)
        FROM job_1 LEFT JOIN outcome USING (job_id);
      -- A run's rows name their jobs themselves.
      DROP TABLE run_job;
      DROP TABLE outcome;
      DROP TABLE job_1;
      -- `head` is what a run gave but for its rows; all of it in the runs
      -- finished before.
      ALTER TABLE run RENAME COLUMN results TO head;
      CREATE TABLE run_row (
        run_id INTEGER NOT NULL REFERENCES run,
        position INTEGER NOT NULL,
        row TEXT NOT NULL,
        PRIMARY KEY (run_id, position)
      ) STRICT, WITHOUT ROWID;
      -- The newest session; `progress` is the progress last noted as JSON.
      ALTER TABLE run ADD COLUMN session_ms INTEGER;
      ALTER TABLE run ADD COLUMN progress TEXT;
      ALTER TABLE run ADD COLUMN progressed_ms INTEGER;
    )sql"},
};

int ReadNumber(SQLite::Database& database, const char* query) {
  return database.execAndGet(query).getInt();
}

// The schema of a file that is ours, 0 of a new one.  Inside a transaction of
// the caller's, or another process might make the tables between two readings.
Result<int> ReadVersion(SQLite::Database& database, const std::string& file) {
  const int application = ReadNumber(database, "PRAGMA application_id");
  const int version = ReadNumber(database, "PRAGMA user_version");
  const bool empty =
      ReadNumber(database, "SELECT count(*) FROM sqlite_master") == 0;
  const bool fresh = application == 0 && version == 0 && empty;
  if (application != kStoreApplicationId && !fresh) {
    return BadInput(fmt::format("{}: not a gatedyno store", file));
  }
  if (version > NewestSchema()) {
    return BadInput(fmt::format(
        "{}: written by a newer gatedyno (schema {}, this program knows {})",
        file,
        version,
        NewestSchema()));
  }
  return version;
}

Result<int> LookAtVersion(SQLite::Database& database, const std::string& file) {
  const SQLite::Transaction reading(database);
  return ReadVersion(database, file);
}

// The version is read again: another process may have been first while this one
// waited for the lock.
Status Migrate(SQLite::Database& database, const std::string& file) {
  SQLite::Transaction transaction(database,
                                  SQLite::TransactionBehavior::IMMEDIATE);
  const Result<int> version = ReadVersion(database, file);
  if (!version.ok()) {
    return Forward(version);
  }
  for (const Migration& migration : kMigrations) {
    if (migration.to_version > *version) {
      database.exec(migration.sql);
    }
  }
  database.exec(fmt::format("PRAGMA application_id = {}", kStoreApplicationId));
  database.exec(fmt::format("PRAGMA user_version = {}", NewestSchema()));
  transaction.commit();
  return Ok();
}

}  // namespace

int NewestSchema() {
  return std::end(kMigrations)[-1].to_version;
}

Status PrepareSchema(SQLite::Database& database, const std::string& file) {
  const Result<int> version = LookAtVersion(database, file);
  if (!version.ok()) {
    return Forward(version);
  }
  return *version == NewestSchema() ? Ok() : Migrate(database, file);
}

Status CheckSchema(SQLite::Database& database, const std::string& file) {
  const Result<int> version = LookAtVersion(database, file);
  if (!version.ok()) {
    return Forward(version);
  }
  if (*version == 0) {
    return BadInput(fmt::format("{}: not a gatedyno store", file));
  }
  if (*version < NewestSchema()) {
    return BadInput(fmt::format(
        "{0}: written by an older gatedyno (schema {1}, this program reads "
        "{2}); 'gatedyno run' with '--store {0}' brings it up to date",
        file,
        *version,
        NewestSchema()));
  }
  return Ok();
}

}  // namespace gatedyno
