// A folder of our own on this machine's disk, gone with the object.

#ifndef GATEDYNO_FARM_SCRATCH_FOLDER_H_
#define GATEDYNO_FARM_SCRATCH_FOLDER_H_

#include <filesystem>

#include "harness/base/result.h"

namespace gatedyno {

class ScratchFolder {
 public:
  // In the folder for temporary files (TMPDIR): a result is a store, and those
  // do not work on network file systems.
  static Result<ScratchFolder> Make();

  ScratchFolder(ScratchFolder&& other) noexcept;
  ScratchFolder& operator=(ScratchFolder&&) = delete;
  ~ScratchFolder();

  const std::filesystem::path& path() const { return path_; }

 private:
  explicit ScratchFolder(std::filesystem::path path);

  std::filesystem::path path_;  // Empty once moved from.
};

}  // namespace gatedyno

#endif  // GATEDYNO_FARM_SCRATCH_FOLDER_H_
