// The value of an assignment, with wording that says what it should have been.

#ifndef GATEDYNO_NETLIST_VALUE_PARSER_H_
#define GATEDYNO_NETLIST_VALUE_PARSER_H_

#include <string_view>
#include <vector>

#include "harness/netlist/definition.h"
#include "harness/netlist/fields.h"
#include "harness/netlist/lexer.h"
#include "harness/netlist/logical_line.h"
#include "harness/netlist/parse_error.h"

namespace gatedyno {

// A value may be bare (w=2*wn), in braces or in quotes.  `role` is what it
// must be: a bad lone number is worded "expected a width in metres, got
// 'W=2x'", with the caret at the assignment; a bad expression gets its caret
// at the offending part.
Parsed<Value> ParseValue(const LogicalLine& line,
                         const Assignment& assignment,
                         std::string_view role);
// The same for a value without a name, as in "R1 a b 100".
Parsed<Value> ParseValue(const LogicalLine& line,
                         const Token& token,
                         std::string_view role);

// Parameters of no particular role, in order.
Parsed<std::vector<ParameterDefinition>> ParseParameters(
    const LogicalLine& line, const std::vector<Assignment>& assignments);

}  // namespace gatedyno

#endif  // GATEDYNO_NETLIST_VALUE_PARSER_H_
