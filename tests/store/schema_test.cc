#include "harness/store/schema.h"

#include <fstream>
#include <string>

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
TEST_F(SchemaTest, OpensAFileOfTheFirstVersion) {
  Raw().exec(R"sql(
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
    INSERT INTO job VALUES (1, '00ff', 'inv a->y h=4', '.end',
      '{"intervals": [], "swings": [], "stop_s": 1e-9, "time_limit_s": 60}');
    INSERT INTO outcome VALUES (1, 'measured',
      '{"ending": "measured", "values_s": {"delay": 8.3e-12}, "message": "",
        "simulator_s": 0.01}', 1700000000000);
    INSERT INTO run VALUES (1, '{}', 'p45', '0.1.0', '39.3', 1700000000000,
      1700000000001, '[]');
    INSERT INTO run_job VALUES (1, 1);
  )sql");
  Result<Store> store = Store::Open(Path());
  ASSERT_TRUE(store.ok()) << store.error().message;
  EXPECT_EQ(store->FindMeasured("00ff").value()->values_s.at("delay"), 8.3e-12);
  EXPECT_EQ(store->FindJob("00ff").value()->job.stop_s, 1e-9);
  EXPECT_EQ(store->RunJobKeys(1).value().size(), 1U);
  EXPECT_EQ(store->Runs().value().at(0).started, 1700000000000);
}

}  // namespace
}  // namespace gatedyno
