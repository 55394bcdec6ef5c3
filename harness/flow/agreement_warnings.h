// Rules and exemptions that are about nothing, as where a cell is misspelt.

#ifndef GATEDYNO_FLOW_AGREEMENT_WARNINGS_H_
#define GATEDYNO_FLOW_AGREEMENT_WARNINGS_H_

#include <string>
#include <vector>

#include "harness/flow/prepared_run.h"

namespace gatedyno {

// "/exemptions/0 of the plan (nadn2, p) covers no arc of this run".
std::vector<std::string> AgreementWarnings(const PreparedRun& run);

}  // namespace gatedyno

#endif  // GATEDYNO_FLOW_AGREEMENT_WARNINGS_H_
