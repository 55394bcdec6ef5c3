#include "harness/worker/private_folder.h"

#include <system_error>
#include <utility>

#include <fmt/format.h>

#include "harness/base/file.h"

namespace gatedyno {

Result<PrivateFolder> PrivateFolder::Enter() {
  std::error_code failed;
  std::filesystem::path before = std::filesystem::current_path(failed);
  Result<ScratchFolder> folder = ScratchFolder::Make("gatedyno");
  if (!folder.ok()) {
    return Forward(folder);
  }
  const std::filesystem::path path = folder->path();
  PrivateFolder entered(*std::move(folder), std::move(before));
  if (const Status written = WriteFile(path / ".spiceinit", "");
      !written.ok()) {
    return Forward(written);
  }
  std::filesystem::current_path(path, failed);
  if (failed) {
    return Unavailable(fmt::format(
        "{}: cannot be entered: {}", path.string(), failed.message()));
  }
  return entered;
}

PrivateFolder::PrivateFolder(ScratchFolder folder, std::filesystem::path before)
    : folder_(std::move(folder)), before_(std::move(before)) {}

PrivateFolder::~PrivateFolder() {
  if (!folder_.path().empty()) {
    std::error_code ignored;
    std::filesystem::current_path(before_, ignored);
  }
}

}  // namespace gatedyno
