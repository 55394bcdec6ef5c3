// A day of the calendar as a text: "2026-12-02" (ISO 8601).  Two of them
// compare as their texts do.

#ifndef GATEDYNO_BASE_CALENDAR_DAY_H_
#define GATEDYNO_BASE_CALENDAR_DAY_H_

#include <string_view>

namespace gatedyno {

// Four, two and two digits, and a day that there is: not "2026-02-30".
bool IsCalendarDay(std::string_view text);

}  // namespace gatedyno

#endif  // GATEDYNO_BASE_CALENDAR_DAY_H_
