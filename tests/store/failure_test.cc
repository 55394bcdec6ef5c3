#include "harness/store/failure.h"

#include <cerrno>
#include <string>

#include <SQLiteCpp/Exception.h>
#include <gtest/gtest.h>
#include <sqlite3.h>

namespace gatedyno {
namespace {

struct Case {
  int code;
  int system_error;
  StoreTrouble trouble;
  ErrorKind kind;
  const char* message;
};

constexpr const char* kNoRoom =
    "runs.db: no room left to write; what was saved before is kept";
constexpr Case kCases[] = {
    {SQLITE_BUSY,
     0,
     StoreTrouble::kLocked,
     ErrorKind::kUnavailable,
     "runs.db: database is locked (waited 0.25 s)"},
    {SQLITE_FULL, 0, StoreTrouble::kFull, ErrorKind::kUnavailable, kNoRoom},
    {SQLITE_FULL,
     ENOSPC,
     StoreTrouble::kFull,
     ErrorKind::kUnavailable,
     kNoRoom},
    {SQLITE_IOERR,
     EDQUOT,
     StoreTrouble::kFull,
     ErrorKind::kUnavailable,
     kNoRoom},
    {SQLITE_IOERR,
     EFBIG,
     StoreTrouble::kFull,
     ErrorKind::kUnavailable,
     kNoRoom},
    {SQLITE_IOERR,
     EIO,
     StoreTrouble::kOther,
     ErrorKind::kUnavailable,
     "runs.db: words"},
    {SQLITE_NOTADB,
     0,
     StoreTrouble::kOther,
     ErrorKind::kBadInput,
     "runs.db: not a gatedyno store"},
    {SQLITE_READONLY,
     0,
     StoreTrouble::kOther,
     ErrorKind::kUnavailable,
     "runs.db: may only be read"},
    // A stale errno makes nothing else full.
    {SQLITE_CORRUPT,
     ENOSPC,
     StoreTrouble::kOther,
     ErrorKind::kUnavailable,
     "runs.db: words"},
};

TEST(FailureTest, SaysWhatMayPass) {
  for (const Case& tried : kCases) {
    SCOPED_TRACE(tried.code);
    const StoreFailure failure =
        DescribeFailure("runs.db",
                        SQLite::Exception("words", tried.code),
                        std::chrono::milliseconds(250),
                        tried.system_error);
    EXPECT_EQ(failure.trouble, tried.trouble);
    EXPECT_EQ(failure.error.kind, tried.kind);
    EXPECT_EQ(failure.error.message, tried.message);
  }
}

}  // namespace
}  // namespace gatedyno
