// The value of an R or C line, all its parallel copies together.

#ifndef GATEDYNO_NETLIST_PASSIVE_VALUE_H_
#define GATEDYNO_NETLIST_PASSIVE_VALUE_H_

#include "harness/netlist/definition.h"
#include "harness/netlist/expression.h"
#include "harness/netlist/parse_error.h"

namespace gatedyno {

// R / copies in ohms, above zero; C * copies in farads, not negative.
// `copies` is the multiplicity of the instances around the line; the line's
// own m= comes on top.
Parsed<double> EvaluatePassive(const PassiveLine& line,
                               double copies,
                               ParameterSource& parameters);

}  // namespace gatedyno

#endif  // GATEDYNO_NETLIST_PASSIVE_VALUE_H_
