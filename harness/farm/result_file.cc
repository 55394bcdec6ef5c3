#include "harness/farm/result_file.h"

#include <cerrno>
#include <system_error>
#include <utility>

#include <fcntl.h>
#include <fmt/format.h>
#include <unistd.h>

#include "harness/sim/descriptor.h"

namespace gatedyno {
namespace {

std::error_code LastError() {
  return {errno, std::generic_category()};
}

std::error_code Flush(const std::filesystem::path& path, int kind) {
  const Descriptor open(::open(path.c_str(), kind | O_CLOEXEC));
  if (!open.is_open() || ::fsync(open.get()) != 0) {
    return LastError();
  }
  return {};
}

std::error_code CopyWhole(const std::filesystem::path& from,
                          const std::filesystem::path& to) {
  std::error_code failed;
  std::filesystem::copy_file(
      from, to, std::filesystem::copy_options::overwrite_existing, failed);
  return failed;
}

}  // namespace

Status PublishStore(const std::filesystem::path& from,
                    const std::filesystem::path& to) {
  const std::filesystem::path aside = to.string() + ".part";
  std::error_code failed = CopyWhole(from, aside);
  if (!failed) {
    failed = Flush(aside, O_RDONLY);
  }
  if (!failed) {
    std::filesystem::rename(aside, to, failed);
  }
  if (!failed) {
    failed = Flush(to.parent_path(), O_RDONLY | O_DIRECTORY);
    // Some network file systems know no such thing for a folder.
    if (failed == std::errc::invalid_argument) {
      failed.clear();
    }
  }
  if (failed) {
    std::error_code ignored;
    std::filesystem::remove(aside, ignored);
    return Unavailable(fmt::format(
        "{}: cannot be written: {}", to.string(), failed.message()));
  }
  return Ok();
}

Result<ResultReader> ResultReader::Open(const std::filesystem::path& path) {
  Result<ScratchFolder> scratch = ScratchFolder::Make("gatedyno-farm");
  if (!scratch.ok()) {
    return Forward(scratch);
  }
  const std::filesystem::path copy = scratch->path() / "result";
  if (const std::error_code failed = CopyWhole(path, copy)) {
    return Unavailable(fmt::format("{}: cannot be copied to {}: {}",
                                   path.string(),
                                   copy.string(),
                                   failed.message()));
  }
  StoreOptions options;
  options.create = false;
  Result<Store> store = Store::Open(copy, options);
  if (!store.ok()) {
    return BadInput(fmt::format(
        "{}: cannot be read: {}", path.string(), store.error().message));
  }
  return ResultReader(std::move(*scratch), std::move(*store));
}

ResultReader::ResultReader(ScratchFolder scratch, Store store)
    : scratch_(std::move(scratch)), store_(std::move(store)) {}

Result<std::optional<Outcome>> ResultReader::Find(const std::string& key) {
  Result<std::optional<StoredJob>> found = store_.FindJob(key);
  if (!found.ok()) {
    return Forward(found);
  }
  return found->has_value() ? std::move((*found)->outcome) : std::nullopt;
}

}  // namespace gatedyno
