#include "harness/store/store.h"

#include <cmath>
#include <cstdint>
#include <utility>

#include <SQLiteCpp/SQLiteCpp.h>
#include <fmt/format.h>

#include "harness/store/failure.h"
#include "harness/store/job_text.h"
#include "harness/store/open_database.h"
#include "harness/store/rep.h"

namespace gatedyno {
namespace {

// A range, which the index of the keys answers; no key goes on with the last
// code point there is.
constexpr char kKeysLikeSql[] =
    "SELECT key FROM job WHERE key >= ?1 AND key < ?1 || char(1114111) "
    "ORDER BY key LIMIT ?2";

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
  Result<SQLite::Database> database = OpenDatabase(path, options);
  if (!database.ok()) {
    return Forward(database);
  }
  const std::string file = path.string();
  try {
    return Store(std::make_unique<Rep>(
        *std::move(database), file, options.busy_timeout));
  } catch (const SQLite::Exception& thrown) {
    return tl::unexpected<Error>(
        DescribeFailure(file, thrown, options.busy_timeout).error);
  }
}

Status Store::SaveOutcome(const Job& job, const Outcome& outcome) {
  // One statement is a transaction of its own.
  return rep_->Guarded([&]() -> Status {
    Status finite = CheckFinite(job, outcome);
    if (finite.ok()) {
      rep_->Save(job, outcome);
    }
    return finite;
  });
}

Status Store::SaveOutcomes(std::span<const StoredOutcome> ended) {
  return rep_->InTransaction([&]() -> Status {
    for (const auto& [job, outcome] : ended) {
      Status finite = CheckFinite(job, outcome);
      if (!finite.ok()) {
        return finite;
      }
      rep_->Save(job, outcome);
    }
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

Result<std::vector<std::string>> Store::KeysLike(const std::string& prefix,
                                                 size_t limit) {
  return rep_->Guarded([&]() -> Result<std::vector<std::string>> {
    SQLite::Statement statement(rep_->database, kKeysLikeSql);
    statement.bindNoCopy(1, prefix);
    statement.bind(2, static_cast<std::int64_t>(limit));
    std::vector<std::string> keys;
    while (statement.executeStep()) {
      keys.push_back(statement.getColumn(0).getString());
    }
    return keys;
  });
}

StoreTrouble Store::trouble() const {
  return rep_->trouble;
}

}  // namespace gatedyno
