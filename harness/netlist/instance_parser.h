// X lines: instances of other subcircuits.

#ifndef GATEDYNO_NETLIST_INSTANCE_PARSER_H_
#define GATEDYNO_NETLIST_INSTANCE_PARSER_H_

#include "harness/netlist/definition.h"
#include "harness/netlist/fields.h"
#include "harness/netlist/logical_line.h"
#include "harness/netlist/parse_error.h"
#include "harness/netlist/reader.h"

namespace gatedyno {

// X1 net ... subckt [params:] name=value ...
// A device of the process when the options name one so.  The .subckt may come
// later in the text.
Parsed<CellLine> ParseInstance(const LogicalLine& line,
                               const Fields& fields,
                               const ReaderOptions& options);

}  // namespace gatedyno

#endif  // GATEDYNO_NETLIST_INSTANCE_PARSER_H_
