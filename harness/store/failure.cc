#include "harness/store/failure.h"

#include <SQLiteCpp/Exception.h>
#include <fmt/format.h>
#include <sqlite3.h>

namespace gatedyno {

Error DescribeFailure(const std::string& file,
                      const SQLite::Exception& thrown,
                      std::chrono::milliseconds waited) {
  switch (thrown.getErrorCode()) {
    case SQLITE_BUSY:
      return {ErrorKind::kUnavailable,
              fmt::format("{}: database is locked (waited {:g} s)",
                          file,
                          std::chrono::duration<double>(waited).count())};
    case SQLITE_NOTADB:
      return {ErrorKind::kBadInput,
              fmt::format("{}: not a gatedyno store", file)};
    default:
      return {ErrorKind::kUnavailable,
              fmt::format("{}: {}", file, thrown.what())};
  }
}

}  // namespace gatedyno
