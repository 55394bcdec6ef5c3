#include "harness/store/failure.h"

#include <cerrno>

#include <SQLiteCpp/Exception.h>
#include <fmt/format.h>
#include <sqlite3.h>

namespace gatedyno {
namespace {

bool MeansNoRoom(int system_error) {
  return system_error == ENOSPC || system_error == EDQUOT ||
         system_error == EFBIG;
}

StoreTrouble TroubleOf(int code, int system_error) {
  if (code == SQLITE_BUSY || code == SQLITE_LOCKED) {
    return StoreTrouble::kLocked;
  }
  const bool full = code == SQLITE_FULL ||
                    (code == SQLITE_IOERR && MeansNoRoom(system_error));
  return full ? StoreTrouble::kFull : StoreTrouble::kOther;
}

Error ErrorOf(const std::string& file,
              const SQLite::Exception& thrown,
              std::chrono::milliseconds waited,
              StoreTrouble trouble) {
  if (trouble == StoreTrouble::kLocked) {
    return {ErrorKind::kUnavailable,
            fmt::format("{}: database is locked (waited {:g} s)",
                        file,
                        std::chrono::duration<double>(waited).count())};
  }
  if (trouble == StoreTrouble::kFull) {
    return {ErrorKind::kUnavailable,
            fmt::format("{}: no room left to write; what was saved before is "
                        "kept",
                        file)};
  }
  switch (thrown.getErrorCode()) {
    case SQLITE_NOTADB:
      return {ErrorKind::kBadInput,
              fmt::format("{}: not a gatedyno store", file)};
    case SQLITE_READONLY:
      return {ErrorKind::kUnavailable,
              fmt::format("{}: may only be read", file)};
    default:
      return {ErrorKind::kUnavailable,
              fmt::format("{}: {}", file, thrown.what())};
  }
}

}  // namespace

StoreFailure DescribeFailure(const std::string& file,
                             const SQLite::Exception& thrown,
                             std::chrono::milliseconds waited,
                             int system_error) {
  const StoreTrouble trouble = TroubleOf(thrown.getErrorCode(), system_error);
  return {ErrorOf(file, thrown, waited, trouble), trouble};
}

}  // namespace gatedyno
