#include "harness/report/exemption_text.h"

#include <cstddef>
#include <map>
#include <utility>

#include <fmt/format.h>
#include <fmt/ranges.h>

#include "harness/report/verdict_text.h"

namespace gatedyno {
namespace {

std::string NeededBy(const ExemptionUse& use) {
  return fmt::format(
      "needed by {} of {}", use.in_need, Counted(use.arcs, "arc"));
}

// Symbols of the quantities that each exemption speaks for, by its place; of
// the arc as a whole, none.
using Symbols = std::map<std::size_t, std::vector<std::string_view>>;

std::string Notes(const Symbols& by_place,
                  std::string_view verb,
                  const std::vector<Exemption>& exemptions) {
  std::vector<std::string> notes;
  for (const auto& [place, symbols] : by_place) {
    const Exemption& exemption = exemptions[place];
    notes.push_back(fmt::format("{}{}{} until {}: {} ({})",
                                fmt::join(symbols, ", "),
                                symbols.empty() ? "" : " ",
                                verb,
                                exemption.expires,
                                exemption.reason,
                                exemption.author));
  }
  return fmt::format("{}", fmt::join(notes, "; "));
}

}  // namespace

std::string ExemptionScope(const Exemption& exemption) {
  std::string scope = DescribePattern(exemption.where);
  if (exemption.quantity) {
    scope += fmt::format(", only {}", QuantitySymbol(*exemption.quantity));
  }
  return scope;
}

std::string ExemptionStanding(const Exemption& exemption,
                              const ExemptionUse& use) {
  switch (use.state) {
    case ExemptionState::kInForce:
      return fmt::format(
          "in force until {}, {}", exemption.expires, NeededBy(use));
    case ExemptionState::kExpired:
      return fmt::format(
          "expired: held until {}, {}", exemption.expires, NeededBy(use));
    case ExemptionState::kNotNeeded:
      return fmt::format("not needed: holds until {}, needed by none of {}",
                         exemption.expires,
                         Counted(use.arcs, "arc"));
    case ExemptionState::kCoversNothing:
      return fmt::format("covers no arc: holds until {}", exemption.expires);
  }
  return "";
}

std::string ExemptionNote(const Comparison& row,
                          const std::vector<Exemption>& exemptions,
                          const std::string& today) {
  if (exemptions.empty()) {
    return "";
  }
  Symbols in_force;
  Symbols expired;
  for (const Trouble& trouble : TroublesOf(row)) {
    const Excuse excuse = ExcuseFor(row, trouble, exemptions, today);
    Symbols& found = excuse.in_force ? in_force : expired;
    if (const auto place = excuse.in_force ? excuse.in_force : excuse.expired) {
      std::vector<std::string_view>& symbols = found[*place];
      if (trouble.quantity) {
        symbols.push_back(QuantitySymbol(*trouble.quantity));
      }
    }
  }
  const std::string now = Notes(in_force, "exempt", exemptions);
  const std::string before = Notes(expired, "was exempt", exemptions);
  return now.empty() || before.empty() ? now + before : now + "; " + before;
}

}  // namespace gatedyno
