#include "harness/record/tolerance.h"

namespace gatedyno {

Tolerance ToleranceFor(const Arc& arc,
                       const std::string& corner,
                       const Tolerance& general,
                       std::span<const ToleranceRule> rules) {
  Tolerance tolerance = general;
  for (const ToleranceRule& rule : rules) {
    if (Covers(rule.where, arc, corner)) {
      tolerance.effort = rule.effort.value_or(tolerance.effort);
      tolerance.parasitic = rule.parasitic.value_or(tolerance.parasitic);
    }
  }
  return tolerance;
}

}  // namespace gatedyno
