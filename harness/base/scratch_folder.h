// A folder of our own on this machine's disk, gone with the object.

#ifndef GATEDYNO_BASE_SCRATCH_FOLDER_H_
#define GATEDYNO_BASE_SCRATCH_FOLDER_H_

#include <filesystem>
#include <string_view>

#include "harness/base/result.h"

namespace gatedyno {

class ScratchFolder {
 public:
  // In the folder for temporary files (TMPDIR), "STEM-" and six characters
  // more.
  static Result<ScratchFolder> Make(std::string_view stem);

  ScratchFolder(ScratchFolder&& other) noexcept;
  ScratchFolder& operator=(ScratchFolder&&) = delete;
  ~ScratchFolder();

  // Empty once moved from.
  const std::filesystem::path& path() const { return path_; }

 private:
  explicit ScratchFolder(std::filesystem::path path);

  std::filesystem::path path_;
};

}  // namespace gatedyno

#endif  // GATEDYNO_BASE_SCRATCH_FOLDER_H_
