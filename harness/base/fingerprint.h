// Content hashes: what makes two jobs, or two model files, the same.

#ifndef GATEDYNO_BASE_FINGERPRINT_H_
#define GATEDYNO_BASE_FINGERPRINT_H_

#include <string>
#include <string_view>

namespace gatedyno {

// 32 hexadecimal digits: XXH3, 128 bits.  Not for adversaries.
std::string Fingerprint(std::string_view content);

}  // namespace gatedyno

#endif  // GATEDYNO_BASE_FINGERPRINT_H_
