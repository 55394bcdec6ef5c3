// One run at a time a store: two would simulate the same jobs.
//
// The lock is the kernel's, on a file beside the store ("runs.db-run" for
// "runs.db"), and goes with the process that holds it, whatever that dies of.
// Who only reads the store, or merges outcomes into it, needs none.

#ifndef GATEDYNO_STORE_RUN_LOCK_H_
#define GATEDYNO_STORE_RUN_LOCK_H_

#include <filesystem>

#include "harness/base/result.h"

namespace gatedyno {

// Held until the object goes; child programs do not inherit it.
class RunLock {
 public:
  RunLock(RunLock&& other) noexcept;
  RunLock& operator=(RunLock&& other) noexcept;
  ~RunLock();

 private:
  friend Result<RunLock> LockRuns(const std::filesystem::path& store);

  RunLock() = default;  // Of a store in memory, which no other can open.
  RunLock(std::filesystem::path file, int descriptor);

  void Release();

  std::filesystem::path file_;
  int descriptor_ = -1;
};

// `store` need not exist yet.  Does not wait: fails with kUnavailable, naming
// process and host, while a run holds the lock.
Result<RunLock> LockRuns(const std::filesystem::path& store);

// Whether a run holds the lock.  Never in the way of one that wants it.
bool RunsLocked(const std::filesystem::path& store);

}  // namespace gatedyno

#endif  // GATEDYNO_STORE_RUN_LOCK_H_
