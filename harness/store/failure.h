// What SQLite throws, as an Error that names the file.

#ifndef GATEDYNO_STORE_FAILURE_H_
#define GATEDYNO_STORE_FAILURE_H_

#include <chrono>
#include <string>

#include "harness/base/result.h"
#include "harness/store/store_trouble.h"

namespace SQLite {  // NOLINT(readability-identifier-naming)
class Exception;
}  // namespace SQLite

namespace gatedyno {

struct StoreFailure {
  Error error;
  StoreTrouble trouble = StoreTrouble::kOther;
};

// "runs.db: database is locked (waited 5 s)".  `system_error` is the errno
// behind it, 0 where there is none: SQLite itself calls only a full disk full,
// not a quota or a limit on file sizes.
StoreFailure DescribeFailure(const std::string& file,
                             const SQLite::Exception& thrown,
                             std::chrono::milliseconds waited,
                             int system_error = 0);

}  // namespace gatedyno

#endif  // GATEDYNO_STORE_FAILURE_H_
