#include "harness/worker/private_folder.h"

#include <cerrno>
#include <cstdlib>
#include <system_error>
#include <utility>

#include <fmt/format.h>

#include "harness/base/file.h"

namespace gatedyno {
namespace {

Result<std::filesystem::path> MakeTemporaryFolder() {
  std::error_code failed;
  std::string name =
      (std::filesystem::temp_directory_path(failed) / "gatedyno-XXXXXX")
          .string();
  if (failed || ::mkdtemp(name.data()) == nullptr) {
    const std::error_code reason(errno, std::generic_category());
    return Unavailable(fmt::format("{}: cannot be made: {}",
                                   failed ? "a temporary folder" : name,
                                   (failed ? failed : reason).message()));
  }
  return std::filesystem::path(name);
}

}  // namespace

Result<PrivateFolder> PrivateFolder::Enter() {
  std::error_code failed;
  std::filesystem::path before = std::filesystem::current_path(failed);
  Result<std::filesystem::path> folder = MakeTemporaryFolder();
  if (!folder.ok()) {
    return Forward(folder);
  }
  PrivateFolder entered(*folder, std::move(before));
  if (const Status written = WriteFile(*folder / ".spiceinit", "");
      !written.ok()) {
    return Forward(written);
  }
  std::filesystem::current_path(*folder, failed);
  if (failed) {
    return Unavailable(fmt::format(
        "{}: cannot be entered: {}", folder->string(), failed.message()));
  }
  return entered;
}

PrivateFolder::PrivateFolder(std::filesystem::path folder,
                             std::filesystem::path before)
    : folder_(std::move(folder)), before_(std::move(before)) {}

PrivateFolder::PrivateFolder(PrivateFolder&& other) noexcept
    : folder_(std::exchange(other.folder_, {})),
      before_(std::exchange(other.before_, {})) {}

PrivateFolder::~PrivateFolder() {
  if (folder_.empty()) {
    return;
  }
  std::error_code ignored;
  std::filesystem::current_path(before_, ignored);
  std::filesystem::remove_all(folder_, ignored);
}

}  // namespace gatedyno
