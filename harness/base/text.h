// Small text helpers, ASCII only: SPICE names know no other case rule.

#ifndef GATEDYNO_BASE_TEXT_H_
#define GATEDYNO_BASE_TEXT_H_

#include <string>
#include <string_view>

namespace gatedyno {

std::string ToLower(std::string_view text);
bool EqualsIgnoringCase(std::string_view a, std::string_view b);

}  // namespace gatedyno

#endif  // GATEDYNO_BASE_TEXT_H_
