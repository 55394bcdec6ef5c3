// How decks spell things.

#ifndef GATEDYNO_DECK_DECK_TEXT_H_
#define GATEDYNO_DECK_DECK_TEXT_H_

#include <string>
#include <string_view>

namespace gatedyno {

inline constexpr std::string_view kPowerNet = "vpwr";
inline constexpr std::string_view kGroundNet = "0";

// A number with nine digits: finer than any effect of a deck, and readable.
std::string DeckNumber(double value);

// Names from a cell file, made harmless for a comment of a deck: letters,
// digits, blanks and _-.+=>, stay, anything else becomes '_'.
std::string DeckRemark(std::string_view name);

}  // namespace gatedyno

#endif  // GATEDYNO_DECK_DECK_TEXT_H_
