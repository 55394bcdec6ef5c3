// The table of the page of two runs: one row an arc of both, whole without a
// script.

#ifndef GATEDYNO_PAGE_VERSUS_ARCS_H_
#define GATEDYNO_PAGE_VERSUS_ARCS_H_

#include <cstddef>
#include <string>
#include <vector>

#include "harness/report/versus_view.h"

namespace gatedyno {

// Rows after the first kRowsAtOnce (page/page_arcs.h) are in a second body,
// as those of a run are.
std::string PairTable(const Versus& versus);

// The same columns; `places` are in Versus::arcs.  `label` names the table.
std::string PairList(const Versus& versus,
                     const std::vector<std::size_t>& places,
                     const std::string& label);

}  // namespace gatedyno

#endif  // GATEDYNO_PAGE_VERSUS_ARCS_H_
