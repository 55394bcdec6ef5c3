// What every report says of exemptions, in the same words.

#ifndef GATEDYNO_REPORT_EXEMPTION_TEXT_H_
#define GATEDYNO_REPORT_EXEMPTION_TEXT_H_

#include <string>
#include <vector>

#include "harness/compare/excuse.h"
#include "harness/record/comparison.h"
#include "harness/record/exemption.h"

namespace gatedyno {

// What it is for: "maj3_rep, pin c, only p".
std::string ExemptionScope(const Exemption& exemption);

// "in force until 2027-03-31, needed by 1 of 2 arcs".
std::string ExemptionStanding(const Exemption& exemption,
                              const ExemptionUse& use);

// At an arc with something wrong: "g exempt until 2027-03-31: reason (author)",
// and "p was exempt until 2026-01-31: ..." for one that has expired.  Empty
// where no exemption covers what is wrong.
std::string ExemptionNote(const Comparison& row,
                          const std::vector<Exemption>& exemptions,
                          const std::string& today);

}  // namespace gatedyno

#endif  // GATEDYNO_REPORT_EXEMPTION_TEXT_H_
