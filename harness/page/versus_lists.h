// What the page of two runs lists: what changed, where the verdicts differ, and
// what only one side has.

#ifndef GATEDYNO_PAGE_VERSUS_LISTS_H_
#define GATEDYNO_PAGE_VERSUS_LISTS_H_

#include <cstddef>
#include <string>

#include "harness/report/versus_view.h"

namespace gatedyno {

// No list of arcs has more; the table of arcs has all of them.
inline constexpr std::size_t kListed = 20;

// Largest change of g first.
std::string ChangedList(const VersusView& view);

std::string VerdictList(const VersusView& view);

// By corner and cell; says so where each side has what the other has.
std::string OneSidedLists(const VersusView& view);

}  // namespace gatedyno

#endif  // GATEDYNO_PAGE_VERSUS_LISTS_H_
