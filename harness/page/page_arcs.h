// The page's table of arcs: one row a comparison, whole without a script.

#ifndef GATEDYNO_PAGE_PAGE_ARCS_H_
#define GATEDYNO_PAGE_PAGE_ARCS_H_

#include <cstddef>
#include <string>

#include "harness/record/run_result.h"

namespace gatedyno {

// Row i has the id ArcId(i), and links to it: the script shows the arc's
// picture there.  Rows after the first kRowsAtOnce are in a second body,
// class "more", that the style leaves out where scripts run, since laying out
// thousands of rows takes seconds; the script brings them.
inline constexpr std::size_t kRowsAtOnce = 200;

std::string ArcId(std::size_t place);
// Exemptions stand as on the day `today`, "2026-12-02".
std::string ArcTable(const RunResult& result, const std::string& today);

}  // namespace gatedyno

#endif  // GATEDYNO_PAGE_PAGE_ARCS_H_
