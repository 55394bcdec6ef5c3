// Tolerance rules and exemptions as JSON: in a plan as in a run's result.
//
//   {"cells": "nor*", "edge": "rise", "corners": "slow_*", "effort": 0.3}
//   {"cells": "maj3_rep", "pins": "c", "quantity": "parasitic",
//    "reason": "...", "author": "...", "expires": "2027-03-31"}
//
// Fields that say nothing ("*", both edges, both quantities) are left out.

#ifndef GATEDYNO_RECORD_AGREEMENT_JSON_H_
#define GATEDYNO_RECORD_AGREEMENT_JSON_H_

#include <vector>

#include <nlohmann/json.hpp>

#include "harness/record/exemption.h"
#include "harness/record/tolerance.h"

namespace gatedyno {

nlohmann::json ToleranceRulesToJson(const std::vector<ToleranceRule>& rules);
nlohmann::json ExemptionsToJson(const std::vector<Exemption>& exemptions);

// Throw what nlohmann_json throws, or std::runtime_error on an unknown name.
std::vector<ToleranceRule> ReadToleranceRules(const nlohmann::json& list);
std::vector<Exemption> ReadExemptions(const nlohmann::json& list);

}  // namespace gatedyno

#endif  // GATEDYNO_RECORD_AGREEMENT_JSON_H_
