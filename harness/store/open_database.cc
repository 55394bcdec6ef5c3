#include "harness/store/open_database.h"

#include <chrono>
#include <string>
#include <system_error>
#include <thread>
#include <utility>

#include <SQLiteCpp/Exception.h>
#include <fmt/format.h>
#include <sqlite3.h>
#include <sys/statvfs.h>

#include "harness/store/failure.h"
#include "harness/store/schema.h"

namespace gatedyno {
namespace {

// The log is cleared when it has so many pages of 4 KiB, 64 MiB.  Each time
// waits for the disk twice: at SQLite's own 1000 pages, that is after every
// 150 outcomes, saving them takes half as long again.
constexpr int kLogPages = 16'384;

// The write-ahead log lets others read during a write.  SQLite does not wait
// where two processes turn a new file to it at once, so this does.
void UseLog(SQLite::Database& database, std::chrono::milliseconds wait) {
  constexpr std::chrono::milliseconds kPause(5);
  const auto deadline = std::chrono::steady_clock::now() + wait;
  while (database.tryExec("PRAGMA journal_mode = WAL") == SQLITE_BUSY &&
         std::chrono::steady_clock::now() < deadline) {
    std::this_thread::sleep_for(kPause);
  }
  database.exec("PRAGMA journal_mode = WAL");
}

Status MakeReady(SQLite::Database& database,
                 const std::string& file,
                 const StoreOptions& options) {
  if (options.read_only) {
    return CheckSchema(database, file);
  }
  Status ready = PrepareSchema(database, file);
  if (ready.ok()) {
    UseLog(database, options.busy_timeout);
    // NORMAL waits for the disk when the log is cleared, not after every
    // transaction.
    database.exec("PRAGMA synchronous = NORMAL");
    database.exec(fmt::format("PRAGMA wal_autocheckpoint = {}", kLogPages));
    database.exec("PRAGMA foreign_keys = ON");
  }
  return ready;
}

int OpenFlags(const StoreOptions& options) {
  if (options.read_only) {
    return SQLite::OPEN_READONLY;
  }
  return SQLite::OPEN_READWRITE | (options.create ? SQLite::OPEN_CREATE : 0);
}

bool IsOnReadOnlyFileSystem(const std::filesystem::path& path) {
  struct statvfs system {};
  return ::statvfs(path.c_str(), &system) == 0 &&
         (system.f_flag & ST_RDONLY) != 0;
}

// To read beside a writer SQLite makes files of its own.  Where none can be
// made there is no writer either, and it must be told so.
std::string UnchangingName(const std::filesystem::path& path) {
  std::string name = "file:";
  for (const char c : std::filesystem::absolute(path).string()) {
    const bool means_something = c == '%' || c == '?' || c == '#';
    name += means_something ? fmt::format("%{:02X}", static_cast<unsigned>(c))
                            : std::string(1, c);
  }
  return name + "?immutable=1";
}

}  // namespace

Result<SQLite::Database> OpenDatabase(const std::filesystem::path& path,
                                      const StoreOptions& options) {
  const std::string file = path.string();
  const bool create = options.create && !options.read_only;
  std::error_code ignored;
  if (!create && !std::filesystem::exists(path, ignored)) {
    return BadInput(fmt::format("{}: no such store", file));
  }
  try {
    const bool unchanging = options.read_only && IsOnReadOnlyFileSystem(path);
    SQLite::Database database(
        unchanging ? UnchangingName(path) : file,
        OpenFlags(options) | (unchanging ? SQLite::OPEN_URI : 0),
        static_cast<int>(options.busy_timeout.count()));
    if (const Status ready = MakeReady(database, file, options); !ready.ok()) {
      return Forward(ready);
    }
    return database;
  } catch (const SQLite::Exception& thrown) {
    return tl::unexpected<Error>(
        DescribeFailure(file, thrown, options.busy_timeout).error);
  }
}

}  // namespace gatedyno
