#include "harness/sim/frame.h"

#include <cassert>
#include <cstdint>

#include <fmt/format.h>

namespace gatedyno {
namespace {

constexpr size_t kHeaderBytes = 4;

size_t DecodeLength(std::string_view header) {
  uint32_t length = 0;
  for (size_t i = kHeaderBytes; i-- > 0;) {
    length = (length << 8U) | static_cast<unsigned char>(header[i]);
  }
  return length;
}

}  // namespace

std::string EncodeFrame(std::string_view text) {
  assert(text.size() <= kMaxFrameBytes);
  std::string frame;
  frame.reserve(kHeaderBytes + text.size());
  for (size_t i = 0; i < kHeaderBytes; ++i) {
    frame.push_back(static_cast<char>((text.size() >> (8 * i)) & 0xffU));
  }
  return frame.append(text);
}

void FrameReader::Append(std::string_view bytes) {
  bytes_.erase(0, used_);
  used_ = 0;
  bytes_.append(bytes);
}

Result<std::optional<std::string>> FrameReader::Next() {
  const std::string_view rest = std::string_view(bytes_).substr(used_);
  if (rest.size() < kHeaderBytes) {
    return std::optional<std::string>();
  }
  const size_t length = DecodeLength(rest);
  if (length > kMaxFrameBytes) {
    return Internal(fmt::format(
        "a frame of {} bytes is over the limit of {}", length, kMaxFrameBytes));
  }
  if (rest.size() < kHeaderBytes + length) {
    return std::optional<std::string>();
  }
  used_ += kHeaderBytes + length;
  return std::optional<std::string>(rest.substr(kHeaderBytes, length));
}

Status FrameReader::CheckEnd() const {
  const std::string_view rest = std::string_view(bytes_).substr(used_);
  if (rest.empty()) {
    return Ok();
  }
  if (rest.size() < kHeaderBytes) {
    return Internal(
        fmt::format("the stream ended after {} of a frame's {} length bytes",
                    rest.size(),
                    kHeaderBytes));
  }
  return Internal(fmt::format("the stream ended after {} of a frame's {} bytes",
                              rest.size() - kHeaderBytes,
                              DecodeLength(rest)));
}

}  // namespace gatedyno
