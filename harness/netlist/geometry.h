// The values of a device line: evaluated, scaled to metres, checked.

#ifndef GATEDYNO_NETLIST_GEOMETRY_H_
#define GATEDYNO_NETLIST_GEOMETRY_H_

#include <optional>

#include "harness/netlist/cell.h"
#include "harness/netlist/definition.h"
#include "harness/netlist/expression.h"
#include "harness/netlist/parse_error.h"
#include "harness/netlist/reader.h"

namespace gatedyno {

// `file_scale_m` is the file's .option scale, in metres; it replaces the
// device's own unit_m.  Lengths are multiplied by the unit, areas by its
// square.  Width is the total over the fingers: w=2u nf=2 equals w=1u m=2.
// With nfin=, width = nfin * nf * fin width (nfin counts the fins of one
// finger).  Fills every field of the Mosfet that is geometry; the multiplicity
// is the line's own.
Parsed<Mosfet> EvaluateGeometry(const DeviceLine& line,
                                const ReaderOptions& options,
                                std::optional<double> file_scale_m,
                                ParameterSource& parameters);

// `value` above zero; `role` is what it must be: "a multiplicity".
Parsed<double> EvaluatePositive(const Value& value,
                                std::string_view role,
                                ParameterSource& parameters);

// "expected a width above zero, got 'w={wn-wp}' = -1e-07".
tl::unexpected<ParseError> WrongValue(const Value& value,
                                      std::string_view expected,
                                      double got);

}  // namespace gatedyno

#endif  // GATEDYNO_NETLIST_GEOMETRY_H_
