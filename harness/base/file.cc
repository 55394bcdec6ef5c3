#include "harness/base/file.h"

#include <cerrno>
#include <fstream>
#include <sstream>
#include <system_error>

#include <fmt/format.h>
#include <unistd.h>

namespace gatedyno {
namespace {

std::string Reason() {
  return std::error_code(errno, std::generic_category()).message();
}

}  // namespace

Result<std::string> ReadFile(const std::filesystem::path& path) {
  std::error_code ignored;
  if (std::filesystem::is_directory(path, ignored)) {
    return BadInput(fmt::format("{}: is a folder, not a file", path.string()));
  }
  errno = 0;
  std::ifstream in(path, std::ios::binary);
  if (!in) {
    return BadInput(
        fmt::format("{}: cannot be read: {}", path.string(), Reason()));
  }
  std::ostringstream text;
  text << in.rdbuf();
  return std::move(text).str();
}

Status WriteFile(const std::filesystem::path& path, std::string_view text) {
  std::error_code failed;
  if (path.has_parent_path()) {
    std::filesystem::create_directories(path.parent_path(), failed);
  }
  const std::filesystem::path aside =
      path.string() + fmt::format(".part{}", ::getpid());
  errno = 0;
  std::ofstream out(aside, std::ios::binary | std::ios::trunc);
  out << text;
  out.close();
  if (!out) {
    const std::string reason = Reason();
    std::filesystem::remove(aside, failed);
    return Unavailable(
        fmt::format("{}: cannot be written: {}", path.string(), reason));
  }
  std::filesystem::rename(aside, path, failed);
  if (failed) {
    std::error_code ignored;
    std::filesystem::remove(aside, ignored);
    return Unavailable(fmt::format(
        "{}: cannot be written: {}", path.string(), failed.message()));
  }
  return Ok();
}

}  // namespace gatedyno
