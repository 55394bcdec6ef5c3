// Frames: how two processes pass texts over a byte stream.
//
// A frame is the text's length, 4 bytes, little endian, and then the text.

#ifndef GATEDYNO_SIM_FRAME_H_
#define GATEDYNO_SIM_FRAME_H_

#include <cstddef>
#include <optional>
#include <string>
#include <string_view>

#include "harness/base/result.h"

namespace gatedyno {

// An extracted cell with thousands of parts is some megabytes of deck; more
// than this is a stream that never held frames.
inline constexpr size_t kMaxFrameBytes = size_t{64} << 20U;

// REQUIRES: text.size() <= kMaxFrameBytes.
std::string EncodeFrame(std::string_view text);

// Cuts a byte stream, as it comes in, into frames.
class FrameReader {
 public:
  void Append(std::string_view bytes);

  // The next whole frame's text; none until more bytes come.  After an error
  // the stream has no frame boundaries any more and every call fails.
  Result<std::optional<std::string>> Next();

  // Fails when the stream ended inside a frame.
  Status CheckEnd() const;

 private:
  std::string bytes_;
  size_t used_ = 0;  // Bytes of bytes_ already handed out.
};

}  // namespace gatedyno

#endif  // GATEDYNO_SIM_FRAME_H_
