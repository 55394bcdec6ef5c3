#include "harness/base/scratch_folder.h"

#include <cerrno>
#include <cstdlib>
#include <string>
#include <system_error>
#include <utility>

#include <fmt/format.h>

namespace gatedyno {

Result<ScratchFolder> ScratchFolder::Make(std::string_view stem) {
  std::error_code failed;
  const std::filesystem::path parent =
      std::filesystem::temp_directory_path(failed);
  std::string name = (parent / fmt::format("{}-XXXXXX", stem)).string();
  if (failed || ::mkdtemp(name.data()) == nullptr) {
    return Unavailable(fmt::format(
        "{}: no temporary folder can be made: {}; set TMPDIR",
        parent.string(),
        failed ? failed.message() : std::generic_category().message(errno)));
  }
  return ScratchFolder(name);
}

ScratchFolder::ScratchFolder(std::filesystem::path path)
    : path_(std::move(path)) {}

ScratchFolder::ScratchFolder(ScratchFolder&& other) noexcept
    : path_(std::exchange(other.path_, {})) {}

ScratchFolder::~ScratchFolder() {
  if (!path_.empty()) {
    std::error_code ignored;
    std::filesystem::remove_all(path_, ignored);
  }
}

}  // namespace gatedyno
