// What a task publishes: a store that appears in the shared folder as a whole.

#ifndef GATEDYNO_FARM_RESULT_FILE_H_
#define GATEDYNO_FARM_RESULT_FILE_H_

#include <filesystem>
#include <optional>
#include <string>

#include "harness/base/result.h"
#include "harness/base/scratch_folder.h"
#include "harness/record/outcome.h"
#include "harness/store/store.h"

namespace gatedyno {

// Copies the closed store `from` to `to`: beside it first, to the disk, then
// renamed.  Who finds `to` finds all of it, also after a power failure.
Status PublishStore(const std::filesystem::path& from,
                    const std::filesystem::path& to);

class ResultReader {
 public:
  // Works on a copy of its own on the local disk.
  static Result<ResultReader> Open(const std::filesystem::path& path);

  // However the job ended; none where the result does not have it.
  Result<std::optional<Outcome>> Find(const std::string& key);

 private:
  ResultReader(ScratchFolder scratch, Store store);

  ScratchFolder scratch_;  // Outlives the store in it.
  Store store_;
};

}  // namespace gatedyno

#endif  // GATEDYNO_FARM_RESULT_FILE_H_
