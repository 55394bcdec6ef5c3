#include "harness/flow/agreement_warnings.h"

#include <algorithm>
#include <cstddef>
#include <string_view>

#include <fmt/format.h>

#include "harness/record/arc_pattern.h"

namespace gatedyno {
namespace {

bool CoversAny(const ArcPattern& pattern, const PreparedRun& run) {
  const auto covers_at = [&](const CellEstimate& cell, const Corner& corner) {
    return std::any_of(
        cell.arcs.begin(), cell.arcs.end(), [&](const ArcEstimate& arc) {
          return Covers(pattern, arc.arc, corner.name);
        });
  };
  return std::any_of(
      run.estimates.begin(), run.estimates.end(), [&](const auto& cell) {
        return std::any_of(
            run.corners.begin(), run.corners.end(), [&](const auto& corner) {
              return covers_at(cell, corner);
            });
      });
}

template <class T>
void Warn(const PreparedRun& run,
          const std::vector<T>& items,
          std::string_view list,
          std::vector<std::string>* warnings) {
  for (size_t i = 0; i < items.size(); ++i) {
    if (!CoversAny(items[i].where, run)) {
      warnings->push_back(
          fmt::format("{}/{} of the plan ({}) covers no arc of this run",
                      list,
                      i,
                      DescribePattern(items[i].where)));
    }
  }
}

}  // namespace

std::vector<std::string> AgreementWarnings(const PreparedRun& run) {
  std::vector<std::string> warnings;
  Warn(run, run.plan.tolerance_rules, "/tolerances/rules", &warnings);
  Warn(run, run.plan.exemptions, "/exemptions", &warnings);
  return warnings;
}

}  // namespace gatedyno
