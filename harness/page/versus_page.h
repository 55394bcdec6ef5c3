// Two runs side by side as one page, like that of a run (page/page.h): it
// needs neither a network nor, for its numbers, a script.

#ifndef GATEDYNO_PAGE_VERSUS_PAGE_H_
#define GATEDYNO_PAGE_VERSUS_PAGE_H_

#include <string>

#include "harness/report/versus_view.h"

namespace gatedyno {

// HTML.  The same runs give the same bytes.
std::string VersusPage(const VersusView& view);

}  // namespace gatedyno

#endif  // GATEDYNO_PAGE_VERSUS_PAGE_H_
