// A statement as SPICE lays it out: words, then name=value assignments.

#ifndef GATEDYNO_NETLIST_FIELDS_H_
#define GATEDYNO_NETLIST_FIELDS_H_

#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include "harness/netlist/lexer.h"
#include "harness/netlist/logical_line.h"
#include "harness/netlist/parse_error.h"

namespace gatedyno {

struct Assignment {
  std::string name;  // Lower case.
  Token value;
  std::string spelling;  // "W=2u", as written but for blanks at the "=".
  SourcePosition position;
};

struct Fields {
  std::vector<Token> words;
  std::vector<Assignment> assignments;
  std::optional<SourcePosition> params_keyword;  // Of "params:".
};

// The tokens are views into `line`; so are those of the Fields.  Every name is
// assigned once.
Parsed<Fields> SplitFields(const LogicalLine& line);

}  // namespace gatedyno

#endif  // GATEDYNO_NETLIST_FIELDS_H_
