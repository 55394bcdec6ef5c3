// What SQLite throws, as an Error that names the file.

#ifndef GATEDYNO_STORE_FAILURE_H_
#define GATEDYNO_STORE_FAILURE_H_

#include <chrono>
#include <string>

#include "harness/base/result.h"

namespace SQLite {  // NOLINT(readability-identifier-naming)
class Exception;
}  // namespace SQLite

namespace gatedyno {

// "runs.db: database is locked (waited 5 s)".
Error DescribeFailure(const std::string& file,
                      const SQLite::Exception& thrown,
                      std::chrono::milliseconds waited);

}  // namespace gatedyno

#endif  // GATEDYNO_STORE_FAILURE_H_
