// Numbers of a netlist, stricter than a simulator reads them.
//
// ParseSpiceNumber takes any letters after the scale for a unit, as simulators
// do; in a netlist that lets "2x" or "1milli" pass (the latter as 25.4e-6).
// Here only units that people write are letters to ignore.

#ifndef GATEDYNO_NETLIST_STRICT_NUMBER_H_
#define GATEDYNO_NETLIST_STRICT_NUMBER_H_

#include <string>
#include <string_view>

#include <tl/expected.hpp>

namespace gatedyno {

// The whole of `text` as a number.  The error is what to say after "got 'X'":
// empty, or ": " and a reason.
tl::expected<double, std::string> ReadStrictNumber(std::string_view text);

}  // namespace gatedyno

#endif  // GATEDYNO_NETLIST_STRICT_NUMBER_H_
