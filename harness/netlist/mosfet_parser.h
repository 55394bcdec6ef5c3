// M lines, and X lines that name a device of the process.

#ifndef GATEDYNO_NETLIST_MOSFET_PARSER_H_
#define GATEDYNO_NETLIST_MOSFET_PARSER_H_

#include "harness/netlist/definition.h"
#include "harness/netlist/fields.h"
#include "harness/netlist/logical_line.h"
#include "harness/netlist/parse_error.h"
#include "harness/netlist/reader.h"

namespace gatedyno {

// M1 drain gate source body device name=value ...
Parsed<CellLine> ParseMosfet(const LogicalLine& line,
                             const Fields& fields,
                             const ReaderOptions& options);

// X1 drain gate source body device name=value ...
// `device` is the one the last word names.
Parsed<CellLine> ParseSubcircuitDevice(const LogicalLine& line,
                                       const Fields& fields,
                                       const DeviceName& device);

}  // namespace gatedyno

#endif  // GATEDYNO_NETLIST_MOSFET_PARSER_H_
