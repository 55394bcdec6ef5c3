// Logical lines -> definitions.  Knows the kinds of lines; evaluates nothing.
//
// Text after .end is an error unless it is a comment: an old revision of a
// cell left below it would otherwise be skipped in silence.  A .subckt inside
// a .subckt is refused.  A file's parameters may be used above their .param
// line, and every name is defined once in its scope.

#ifndef GATEDYNO_NETLIST_PARSER_H_
#define GATEDYNO_NETLIST_PARSER_H_

#include "harness/netlist/definition.h"
#include "harness/netlist/parse_error.h"
#include "harness/netlist/reader.h"
#include "harness/netlist/source_text.h"

namespace gatedyno {

// `options` must outlive the netlist, whose devices point into it.
Parsed<Netlist> ParseNetlist(const SourceText& source,
                             const ReaderOptions& options);

}  // namespace gatedyno

#endif  // GATEDYNO_NETLIST_PARSER_H_
