#include "harness/store/schema.h"

#include <fstream>
#include <string>
#include <vector>

#include <SQLiteCpp/SQLiteCpp.h>
#include <fmt/format.h>
#include <gtest/gtest.h>

#include "tests/store/store_fixture.h"

namespace gatedyno {
namespace {

class SchemaTest : public StoreFixture {
 protected:
  SQLite::Database Raw() const {
    return SQLite::Database(Path().string(),
                            SQLite::OPEN_READWRITE | SQLite::OPEN_CREATE);
  }
};

TEST_F(SchemaTest, AFileSaysWhatItIs) {
  ASSERT_TRUE(Store::Open(Path()).ok());
  SQLite::Database raw = Raw();
  EXPECT_EQ(raw.execAndGet("PRAGMA application_id").getInt(),
            kStoreApplicationId);
  EXPECT_EQ(raw.execAndGet("PRAGMA user_version").getInt(), NewestSchema());
  EXPECT_EQ(raw.execAndGet("PRAGMA journal_mode").getString(), "wal");
}

TEST_F(SchemaTest, RefusesANewerFileAndLeavesItAlone) {
  ASSERT_TRUE(Store::Open(Path()).ok());
  Raw().exec("PRAGMA user_version = 7");
  const Result<Store> store = Store::Open(Path());
  ASSERT_FALSE(store.ok());
  EXPECT_EQ(store.error().kind, ErrorKind::kBadInput);
  EXPECT_EQ(store.error().message,
            fmt::format("{}: written by a newer gatedyno (schema 7, this "
                        "program knows {})",
                        Path().string(),
                        NewestSchema()));
  EXPECT_EQ(Raw().execAndGet("PRAGMA user_version").getInt(), 7);
}

TEST_F(SchemaTest, RefusesWhatIsNotOurs) {
  struct Case {
    const char* what;
    const char* sql;  // Of another program's database; none: a text file.
  };
  constexpr Case kCases[] = {
      {"marked by another program", "PRAGMA application_id = 252006673"},
      {"unmarked, with tables", "CREATE TABLE song (title TEXT)"},
      {"unmarked, with a version", "PRAGMA user_version = 1"},
      {"no database", nullptr},
  };
  for (const Case& test : kCases) {
    SCOPED_TRACE(test.what);
    std::filesystem::remove(Path());
    if (test.sql != nullptr) {
      Raw().exec(test.sql);
    } else {
      std::ofstream(Path()) << std::string(2000, 'x');
    }
    const auto size = std::filesystem::file_size(Path());
    const Result<Store> store = Store::Open(Path());
    ASSERT_FALSE(store.ok());
    EXPECT_EQ(store.error().kind, ErrorKind::kBadInput);
    EXPECT_EQ(store.error().message,
              Path().string() + ": not a gatedyno store");
    EXPECT_EQ(std::filesystem::file_size(Path()), size);
  }
}

TEST_F(SchemaTest, AnEmptyFileIsANewStore) {
  std::ofstream(Path()).close();
  EXPECT_TRUE(Store::Open(Path()).ok());
}

// A file as version 1 wrote it must open, whatever later versions add.  Frozen:
// a copy of the first schema, not of what the program has today.
constexpr char kFirstVersion[] = R"sql(
    PRAGMA application_id = 1734637934;
    PRAGMA user_version = 1;
    CREATE TABLE job (job_id INTEGER PRIMARY KEY, key TEXT NOT NULL UNIQUE,
      label TEXT NOT NULL, deck TEXT NOT NULL, measures TEXT NOT NULL) STRICT;
    CREATE TABLE outcome (job_id INTEGER PRIMARY KEY REFERENCES job,
      ending TEXT NOT NULL, outcome TEXT NOT NULL,
      ended_ms INTEGER NOT NULL) STRICT;
    CREATE TABLE run (run_id INTEGER PRIMARY KEY AUTOINCREMENT,
      plan TEXT NOT NULL, node TEXT NOT NULL, program_version TEXT NOT NULL,
      simulator_version TEXT NOT NULL, started_ms INTEGER NOT NULL,
      finished_ms INTEGER, results TEXT) STRICT;
    CREATE TABLE run_job (run_id INTEGER NOT NULL REFERENCES run,
      job_id INTEGER NOT NULL REFERENCES job,
      PRIMARY KEY (run_id, job_id)) STRICT, WITHOUT ROWID;
    INSERT INTO job VALUES
      (1, '00ff', 'inv a->y h=4', '* inv' || char(10) || '.end',
       '{"intervals": [{"name": "delay",
          "from": {"net": "a", "level_v": 0.5, "edge": "rise",
                   "occurrence": 2},
          "to": {"net": "y", "level_v": 0.5, "edge": "fall",
                 "occurrence": 1}}],
         "swings": [], "stop_s": 1e-9, "time_limit_s": 60}'),
      (2, '01ff', 'inv a->y h=6', '.end',
       '{"intervals": [], "swings": [], "stop_s": 2e-9, "time_limit_s": 60}'),
      (3, '02ff', 'inv a->y h=8', '.end',
       '{"intervals": [], "swings": [], "stop_s": 3e-9, "time_limit_s": 60}'),
      (4, '03ff', 'inv a->y h=9', '.end', 'no JSON');
    INSERT INTO outcome VALUES
      (1, 'measured',
       '{"ending": "measured", "values_s": {"delay": 3.3333333333333335e-12},
         "message": "", "simulator_s": 0.01}', 1700000000000),
      (2, 'crashed',
       '{"ending": "crashed", "values_s": {}, "message": "signal \"11\"",
         "simulator_s": 0.0}', 1700000000002);
    INSERT INTO run VALUES
      (1, '{"title": "arbiter"}', 'p45', '0.1.0', '39.3', 1700000000000,
       1700000000001, '{"comparisons": [1, 2]}'),
      (3, '{}', 'p65', '0.1.0', '39.3', 1700000000005, NULL, NULL);
    INSERT INTO run_job VALUES (1, 1), (1, 2), (3, 3);
)sql";

