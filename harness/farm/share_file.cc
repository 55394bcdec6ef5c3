#include "harness/farm/share_file.h"

#include <cerrno>
#include <system_error>
#include <utility>

#include <fmt/format.h>

#include "harness/sim/protocol.h"

namespace gatedyno {
namespace {

tl::unexpected<Error> Refused(const std::filesystem::path& path,
                              const char* what) {
  return Unavailable(fmt::format("{}: {}: {}",
                                 path.string(),
                                 what,
                                 std::generic_category().message(errno)));
}

}  // namespace

ShareWriter::ShareWriter(std::filesystem::path path)
    : path_(std::move(path)), out_(path_, std::ios::binary) {}

Result<ShareWriter> ShareWriter::Create(const std::filesystem::path& path) {
  errno = 0;
  ShareWriter writer(path);
  if (!writer.out_) {
    return Refused(path, "cannot be written");
  }
  return writer;
}

void ShareWriter::Add(const std::string& text) {
  out_ << text << '\n';
}

Status ShareWriter::Close() {
  errno = 0;
  out_.close();
  return out_ ? Ok() : Refused(path_, "cannot be written");
}

ShareReader::ShareReader(std::filesystem::path path)
    : path_(std::move(path)), in_(path_, std::ios::binary) {}

Result<ShareReader> ShareReader::Open(const std::filesystem::path& path) {
  errno = 0;
  ShareReader reader(path);
  if (!reader.in_) {
    return Refused(path, "cannot be read");
  }
  return reader;
}

Result<std::optional<Job>> ShareReader::Next() {
  std::string text;
  if (!std::getline(in_, text)) {
    return std::nullopt;
  }
  ++line_;
  Result<Job> job = ParseJob(text);
  if (!job.ok()) {
    return Internal(
        fmt::format("{}:{}: {}", path_.string(), line_, job.error().message));
  }
  return std::move(*job);
}

}  // namespace gatedyno
