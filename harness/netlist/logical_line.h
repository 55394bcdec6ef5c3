// Physical lines joined into the lines SPICE means: comments dropped, `+`
// continuations appended.
//
// Comments: a line whose first non-blank is `*`; from `;` or `//` anywhere to
// the end of the line; from `$` at the start of a line or after a blank or a
// comma.  A `+` may be indented and may follow comment or blank lines.
// Source: behaviour of ngspice 39.3, tried.

#ifndef GATEDYNO_NETLIST_LOGICAL_LINE_H_
#define GATEDYNO_NETLIST_LOGICAL_LINE_H_

#include <cstddef>
#include <optional>
#include <string>
#include <vector>

#include "harness/netlist/parse_error.h"
#include "harness/netlist/source_text.h"

namespace gatedyno {

// One statement's text, and where each part of it stands in the file.
struct LogicalLine {
  struct Piece {
    size_t begin = 0;  // Offset into `text` of the line's first column.
    int line = 0;
  };

  std::string text;
  std::vector<Piece> pieces;  // One a physical line, never empty.

  SourcePosition PositionOf(size_t offset) const;
};

class LogicalLineReader {
 public:
  // `source` must outlive this object.
  explicit LogicalLineReader(const SourceText& source) : source_(source) {}

  // The next line that holds anything; nothing at the end.
  Parsed<std::optional<LogicalLine>> Next();

 private:
  const SourceText& source_;
  int next_line_ = 1;
};

}  // namespace gatedyno

#endif  // GATEDYNO_NETLIST_LOGICAL_LINE_H_
