// The characters of an expression: symbols, names and numbers, with places.

#ifndef GATEDYNO_NETLIST_EXPRESSION_SCANNER_H_
#define GATEDYNO_NETLIST_EXPRESSION_SCANNER_H_

#include <cstddef>
#include <string_view>

#include "harness/netlist/logical_line.h"
#include "harness/netlist/source_text.h"

namespace gatedyno {

// Every call first skips blanks.
class ExpressionScanner {
 public:
  // `text` is line.text from `begin` on; `line` must outlive this object.
  ExpressionScanner(const LogicalLine& line,
                    size_t begin,
                    std::string_view text)
      : line_(line), begin_(begin), text_(text) {}

  bool AtEnd();
  bool AtNumber();
  bool AtName();
  // Whether the text goes on with `symbol`.
  bool At(std::string_view symbol);
  // The same, and steps over it.
  bool Take(std::string_view symbol);
  // "2.5e-9", "10um", "4k7": digits, an exponent, letters and digits.
  // REQUIRES: AtNumber().
  std::string_view TakeNumber();
  // REQUIRES: AtName().
  std::string_view TakeName();
  // One character, for a message.  REQUIRES: !AtEnd().
  std::string_view Peek();
  SourcePosition Position();

 private:
  void SkipBlanks();
  std::string_view Rest() const { return text_.substr(at_); }

  const LogicalLine& line_;
  size_t begin_;
  std::string_view text_;
  size_t at_ = 0;
};

}  // namespace gatedyno

#endif  // GATEDYNO_NETLIST_EXPRESSION_SCANNER_H_
