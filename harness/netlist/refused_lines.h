// Lines a simulator may know and a cell file may not hold, and why.

#ifndef GATEDYNO_NETLIST_REFUSED_LINES_H_
#define GATEDYNO_NETLIST_REFUSED_LINES_H_

#include <string>
#include <string_view>

namespace gatedyno {

// What to say of a line starting with `word` ("." lines and device letters
// alike) that no parse function takes.
std::string WhyRefused(std::string_view word);

}  // namespace gatedyno

#endif  // GATEDYNO_NETLIST_REFUSED_LINES_H_
