// Names in a drawing, where room is short.

#ifndef GATEDYNO_PAGE_LABEL_TEXT_H_
#define GATEDYNO_PAGE_LABEL_TEXT_H_

#include <string>
#include <string_view>

namespace gatedyno {

// Places of a fixed-width font that UTF-8 text takes at most: one an ASCII
// character, two any other.
int LabelPlaces(std::string_view text);

// `name`, or its beginning and an ellipsis where it takes more than `most`
// places.
std::string ShortLabel(std::string_view name, int most);

}  // namespace gatedyno

#endif  // GATEDYNO_PAGE_LABEL_TEXT_H_
