// The part of a plan file that people agreed on: tolerance rules, exemptions.

#ifndef GATEDYNO_FLOW_AGREEMENT_H_
#define GATEDYNO_FLOW_AGREEMENT_H_

#include <string>

#include <nlohmann/json.hpp>

#include "harness/base/result.h"
#include "harness/flow/plan.h"

namespace gatedyno {

// Fills in the plan's rules and exemptions from its file's content, which the
// schema has passed.  Refuses what a schema cannot: a rule that allows nothing,
// blank words, a day that is not in the calendar.
Status ReadAgreement(const nlohmann::json& content,
                     const std::string& file,
                     Plan* plan);

}  // namespace gatedyno

#endif  // GATEDYNO_FLOW_AGREEMENT_H_
