#include "harness/netlist/expression_scanner.h"

#include <algorithm>

#include "harness/netlist/name.h"

namespace gatedyno {
namespace {

bool IsDigit(char c) {
  return c >= '0' && c <= '9';
}

bool IsNameLetter(char c) {
  return c == '_' || kLettersAndDigits.find(c) != std::string_view::npos;
}

}  // namespace

bool ExpressionScanner::AtEnd() {
  SkipBlanks();
  return at_ == text_.size();
}

bool ExpressionScanner::AtNumber() {
  return !AtEnd() && (IsDigit(text_[at_]) || text_[at_] == '.');
}

bool ExpressionScanner::AtName() {
  return !AtEnd() && IsNameLetter(text_[at_]) && !IsDigit(text_[at_]);
}

bool ExpressionScanner::At(std::string_view symbol) {
  SkipBlanks();
  return Rest().starts_with(symbol);
}

bool ExpressionScanner::Take(std::string_view symbol) {
  if (!At(symbol)) {
    return false;
  }
  at_ += symbol.size();
  return true;
}

std::string_view ExpressionScanner::TakeNumber() {
  SkipBlanks();
  const std::string_view rest = Rest();
  size_t length = std::min(rest.find_first_not_of(".0123456789"), rest.size());
  const std::string_view exponent = rest.substr(length);
  if (exponent.size() > 2 && (exponent[0] == 'e' || exponent[0] == 'E') &&
      (exponent[1] == '+' || exponent[1] == '-') && IsDigit(exponent[2])) {
    length += 2;
  }
  while (length < rest.size() &&
         (IsNameLetter(rest[length]) || rest[length] == '.')) {
    ++length;
  }
  at_ += length;
  return rest.substr(0, length);
}

std::string_view ExpressionScanner::TakeName() {
  SkipBlanks();
  const size_t start = at_;
  while (at_ < text_.size() && IsNameLetter(text_[at_])) {
    ++at_;
  }
  return text_.substr(start, at_ - start);
}

std::string_view ExpressionScanner::Peek() {
  SkipBlanks();
  return text_.substr(at_, 1);
}

SourcePosition ExpressionScanner::Position() {
  SkipBlanks();
  return line_.PositionOf(begin_ + at_);
}

void ExpressionScanner::SkipBlanks() {
  while (at_ < text_.size() && (text_[at_] == ' ' || text_[at_] == '\t')) {
    ++at_;
  }
}

}  // namespace gatedyno
