// Numbers as SPICE writes them.
//
// Scale letters: t g meg k mil m u n p f (any case).  Two traps: "m" is milli
// also when written "M", and mega is "meg"; "mil" is 25.4e-6.  Letters after
// the scale are a unit and ignored ("10fF", "3volts", and "1F", which is
// 1e-15).  Refused because dialects disagree: "1a" (atto or nothing) and
// digits after a scale letter ("4k7").
// Source: behaviour of ngspice 39.3 tried for each row of the test's table.

#ifndef GATEDYNO_BASE_SPICE_NUMBER_H_
#define GATEDYNO_BASE_SPICE_NUMBER_H_

#include <string>
#include <string_view>

#include "harness/base/result.h"

namespace gatedyno {

// The whole of `text` must be one number.  The error message has no place; the
// caller knows it.
Result<double> ParseSpiceNumber(std::string_view text);

// Shortest text that ParseSpiceNumber, and a simulator, read back as `value`.
// Plain exponents, no scale letters.
std::string FormatSpiceNumber(double value);

}  // namespace gatedyno

#endif  // GATEDYNO_BASE_SPICE_NUMBER_H_
