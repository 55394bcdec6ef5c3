// The database of a store, ready for use.
//
// For harness/store/*.cc only: it names SQLite.

#ifndef GATEDYNO_STORE_OPEN_DATABASE_H_
#define GATEDYNO_STORE_OPEN_DATABASE_H_

#include <filesystem>

#include <SQLiteCpp/Database.h>

#include "harness/base/result.h"
#include "harness/store/store.h"

namespace gatedyno {

// With the newest tables; see Store::Open.
Result<SQLite::Database> OpenDatabase(const std::filesystem::path& path,
                                      const StoreOptions& options);

}  // namespace gatedyno

#endif  // GATEDYNO_STORE_OPEN_DATABASE_H_
