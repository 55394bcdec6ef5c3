// What an X line passes to the .subckt it calls: parameters and copies.

#ifndef GATEDYNO_NETLIST_INSTANCE_CALL_H_
#define GATEDYNO_NETLIST_INSTANCE_CALL_H_

#include "harness/netlist/definition.h"
#include "harness/netlist/frame.h"
#include "harness/netlist/parse_error.h"

namespace gatedyno {

// Evaluates the overrides of `line` in the calling frame and defines them in
// `called`.  m= multiplies the copies, unless the .subckt declares a parameter
// m: then it is that parameter and nothing else, and an error where nothing
// inside uses it, since the copies would be lost.
ParseStatus PassParameters(const InstanceLine& line,
                           Frame& caller,
                           Frame& called);

}  // namespace gatedyno

#endif  // GATEDYNO_NETLIST_INSTANCE_CALL_H_
