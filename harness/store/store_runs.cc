// The store's runs; see store.h.

#include <utility>

#include <SQLiteCpp/SQLiteCpp.h>
#include <fmt/format.h>

#include "harness/store/rep.h"
#include "harness/store/store.h"

namespace gatedyno {
namespace {

constexpr char kBeginRun[] =
    "INSERT INTO run (plan, node, program_version, simulator_version, "
    "started_ms) VALUES (?1, ?2, ?3, ?4, ?5)";
constexpr char kResumeRun[] =
    "UPDATE run SET session_ms = ?2 WHERE run_id = ?1";
constexpr char kNoteProgress[] =
    "UPDATE run SET progress = ?2, progressed_ms = ?3 WHERE run_id = ?1";
constexpr char kFinishRun[] =
    "UPDATE run SET head = ?2, finished_ms = ?3 WHERE run_id = ?1";
constexpr char kDropRows[] = "DELETE FROM run_row WHERE run_id = ?1";
constexpr char kAddRow[] =
    "INSERT INTO run_row (run_id, position, row) VALUES (?1, ?2, ?3)";
constexpr char kHead[] = "SELECT head FROM run WHERE run_id = ?1";
constexpr char kRows[] =
    "SELECT row FROM run_row WHERE run_id = ?1 ORDER BY position";
constexpr char kUnfinished[] =
    "WHERE finished_ms IS NULL AND plan = ?1 AND node = ?2 AND "
    "program_version = ?3 AND simulator_version = ?4 "
    "ORDER BY run_id DESC LIMIT 1";

// The columns ReadRun expects.
std::string SelectRuns(const char* which) {
  return fmt::format(
      "SELECT run_id, plan, node, program_version, simulator_version, "
      "started_ms, coalesce(session_ms, started_ms), "
      "max(started_ms, ifnull(session_ms, 0), ifnull(progressed_ms, 0), "
      "ifnull(finished_ms, 0)), finished_ms, progress FROM run {}",
      which);
}

void BindInfo(const RunInfo& info, SQLite::Statement* statement) {
  statement->bindNoCopy(1, info.plan);
  statement->bindNoCopy(2, info.node);
  statement->bindNoCopy(3, info.program_version);
  statement->bindNoCopy(4, info.simulator_version);
}

Result<RunRecord> ReadRun(SQLite::Statement& row, const std::string& file) {
  RunRecord run;
  run.id = row.getColumn(0).getInt64();
  run.info = {.plan = row.getColumn(1).getString(),
              .node = row.getColumn(2).getString(),
              .program_version = row.getColumn(3).getString(),
              .simulator_version = row.getColumn(4).getString()};
  run.started = row.getColumn(5).getInt64();
  run.session_started = row.getColumn(6).getInt64();
  run.progressed = row.getColumn(7).getInt64();
  if (!row.isColumnNull(8)) {
    run.finished = row.getColumn(8).getInt64();
  }
  if (!row.isColumnNull(9)) {
    Result<RunProgress> progress =
        ProgressFromText(row.getColumn(9).getString());
    if (!progress.ok()) {
      return Internal(fmt::format(
          "{}: run {}: {}", file, run.id, progress.error().message));
    }
    run.progress = *std::move(progress);
  }
  return run;
}

void AddRows(SQLite::Database& database, RunId run, const NextRow& next_row) {
  SQLite::Statement statement(database, kAddRow);
  std::int64_t position = 0;
  while (const std::optional<std::string> row = next_row()) {
    InUse adding(statement);
    adding->bind(1, run);
    adding->bind(2, position++);
    adding->bindNoCopy(3, *row);
    adding->exec();
  }
}

std::vector<std::string> ReadRows(SQLite::Database& database, RunId run) {
  std::vector<std::string> rows;
  SQLite::Statement statement(database, kRows);
  statement.bind(1, run);
  while (statement.executeStep()) {
    rows.push_back(statement.getColumn(0).getString());
  }
  return rows;
}

}  // namespace

Result<RunId> Store::BeginRun(const RunInfo& info) {
  return rep_->InTransaction([&]() -> Result<RunId> {
    SQLite::Statement statement(rep_->database, kBeginRun);
    BindInfo(info, &statement);
    statement.bind(5, UnixNow());
    statement.exec();
    return rep_->database.getLastInsertRowid();
  });
}

Result<std::optional<RunRecord>> Store::FindUnfinished(const RunInfo& info) {
  return rep_->Guarded([&]() -> Result<std::optional<RunRecord>> {
    SQLite::Statement statement(rep_->database, SelectRuns(kUnfinished));
    BindInfo(info, &statement);
    if (!statement.executeStep()) {
      return std::nullopt;
    }
    Result<RunRecord> run = ReadRun(statement, rep_->file);
    if (!run.ok()) {
      return Forward(run);
    }
    return *std::move(run);
  });
}

Status Store::ResumeRun(RunId run) {
  return rep_->InTransaction([&]() -> Status {
    SQLite::Statement statement(rep_->database, kResumeRun);
    statement.bind(1, run);
    statement.bind(2, UnixNow());
    return statement.exec() == 0 ? rep_->NoSuchRun(run) : Ok();
  });
}

Status Store::NoteProgress(RunId run, const RunProgress& progress) {
  return rep_->InTransaction([&]() -> Status {
    SQLite::Statement statement(rep_->database, kNoteProgress);
    statement.bind(1, run);
    statement.bind(2, ProgressToText(progress));
    statement.bind(3, UnixNow());
    return statement.exec() == 0 ? rep_->NoSuchRun(run) : Ok();
  });
}

Status Store::FinishRun(RunId run,
                        const std::string& head,
                        const NextRow& next_row) {
  return rep_->InTransaction([&]() -> Status {
    SQLite::Statement drop(rep_->database, kDropRows);
    drop.bind(1, run);
    drop.exec();
    SQLite::Statement finish(rep_->database, kFinishRun);
    finish.bind(1, run);
    finish.bindNoCopy(2, head);
    finish.bind(3, UnixNow());
    if (finish.exec() == 0) {
      return rep_->NoSuchRun(run);
    }
    AddRows(rep_->database, run, next_row);
    return Ok();
  });
}

Result<std::vector<RunRecord>> Store::Runs() {
  return rep_->Guarded([&]() -> Result<std::vector<RunRecord>> {
    std::vector<RunRecord> runs;
    SQLite::Statement statement(rep_->database, SelectRuns("ORDER BY run_id"));
    while (statement.executeStep()) {
      Result<RunRecord> run = ReadRun(statement, rep_->file);
      if (!run.ok()) {
        return Forward(run);
      }
      runs.push_back(*std::move(run));
    }
    return runs;
  });
}

Result<std::optional<RunText>> Store::RunResults(RunId run) {
  return rep_->Guarded([&]() -> Result<std::optional<RunText>> {
    // Head and rows of the same moment.
    const SQLite::Transaction reading(rep_->database);
    SQLite::Statement statement(rep_->database, kHead);
    statement.bind(1, run);
    if (!statement.executeStep()) {
      return rep_->NoSuchRun(run);
    }
    if (statement.isColumnNull(0)) {
      return std::nullopt;
    }
    RunText text;
    text.head = statement.getColumn(0).getString();
    text.rows = ReadRows(rep_->database, run);
    return text;
  });
}

}  // namespace gatedyno
