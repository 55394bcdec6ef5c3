// The store's runs; see store.h.

#include <utility>

#include <SQLiteCpp/SQLiteCpp.h>

#include "harness/store/rep.h"
#include "harness/store/store.h"

namespace gatedyno {
namespace {

constexpr char kBeginRun[] =
    "INSERT INTO run (plan, node, program_version, simulator_version, "
    "started_ms) VALUES (?1, ?2, ?3, ?4, ?5)";
constexpr char kFinishRun[] =
    "UPDATE run SET results = ?2, finished_ms = ?3 WHERE run_id = ?1";
constexpr char kRuns[] =
    "SELECT run_id, plan, node, program_version, simulator_version, "
    "started_ms, finished_ms FROM run ORDER BY run_id";
constexpr char kRunJobKeys[] =
    "SELECT key FROM run_job JOIN job USING (job_id) WHERE run_id = ?1 "
    "ORDER BY job_id";
constexpr char kRunResults[] = "SELECT results FROM run WHERE run_id = ?1";

}  // namespace

Result<RunId> Store::BeginRun(const RunInfo& info) {
  return rep_->InTransaction([&]() -> Result<RunId> {
    SQLite::Statement statement(rep_->database, kBeginRun);
    statement.bindNoCopy(1, info.plan);
    statement.bindNoCopy(2, info.node);
    statement.bindNoCopy(3, info.program_version);
    statement.bindNoCopy(4, info.simulator_version);
    statement.bind(5, Now());
    statement.exec();
    return rep_->database.getLastInsertRowid();
  });
}

Status Store::AddJobs(RunId run, std::span<const Job> jobs) {
  return rep_->InTransaction([&]() -> Status {
    if (!rep_->HasRun(run)) {
      return rep_->NoSuchRun(run);
    }
    for (const Job& job : jobs) {
      rep_->InsertJob(job);
      InUse statement(rep_->add_run_job);
      statement->bind(1, run);
      statement->bindNoCopy(2, job.key);
      statement->exec();
    }
    return Ok();
  });
}

Status Store::FinishRun(RunId run, const std::string& results) {
  return rep_->InTransaction([&]() -> Status {
    SQLite::Statement statement(rep_->database, kFinishRun);
    statement.bind(1, run);
    statement.bindNoCopy(2, results);
    statement.bind(3, Now());
    if (statement.exec() == 0) {
      return rep_->NoSuchRun(run);
    }
    return Ok();
  });
}

Result<std::vector<RunRecord>> Store::Runs() {
  return rep_->Guarded([&]() -> Result<std::vector<RunRecord>> {
    std::vector<RunRecord> runs;
    SQLite::Statement statement(rep_->database, kRuns);
    while (statement.executeStep()) {
      RunRecord run;
      run.id = statement.getColumn(0).getInt64();
      run.info = {.plan = statement.getColumn(1).getString(),
                  .node = statement.getColumn(2).getString(),
                  .program_version = statement.getColumn(3).getString(),
                  .simulator_version = statement.getColumn(4).getString()};
      run.started = statement.getColumn(5).getInt64();
      if (!statement.isColumnNull(6)) {
        run.finished = statement.getColumn(6).getInt64();
      }
      runs.push_back(std::move(run));
    }
    return runs;
  });
}

Result<std::vector<std::string>> Store::RunJobKeys(RunId run) {
  return rep_->Guarded([&]() -> Result<std::vector<std::string>> {
    if (!rep_->HasRun(run)) {
      return rep_->NoSuchRun(run);
    }
    std::vector<std::string> keys;
    SQLite::Statement statement(rep_->database, kRunJobKeys);
    statement.bind(1, run);
    while (statement.executeStep()) {
      keys.push_back(statement.getColumn(0).getString());
    }
    return keys;
  });
}

Result<std::optional<std::string>> Store::RunResults(RunId run) {
  return rep_->Guarded([&]() -> Result<std::optional<std::string>> {
    SQLite::Statement statement(rep_->database, kRunResults);
    statement.bind(1, run);
    if (!statement.executeStep()) {
      return rep_->NoSuchRun(run);
    }
    if (statement.isColumnNull(0)) {
      return std::nullopt;
    }
    return statement.getColumn(0).getString();
  });
}

}  // namespace gatedyno
