// The run as one page: a file that needs nothing else, neither a network nor,
// for its numbers, a script.

#ifndef GATEDYNO_PAGE_PAGE_H_
#define GATEDYNO_PAGE_PAGE_H_

#include <span>
#include <string>

#include "harness/record/arc_waves.h"
#include "harness/record/run_result.h"
#include "harness/report/run_source.h"

namespace gatedyno {

// HTML.  Every text of the user's is escaped, and a content security policy
// lets no script run but the page's own two, by their hashes.  The same run
// gives the same bytes.  `waves` are those that were asked for, if any.
std::string Page(const RunResult& result,
                 const RunSource& source,
                 std::span<const ArcWaves> waves = {});

}  // namespace gatedyno

#endif  // GATEDYNO_PAGE_PAGE_H_
