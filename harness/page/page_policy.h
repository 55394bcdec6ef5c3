// What the browser lets a page do.

#ifndef GATEDYNO_PAGE_PAGE_POLICY_H_
#define GATEDYNO_PAGE_PAGE_POLICY_H_

#include <string>

#include "harness/page/page_parts.h"

namespace gatedyno {

// A content security policy that asks nothing of a network and runs no script
// but the charts and `script`, known by their hashes.  Styles are let in whole,
// for the attributes that the charts set.
std::string PagePolicy(const PagePart& script);

}  // namespace gatedyno

#endif  // GATEDYNO_PAGE_PAGE_POLICY_H_
