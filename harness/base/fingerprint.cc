#include "harness/base/fingerprint.h"

#include <fmt/format.h>
#include <xxhash.h>

namespace gatedyno {

std::string Fingerprint(std::string_view content) {
  const XXH128_hash_t hash = XXH3_128bits(content.data(), content.size());
  return fmt::format("{:016x}{:016x}", hash.high64, hash.low64);
}

}  // namespace gatedyno
