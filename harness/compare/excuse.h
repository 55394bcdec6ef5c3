// Which exemption speaks for what is wrong with an arc, and how each exemption
// of a run stands on a day.

#ifndef GATEDYNO_COMPARE_EXCUSE_H_
#define GATEDYNO_COMPARE_EXCUSE_H_

#include <cstddef>
#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include "harness/compare/trouble.h"
#include "harness/record/exemption.h"
#include "harness/record/run_result.h"

namespace gatedyno {

// Whatever the day.  An exemption for one quantity says that this figure may be
// anything, so it covers doubt about it too; it covers neither the other figure
// nor an arc that was not measured at all.
bool Covers(const Exemption& exemption,
            const Comparison& row,
            const Trouble& trouble);

// Places in a run's exemptions; the first that covers the trouble.
struct Excuse {
  std::optional<std::size_t> in_force;
  std::optional<std::size_t> expired;  // Only where none is in force.
};

// `today` is written as Exemption::expires is.
Excuse ExcuseFor(const Comparison& row,
                 const Trouble& trouble,
                 const std::vector<Exemption>& exemptions,
                 const std::string& today);

// There is something wrong with the arc, and an exemption in force for each of
// it.
bool IsExcused(const Comparison& row,
               const std::vector<Exemption>& exemptions,
               const std::string& today);

enum class ExemptionState { kInForce, kExpired, kNotNeeded, kCoversNothing };

// "in force", "expired", "not needed", "covers no arc".
std::string_view ExemptionStateName(ExemptionState state);

struct ExemptionUse {
  ExemptionState state = ExemptionState::kCoversNothing;
  int arcs = 0;     // Of its pattern.
  int in_need = 0;  // Those of them with something wrong that it covers.
};

// Of every exemption of the run, in order.  One whose day has passed is
// expired, whatever it covers.
std::vector<ExemptionUse> UseOfExemptions(const RunResult& result,
                                          const std::string& today);

}  // namespace gatedyno

#endif  // GATEDYNO_COMPARE_EXCUSE_H_
