#include "harness/deck/deck_text.h"

#include <algorithm>

#include <fmt/format.h>

namespace gatedyno {
namespace {

bool IsHarmless(char c) {
  return (c >= 'a' && c <= 'z') || (c >= 'A' && c <= 'Z') ||
         (c >= '0' && c <= '9') ||
         std::string_view("_-.+=>, ").find(c) != std::string_view::npos;
}

}  // namespace

std::string DeckNumber(double value) {
  return fmt::format("{:.9g}", value);
}

std::string DeckRemark(std::string_view name) {
  std::string remark(name);
  std::replace_if(
      remark.begin(), remark.end(), [](char c) { return !IsHarmless(c); }, '_');
  return remark;
}

}  // namespace gatedyno
