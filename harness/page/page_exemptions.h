// The page's list of exemptions.

#ifndef GATEDYNO_PAGE_PAGE_EXEMPTIONS_H_
#define GATEDYNO_PAGE_PAGE_EXEMPTIONS_H_

#include <string>

#include "harness/record/run_result.h"

namespace gatedyno {

// A section of its own, and what leads to it from the head of the page; both
// empty where the plan has no exemption.  States are those of the day `today`.
std::string ExemptionSection(const RunResult& result, const std::string& today);
std::string ExemptionLink(const RunResult& result);

}  // namespace gatedyno

#endif  // GATEDYNO_PAGE_PAGE_EXEMPTIONS_H_
