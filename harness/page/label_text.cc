#include "harness/page/label_text.h"

#include <cstddef>

namespace gatedyno {
namespace {

// UTF-8 (RFC 3629): 10xxxxxx goes on with a character that has begun.
bool IsContinuation(char byte) {
  return (static_cast<unsigned char>(byte) & 0xC0U) == 0x80U;
}

int PlacesOf(char first_byte) {
  constexpr unsigned char kPastAscii = 0x80;
  return static_cast<unsigned char>(first_byte) < kPastAscii ? 1 : 2;
}

}  // namespace

int LabelPlaces(std::string_view text) {
  int places = 0;
  for (const char byte : text) {
    places += IsContinuation(byte) ? 0 : PlacesOf(byte);
  }
  return places;
}

std::string ShortLabel(std::string_view name, int most) {
  constexpr std::string_view kEllipsis = "…";
  if (LabelPlaces(name) <= most) {
    return std::string(name);
  }
  int places = LabelPlaces(kEllipsis);
  size_t end = 0;
  while (end < name.size() &&
         (IsContinuation(name[end]) || places + PlacesOf(name[end]) <= most)) {
    places += IsContinuation(name[end]) ? 0 : PlacesOf(name[end]);
    ++end;
  }
  return std::string(name.substr(0, end)) + std::string(kEllipsis);
}

}  // namespace gatedyno