class FirstVersionTest : public SchemaTest {
 protected:
  Store Opened() {
    Raw().exec(kFirstVersion);
    return Store::Open(Path()).value();
  }
};

TEST_F(FirstVersionTest, HasItsJobs) {
  Store store = Opened();
  EXPECT_EQ(Raw().execAndGet("PRAGMA user_version").getInt(), NewestSchema());
  const StoredJob first = store.FindJob("00ff").value().value();
  EXPECT_EQ(first.job.label, "inv a->y h=4");
  EXPECT_EQ(first.job.deck, "* inv\n.end");
  EXPECT_EQ(DeckText(first.job, 0), first.job.deck);
  EXPECT_TRUE(first.job.settings.empty());
  ASSERT_EQ(first.job.intervals.size(), 1U);
  EXPECT_EQ(first.job.intervals[0].from.occurrence, 2);
  EXPECT_EQ(first.job.stop_s, 1e-9);
  EXPECT_EQ(first.job.time_limit_s, 60.0);
  EXPECT_EQ(store.FindJob("01ff").value()->job.stop_s, 2e-9);
  EXPECT_EQ(store.FindJob("02ff").value()->job.stop_s, 3e-9);
  // What was not sound before is so still, and no reason to refuse the rest.
  EXPECT_FALSE(store.FindJob("03ff").ok());
}

TEST_F(FirstVersionTest, HasItsOutcomes) {
  Store store = Opened();
  const Outcome measured = store.FindMeasured("00ff").value().value();
  EXPECT_EQ(measured.values_s.at("delay"), 3.3333333333333335e-12);
  EXPECT_EQ(measured.simulator_s, 0.01);
  EXPECT_EQ(measured.rung, 0);
  const StoredJob crashed = store.FindJob("01ff").value().value();
  EXPECT_EQ(crashed.outcome->ending, Ending::kCrashed);
  EXPECT_EQ(crashed.outcome->message, "signal \"11\"");
  EXPECT_EQ(crashed.outcome->rung, 0);
  EXPECT_EQ(crashed.ended, 1700000000002);
  EXPECT_FALSE(store.FindJob("02ff").value()->outcome.has_value());
}

TEST_F(FirstVersionTest, HasItsRuns) {
  Store store = Opened();
  const std::vector<RunRecord> runs = store.Runs().value();
  ASSERT_EQ(runs.size(), 2U);
  EXPECT_EQ(runs[0].info.plan, R"({"title": "arbiter"})");
  EXPECT_EQ(runs[0].info.node, "p45");
  EXPECT_EQ(runs[0].started, 1700000000000);
  EXPECT_EQ(runs[0].session_started, 1700000000000);
  EXPECT_EQ(runs[0].finished, 1700000000001);
  EXPECT_EQ(runs[0].progressed, 1700000000001);
  EXPECT_FALSE(runs[0].progress.has_value());
  const RunText text = store.RunResults(1).value().value();
  EXPECT_EQ(text.head, R"({"comparisons": [1, 2]})");
  EXPECT_TRUE(text.rows.empty());
  EXPECT_EQ(runs[1].id, 3);
  EXPECT_FALSE(runs[1].finished.has_value());
  EXPECT_FALSE(store.RunResults(3).value().has_value());
  // Ids go on from there.
  EXPECT_EQ(store.BeginRun(runs[1].info).value(), 4);
}

TEST_F(FirstVersionTest, IsMigratedOnce) {
  { const Store store = Opened(); }
  Store store = Store::Open(Path()).value();
  EXPECT_TRUE(store.FindMeasured("00ff").value().has_value());
  EXPECT_EQ(store.Runs().value().size(), 2U);
}

}  // namespace
}  // namespace gatedyno
