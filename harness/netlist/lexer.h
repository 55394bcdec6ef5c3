// Tokens of one logical line: words, `=`, and expressions in `{}` or quotes.
//
// A word runs to the next blank, `=`, `{` or quote; blanks and commas inside
// its parentheses belong to it, so that "max(wn, 2)" is one word.

#ifndef GATEDYNO_NETLIST_LEXER_H_
#define GATEDYNO_NETLIST_LEXER_H_

#include <cstddef>
#include <string_view>
#include <vector>

#include "harness/netlist/logical_line.h"
#include "harness/netlist/parse_error.h"

namespace gatedyno {

enum class TokenKind { kWord, kEquals, kBraced };

// A view into a LogicalLine, which must outlive it.
struct Token {
  TokenKind kind = TokenKind::kWord;
  std::string_view text;  // With its delimiters.
  size_t offset = 0;      // Of `text` in the line's text.
  SourcePosition position;
};

Parsed<std::vector<Token>> Tokenize(const LogicalLine& line);

}  // namespace gatedyno

#endif  // GATEDYNO_NETLIST_LEXER_H_
