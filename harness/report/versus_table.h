// Two runs side by side for the terminal, at most 100 columns wide: a summary,
// since the arcs one by one are what the page and the files are for.

#ifndef GATEDYNO_REPORT_VERSUS_TABLE_H_
#define GATEDYNO_REPORT_VERSUS_TABLE_H_

#include <string>

#include "harness/report/style.h"
#include "harness/report/versus_view.h"

namespace gatedyno {

std::string VersusTable(const VersusView& view, const Style& style);

}  // namespace gatedyno

#endif  // GATEDYNO_REPORT_VERSUS_TABLE_H_
