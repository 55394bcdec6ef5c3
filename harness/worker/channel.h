// The worker's end of the protocol.
//
// Descriptors 0 and 1 are moved away at the start, so that nothing the
// simulator or a code model prints can touch the frames.

#ifndef GATEDYNO_WORKER_CHANNEL_H_
#define GATEDYNO_WORKER_CHANNEL_H_

#include <optional>
#include <string>
#include <string_view>

#include "harness/base/result.h"
#include "harness/sim/descriptor.h"
#include "harness/sim/frame.h"

namespace gatedyno {

class Channel {
 public:
  // Takes over descriptors 0 and 1: afterwards 0 reads nothing and 1 writes
  // where 2 does.
  static Result<Channel> TakeStandard();

  // Waits for the next frame; none when the input has ended.
  Result<std::optional<std::string>> Receive();

  // Fails when nobody reads.
  // REQUIRES: text.size() <= kMaxFrameBytes; SIGPIPE is ignored.
  Status Send(std::string_view text);

 private:
  Channel(Descriptor input, Descriptor output)
      : input_(std::move(input)), output_(std::move(output)) {}

  Descriptor input_;
  Descriptor output_;
  FrameReader frames_;
};

}  // namespace gatedyno

#endif  // GATEDYNO_WORKER_CHANNEL_H_
