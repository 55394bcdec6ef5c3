#include "harness/worker/channel.h"

#include <array>
#include <cerrno>
#include <system_error>

#include <fcntl.h>
#include <fmt/format.h>
#include <unistd.h>

namespace gatedyno {
namespace {

tl::unexpected<Error> SystemError(std::string_view what) {
  const std::error_code reason(errno, std::generic_category());
  return Unavailable(fmt::format("{}: {}", what, reason.message()));
}

Descriptor PrivateCopy(int standard) {
  const int fd = ::fcntl(standard, F_DUPFD_CLOEXEC, STDERR_FILENO + 1);
  return fd < 0 ? Descriptor() : Descriptor(fd);
}

}  // namespace

Result<Channel> Channel::TakeStandard() {
  Descriptor input = PrivateCopy(STDIN_FILENO);
  Descriptor output = PrivateCopy(STDOUT_FILENO);
  if (!input.is_open() || !output.is_open()) {
    return SystemError("the worker's input or output");
  }
  const int nothing = ::open("/dev/null", O_RDONLY | O_CLOEXEC);
  if (nothing < 0) {
    return SystemError("/dev/null");
  }
  const Descriptor owner(nothing);
  if (::dup2(nothing, STDIN_FILENO) < 0 ||
      ::dup2(STDERR_FILENO, STDOUT_FILENO) < 0) {
    return SystemError("the worker's input or output");
  }
  return Channel(std::move(input), std::move(output));
}

Result<std::optional<std::string>> Channel::Receive() {
  constexpr size_t kChunkBytes = 65536;
  std::array<char, kChunkBytes> chunk;
  while (true) {
    Result<std::optional<std::string>> next = frames_.Next();
    if (!next.ok() || next->has_value()) {
      return next;
    }
    const ssize_t got = ::read(input_.get(), chunk.data(), chunk.size());
    if (got == 0) {
      const Status whole = frames_.CheckEnd();
      return whole.ok() ? next : Forward(whole);
    }
    if (got < 0 && errno != EINTR) {
      return SystemError("the worker's input");
    }
    if (got > 0) {
      frames_.Append({chunk.data(), static_cast<size_t>(got)});
    }
  }
}

Status Channel::Send(std::string_view text) {
  const std::string frame = EncodeFrame(text);
  size_t written = 0;
  while (written < frame.size()) {
    const ssize_t put =
        ::write(output_.get(), frame.data() + written, frame.size() - written);
    if (put < 0 && errno != EINTR) {
      return SystemError("the worker's output");
    }
    written += put > 0 ? static_cast<size_t>(put) : 0;
  }
  return Ok();
}

}  // namespace gatedyno
