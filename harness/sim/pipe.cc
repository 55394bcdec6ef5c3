#include "harness/sim/pipe.h"

#include <array>
#include <cerrno>
#include <system_error>

#include <fcntl.h>
#include <fmt/format.h>
#include <unistd.h>

namespace gatedyno {
namespace {

constexpr int kFirstPrivateDescriptor = 3;

tl::unexpected<Error> SystemError(std::string_view what) {
  const std::error_code reason(errno, std::generic_category());
  return Unavailable(fmt::format("{}: {}", what, reason.message()));
}

Status MoveAboveStandard(Descriptor* descriptor) {
  if (descriptor->get() >= kFirstPrivateDescriptor) {
    return Ok();
  }
  const int moved =
      ::fcntl(descriptor->get(), F_DUPFD_CLOEXEC, kFirstPrivateDescriptor);
  if (moved < 0) {
    return SystemError("a pipe to a worker");
  }
  *descriptor = Descriptor(moved);
  return Ok();
}

// What a failed read() or write() on a descriptor that does not block means.
PipeState StateAfterFailure() {
  return errno == EAGAIN || errno == EINTR ? PipeState::kOpen
                                           : PipeState::kEnded;
}

}  // namespace

Result<Pipe> MakePipe() {
  std::array<int, 2> ends = {};
  if (::pipe2(ends.data(), O_CLOEXEC) != 0) {
    return SystemError("a pipe to a worker");
  }
  Pipe pipe = {Descriptor(ends[0]), Descriptor(ends[1])};
  for (Descriptor* end : {&pipe.read_end, &pipe.write_end}) {
    if (const Status moved = MoveAboveStandard(end); !moved.ok()) {
      return Forward(moved);
    }
  }
  return pipe;
}

Status SetNonBlocking(const Descriptor& descriptor) {
  const int flags = ::fcntl(descriptor.get(), F_GETFL);
  if (flags < 0 ||
      ::fcntl(descriptor.get(), F_SETFL, flags | O_NONBLOCK) != 0) {
    return SystemError("a pipe to a worker");
  }
  return Ok();
}

PipeState ReadAvailable(const Descriptor& end, std::string* bytes) {
  constexpr size_t kChunkBytes = 65536;
  std::array<char, kChunkBytes> chunk;
  while (true) {
    const ssize_t got = ::read(end.get(), chunk.data(), chunk.size());
    if (got == 0) {
      return PipeState::kEnded;
    }
    if (got < 0) {
      return StateAfterFailure();
    }
    bytes->append(chunk.data(), static_cast<size_t>(got));
  }
}

PipeState WriteAvailable(const Descriptor& end, std::string* bytes) {
  size_t written = 0;
  PipeState state = PipeState::kOpen;
  while (written < bytes->size()) {
    const ssize_t put =
        ::write(end.get(), bytes->data() + written, bytes->size() - written);
    if (put < 0) {
      state = StateAfterFailure();
      break;
    }
    written += static_cast<size_t>(put);
  }
  bytes->erase(0, written);
  return state;
}

}  // namespace gatedyno
