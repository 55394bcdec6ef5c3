// Moments for people and for other programs, in UTC.

#ifndef GATEDYNO_REPORT_TIME_TEXT_H_
#define GATEDYNO_REPORT_TIME_TEXT_H_

#include <string>

#include "harness/store/run_record.h"

namespace gatedyno {

// "2026-03-01 21:30:02 UTC".
std::string TimeText(UnixMilliseconds at);

// "2026-03-01T21:30:02Z": ISO 8601.
std::string IsoTimeText(UnixMilliseconds at);

}  // namespace gatedyno

#endif  // GATEDYNO_REPORT_TIME_TEXT_H_
