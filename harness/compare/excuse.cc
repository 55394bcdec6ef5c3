#include "harness/compare/excuse.h"

#include <algorithm>

namespace gatedyno {
namespace {

ExemptionState StateOf(const Exemption& exemption,
                       const ExemptionUse& use,
                       const std::string& today) {
  if (IsExpired(exemption, today)) {
    return ExemptionState::kExpired;
  }
  if (use.arcs == 0) {
    return ExemptionState::kCoversNothing;
  }
  return use.in_need > 0 ? ExemptionState::kInForce
                         : ExemptionState::kNotNeeded;
}

}  // namespace

bool Covers(const Exemption& exemption,
            const Comparison& row,
            const Trouble& trouble) {
  return (!exemption.quantity || exemption.quantity == trouble.quantity) &&
         Covers(exemption.where, row.arc, row.corner);
}

Excuse ExcuseFor(const Comparison& row,
                 const Trouble& trouble,
                 const std::vector<Exemption>& exemptions,
                 const std::string& today) {
  Excuse excuse;
  for (size_t i = 0; i < exemptions.size() && !excuse.in_force; ++i) {
    if (!Covers(exemptions[i], row, trouble)) {
      continue;
    }
    if (!IsExpired(exemptions[i], today)) {
      excuse = {.in_force = i, .expired = std::nullopt};
    } else if (!excuse.expired) {
      excuse.expired = i;
    }
  }
  return excuse;
}

bool IsExcused(const Comparison& row,
               const std::vector<Exemption>& exemptions,
               const std::string& today) {
  if (exemptions.empty()) {
    return false;
  }
  const std::vector<Trouble> troubles = TroublesOf(row);
  return !troubles.empty() &&
         std::all_of(troubles.begin(), troubles.end(), [&](const Trouble& t) {
           return ExcuseFor(row, t, exemptions, today).in_force.has_value();
         });
}

std::string_view ExemptionStateName(ExemptionState state) {
  switch (state) {
    case ExemptionState::kInForce:
      return "in force";
    case ExemptionState::kExpired:
      return "expired";
    case ExemptionState::kNotNeeded:
      return "not needed";
    case ExemptionState::kCoversNothing:
      return "covers no arc";
  }
  return "";
}

std::vector<ExemptionUse> UseOfExemptions(const RunResult& result,
                                          const std::string& today) {
  std::vector<ExemptionUse> uses;
  for (const Exemption& exemption : result.facts.exemptions) {
    ExemptionUse use;
    for (const Comparison& row : result.comparisons) {
      if (Covers(exemption.where, row.arc, row.corner)) {
        const std::vector<Trouble> troubles = TroublesOf(row);
        const bool in_need = std::any_of(
            troubles.begin(), troubles.end(), [&](const Trouble& trouble) {
              return Covers(exemption, row, trouble);
            });
        ++use.arcs;
        use.in_need += in_need ? 1 : 0;
      }
    }
    use.state = StateOf(exemption, use, today);
    uses.push_back(use);
  }
  return uses;
}

}  // namespace gatedyno
