// The words of a device line: its name and its nets.

#ifndef GATEDYNO_NETLIST_LINE_HEAD_H_
#define GATEDYNO_NETLIST_LINE_HEAD_H_

#include <cstddef>

#include "harness/netlist/definition.h"
#include "harness/netlist/fields.h"
#include "harness/netlist/parse_error.h"

namespace gatedyno {

// REQUIRES: fields.words holds the name and `net_count` nets, or more.
Parsed<LineHead> ParseHead(const Fields& fields, size_t net_count);

// Fails where a line has "params:" and takes none.
ParseStatus RefuseParamsKeyword(const Fields& fields);

// Fails where a line has more words than `most`; "expected name=value after
// the device, got 'off'".
ParseStatus RefuseMoreWords(const Fields& fields,
                            size_t most,
                            std::string_view after);

}  // namespace gatedyno

#endif  // GATEDYNO_NETLIST_LINE_HEAD_H_
