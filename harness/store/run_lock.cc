#include "harness/store/run_lock.h"

#include <array>
#include <cerrno>
#include <string>
#include <string_view>
#include <system_error>
#include <utility>

#include <fcntl.h>
#include <fmt/format.h>
#include <sys/stat.h>
#include <unistd.h>

namespace gatedyno {
namespace {

constexpr std::string_view kInMemory = ":memory:";

// Beside the file itself where `store` is a link to it, so that a run that
// knows it by another name meets the same lock.
std::filesystem::path LockFile(const std::filesystem::path& store) {
  std::error_code failure;
  const std::filesystem::path file =
      std::filesystem::weakly_canonical(store, failure);
  return (failure ? store : file).string() + "-run";
}

// Locks of an open file description go with its last descriptor, like those
// of flock(), but unlike them can be asked about without being taken.
struct flock WholeFile(short kind) {
  struct flock lock {};
  lock.l_type = kind;
  lock.l_whence = SEEK_SET;
  return lock;
}

bool TryLock(int descriptor) {
  const struct flock lock = WholeFile(F_WRLCK);
  return ::fcntl(descriptor, F_OFD_SETLK, &lock) == 0;
}

// False where the holder before us has removed the file since it was opened: a
// lock on it would lock nobody out.
bool IsStillThere(int descriptor, const std::filesystem::path& file) {
  struct stat open {};
  struct stat there {};
  return ::fstat(descriptor, &open) == 0 && ::stat(file.c_str(), &there) == 0 &&
         open.st_dev == there.st_dev && open.st_ino == there.st_ino;
}

std::string HostName() {
  std::array<char, 256> name{};
  return ::gethostname(name.data(), name.size() - 1) == 0 ? name.data()
                                                          : "unknown host";
}

// For the message of the next who wants it; the lock does not depend on it.
void WriteHolder(int descriptor) {
  const std::string holder =
      fmt::format("process {} on {}", ::getpid(), HostName());
  if (::ftruncate(descriptor, 0) != 0 ||
      ::pwrite(descriptor, holder.data(), holder.size(), 0) < 0) {
    return;
  }
}

std::string ReadHolder(int descriptor) {
  std::array<char, 512> text{};
  const ssize_t got = ::pread(descriptor, text.data(), text.size(), 0);
  return got > 0 ? std::string(text.data(), static_cast<size_t>(got))
                 : "another process";
}

tl::unexpected<Error> CannotLock(const std::filesystem::path& file,
                                 int error_number) {
  return Unavailable(
      fmt::format("{}: cannot be locked: {}",
                  file.string(),
                  std::generic_category().message(error_number)));
}

tl::unexpected<Error> Held(const std::filesystem::path& store, int descriptor) {
  return Unavailable(
      fmt::format("{}: in use by the run of {}; wait for it, or name another "
                  "store",
                  store.string(),
                  ReadHolder(descriptor)));
}

}  // namespace

RunLock::RunLock(std::filesystem::path file, int descriptor)
    : file_(std::move(file)), descriptor_(descriptor) {}

RunLock::RunLock(RunLock&& other) noexcept
    : file_(std::move(other.file_)),
      descriptor_(std::exchange(other.descriptor_, -1)) {}

RunLock& RunLock::operator=(RunLock&& other) noexcept {
  if (this != &other) {
    Release();
    file_ = std::move(other.file_);
    descriptor_ = std::exchange(other.descriptor_, -1);
  }
  return *this;
}

RunLock::~RunLock() {
  Release();
}

void RunLock::Release() {
  if (descriptor_ >= 0) {
    ::unlink(file_.c_str());
    ::close(std::exchange(descriptor_, -1));
  }
}

Result<RunLock> LockRuns(const std::filesystem::path& store) {
  if (store == kInMemory) {
    return RunLock();
  }
  constexpr mode_t kMode = 0666;
  const std::filesystem::path file = LockFile(store);
  while (true) {
    const int descriptor =
        ::open(file.c_str(), O_RDWR | O_CREAT | O_CLOEXEC, kMode);
    if (descriptor < 0) {
      return CannotLock(file, errno);
    }
    if (!TryLock(descriptor)) {
      const int error_number = errno;
      const tl::unexpected<Error> refused =
          error_number == EAGAIN || error_number == EACCES
              ? Held(store, descriptor)
              : CannotLock(file, error_number);
      ::close(descriptor);
      return refused;
    }
    if (IsStillThere(descriptor, file)) {
      WriteHolder(descriptor);
      return RunLock(file, descriptor);
    }
    ::close(descriptor);
  }
}

bool RunsLocked(const std::filesystem::path& store) {
  if (store == kInMemory) {
    return false;
  }
  const int descriptor = ::open(LockFile(store).c_str(), O_RDONLY | O_CLOEXEC);
  if (descriptor < 0) {
    return false;
  }
  struct flock lock = WholeFile(F_RDLCK);
  const bool locked =
      ::fcntl(descriptor, F_OFD_GETLK, &lock) == 0 && lock.l_type != F_UNLCK;
  ::close(descriptor);
  return locked;
}

}  // namespace gatedyno
