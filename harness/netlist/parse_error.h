// What is wrong with a netlist, and where.
//
// Inside this layer failures travel as Parsed<T>, with the position still a
// position; ReadCells words them once, at the end:
//
//     decks/cells/nand2.sp:7:23: expected a width in metres, got 'W=2x'
//     M3 y a n1 0 nch L=60n W=2x
//                           ^

#ifndef GATEDYNO_NETLIST_PARSE_ERROR_H_
#define GATEDYNO_NETLIST_PARSE_ERROR_H_

#include <string>
#include <string_view>
#include <utility>
#include <variant>

#include <tl/expected.hpp>

#include "harness/netlist/source_text.h"

namespace gatedyno {

struct ParseError {
  SourcePosition position;
  std::string message;
  // Path of the flattened instance that has the problem ("x1.x2"); empty in
  // the cell itself.
  std::string instance;
};

template <class T>
class [[nodiscard]] Parsed : public tl::expected<T, ParseError> {
 public:
  using tl::expected<T, ParseError>::expected;

  bool ok() const { return this->has_value(); }
};

using ParseStatus = Parsed<std::monostate>;

inline tl::unexpected<ParseError> Complain(SourcePosition position,
                                           std::string message) {
  return tl::unexpected<ParseError>({position, std::move(message), {}});
}
template <class T>
tl::unexpected<ParseError> Forward(const Parsed<T>& failed) {
  return tl::unexpected<ParseError>(failed.error());
}

// Message, the line, a caret.  A long line is cut to the caret's surroundings;
// bytes that are not printable ASCII show as '?', one column each.
std::string WordParseError(const ParseError& error, const SourceText& source);

// `text` between single quotes, fit for a message: cut when long, unprintable
// bytes as '?'.
std::string Quote(std::string_view text);

}  // namespace gatedyno

#endif  // GATEDYNO_NETLIST_PARSE_ERROR_H_
