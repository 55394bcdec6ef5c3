// The tables of a store and how an older file gets them.
//
// `PRAGMA application_id` marks a file as ours and `PRAGMA user_version` holds
// the schema it was last migrated to.  Migrations only go forward, all of them
// in one transaction: a file is at its old version or at the newest.
//
// To change the schema: add a row to kMigrations in schema.cc, never edit one.

#ifndef GATEDYNO_STORE_SCHEMA_H_
#define GATEDYNO_STORE_SCHEMA_H_

#include <string>

#include "harness/base/result.h"

namespace SQLite {  // NOLINT(readability-identifier-naming)
class Database;
}  // namespace SQLite

namespace gatedyno {

// "gdyn" in ASCII.
inline constexpr int kStoreApplicationId = 0x6764796e;

// The version this program writes.
int NewestSchema();

// Makes the tables of a new file, or brings an older one up to date.  Refuses a
// newer file and one that is not a store.  Throws SQLite::Exception on what
// the database itself refuses.
Status PrepareSchema(SQLite::Database& database, const std::string& file);

// For a file that may not be written: refuses an older one as well.
Status CheckSchema(SQLite::Database& database, const std::string& file);

}  // namespace gatedyno

#endif  // GATEDYNO_STORE_SCHEMA_H_
