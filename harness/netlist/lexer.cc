#include "harness/netlist/lexer.h"

#include <string>

#include <fmt/format.h>

namespace gatedyno {
namespace {

bool IsBlank(char c) {
  return c == ' ' || c == '\t';
}

bool MayStandInWord(char c) {
  return c > ' ' && c <= '~' && c != '"' && c != '\\' && c != '}';
}

class Lexer {
 public:
  explicit Lexer(const LogicalLine& line) : line_(line), text_(line.text) {}

  Parsed<std::vector<Token>> Run() {
    while (SkipBlanks()) {
      const char c = text_[at_];
      Parsed<size_t> end = at_ + 1;
      TokenKind kind = TokenKind::kEquals;
      if (c == '{' || c == '\'') {
        kind = TokenKind::kBraced;
        end = EndOfBraced(c == '{' ? '}' : '\'');
      } else if (c != '=') {
        kind = TokenKind::kWord;
        end = EndOfWord();
      }
      if (!end.ok()) {
        return Forward(end);
      }
      Add(kind, *end);
    }
    return tokens_;
  }

 private:
  bool SkipBlanks() {
    while (at_ < text_.size() && IsBlank(text_[at_])) {
      ++at_;
    }
    return at_ < text_.size();
  }

  void Add(TokenKind kind, size_t end) {
    tokens_.push_back(
        {kind, text_.substr(at_, end - at_), at_, line_.PositionOf(at_)});
    at_ = end;
  }

  Parsed<size_t> EndOfBraced(char close) const {
    const size_t end = text_.find(close, at_ + 1);
    if (end == std::string_view::npos) {
      return Complain(line_.PositionOf(at_),
                      fmt::format("no closing {} for this {}",
                                  close == '}' ? "'}'" : "quote",
                                  close == '}' ? "'{'" : "quote"));
    }
    const size_t after = end + 1;
    if (after < text_.size() && !IsBlank(text_[after])) {
      return Complain(line_.PositionOf(after),
                      fmt::format("expected a blank after the expression {}",
                                  Quote(text_.substr(at_, after - at_))));
    }
    return after;
  }

  Parsed<size_t> EndOfWord() const {
    std::vector<size_t> open;
    size_t i = at_;
    for (; i < text_.size(); ++i) {
      const char c = text_[i];
      if (open.empty() && (IsBlank(c) || c == '=' || c == '{' || c == '\'')) {
        break;
      }
      if (c == '(') {
        open.push_back(i);
      } else if (c == ')' && open.empty()) {
        return Complain(line_.PositionOf(i), "no '(' for this ')'");
      } else if (c == ')') {
        open.pop_back();
      } else if (!(open.empty() ? MayStandInWord(c) && c != ','
                                : MayStandInWord(c) || IsBlank(c))) {
        return Unexpected(i);
      }
    }
    if (!open.empty()) {
      return Complain(line_.PositionOf(open.back()), "no ')' for this '('");
    }
    return i;
  }

  tl::unexpected<ParseError> Unexpected(size_t i) const {
    const auto byte = static_cast<unsigned char>(text_[i]);
    const std::string name = byte > ' ' && byte <= '~'
                                 ? fmt::format("'{}'", text_[i])
                                 : fmt::format("byte 0x{:02x}", byte);
    return Complain(line_.PositionOf(i), "unexpected " + name);
  }

  const LogicalLine& line_;
  std::string_view text_;
  size_t at_ = 0;
  std::vector<Token> tokens_;
};

}  // namespace

Parsed<std::vector<Token>> Tokenize(const LogicalLine& line) {
  return Lexer(line).Run();
}

}  // namespace gatedyno
