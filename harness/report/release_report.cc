#include "harness/report/release_report.h"

#include <cstddef>
#include <string_view>
#include <utility>

#include <fmt/format.h>
#include <fmt/ranges.h>

#include "harness/report/exemption_text.h"
#include "harness/report/number_text.h"
#include "harness/report/verdict_text.h"

namespace gatedyno {
namespace {

std::string Subject(const Comparison& row) {
  const std::string side = DescribeSide(row.arc);
  return fmt::format("{} {}{}{} at {}",
                     row.arc.cell,
                     DescribeArc(row.arc),
                     side.empty() ? "" : " with ",
                     side,
                     row.corner);
}

std::string Words(const Exemption& exemption) {
  return fmt::format("{} ({})", exemption.reason, exemption.author);
}

ReleasePart OfTheRun(const ReleaseReport& report) {
  ReleasePart part{.title = "the run as a whole", .items = {}};
  for (const std::string& reason : report.decision.of_the_run) {
    part.items.push_back({.subject = "", .text = reason, .note = ""});
  }
  if (report.missing_jobs > 0) {
    part.items.push_back(
        {.subject = "",
         .text = fmt::format("gatedyno run {} --store {} simulates what is "
                             "missing",
                             report.plan,
                             report.store),
         .note = ""});
  }
  return part;
}

ReleasePart Obstacles(const ReleaseReport& report,
                      TroubleKind kind,
                      std::string title) {
  ReleasePart part{.title = std::move(title), .items = {}};
  for (const Obstacle& obstacle : report.decision.obstacles) {
    if (obstacle.trouble.kind == kind) {
      part.items.push_back(
          {.subject = Subject(*obstacle.row),
           .text = obstacle.trouble.text,
           .note = obstacle.expired
                       ? ExemptionNote(*obstacle.row,
                                       report.result.facts.exemptions,
                                       report.today)
                       : ""});
    }
  }
  return part;
}

ReleasePart Excused(const ReleaseReport& report) {
  ReleasePart part{.title = "excused", .items = {}};
  for (const ExcusedTrouble& excused : report.decision.excused) {
    const Exemption& exemption =
        report.result.facts.exemptions[excused.exemption];
    part.items.push_back(
        {.subject = Subject(*excused.row),
         .text = excused.trouble.text,
         .note = fmt::format(
             "exempt until {}: {}", exemption.expires, Words(exemption))});
  }
  return part;
}

// Those that have expired, or the rest of those that are not in force.
ReleasePart IdleExemptions(const ReleaseReport& report,
                           bool expired,
                           std::string title) {
  ReleasePart part{.title = std::move(title), .items = {}};
  for (size_t i = 0; i < report.decision.exemptions.size(); ++i) {
    const Exemption& exemption = report.result.facts.exemptions[i];
    const ExemptionUse& use = report.decision.exemptions[i];
    const bool has_expired = use.state == ExemptionState::kExpired;
    if (use.state != ExemptionState::kInForce && has_expired == expired) {
      part.items.push_back({.subject = ExemptionScope(exemption),
                            .text = ExemptionStanding(exemption, use),
                            .note = Words(exemption)});
    }
  }
  return part;
}

std::string ChangeText(Quantity quantity, const Change& change) {
  const int decimals = quantity == Quantity::kEffort ? 3 : 2;
  return fmt::format("{} {:.{}f} -> {:.{}f}, {} (uncertainty {})",
                     QuantitySymbol(quantity),
                     change.before.value,
                     decimals,
                     change.after.value,
                     decimals,
                     SignedPercent(change.relative),
                     change.expanded
                         ? fmt::format("{:.2g} %", 100.0 * *change.expanded)
                         : "unknown");
}

// What of g and p moved, and what else there is to know.
std::string MovedText(const ArcPair& pair) {
  std::vector<std::string> parts;
  for (const Quantity quantity : {Quantity::kEffort, Quantity::kParasitic}) {
    const std::optional<Change>& change = ChangeIn(pair, quantity);
    if (change && IsBeyondUncertainty(*change)) {
      parts.push_back(ChangeText(quantity, *change));
    }
  }
  if (pair.finding == Finding::kBentApart) {
    parts.emplace_back("bent, and taken over other fanouts");
  }
  if (pair.verdicts_differ()) {
    parts.push_back(fmt::format("{} -> {}",
                                VerdictName(pair.a->verdict),
                                VerdictName(pair.b->verdict)));
  }
  return fmt::format("{}", fmt::join(parts, "; "));
}

ReleasePart Moved(const ReleaseBaseline& baseline) {
  const std::vector<const ArcPair*> moved = MovedArcs(baseline);
  const auto counted = [](const auto& list) {
    return Counted(static_cast<int>(list.size()), "arc");
  };
  ReleasePart part{.title = "moved since the baseline", .items = {}};
  part.items.push_back(
      {.subject = fmt::format(
           "run {} of {}", baseline.source.run, baseline.source.store),
       .text = fmt::format("{} compared, {} moved; only now: {}, only then: {}",
                           counted(baseline.versus.arcs),
                           moved.size(),
                           counted(baseline.versus.only_b),
                           counted(baseline.versus.only_a)),
       .note = ""});
  for (const ArcPair* pair : moved) {
    part.items.push_back(
        {.subject = Subject(*pair->b), .text = MovedText(*pair), .note = ""});
  }
  return part;
}

}  // namespace

std::vector<const ArcPair*> MovedArcs(const ReleaseBaseline& baseline) {
  std::vector<const ArcPair*> moved;
  for (const ArcPair& pair : baseline.versus.arcs) {
    if (pair.changed() || pair.finding == Finding::kBentApart ||
        pair.verdicts_differ()) {
      moved.push_back(&pair);
    }
  }
  return moved;
}

std::vector<ReleasePart> ReleaseParts(const ReleaseReport& report) {
  std::vector<ReleasePart> parts = {
      OfTheRun(report),
      Obstacles(report, TroubleKind::kBeyond, "beyond what is allowed"),
      Obstacles(report, TroubleKind::kTooUncertain, "too uncertain to tell"),
      Obstacles(report, TroubleKind::kNotMeasured, "not measured"),
      Excused(report),
      IdleExemptions(report, /*expired=*/true, "exemptions that have expired"),
      IdleExemptions(
          report, /*expired=*/false, "exemptions that nothing needs")};
  if (report.baseline) {
    parts.push_back(Moved(*report.baseline));
  }
  std::erase_if(parts,
                [](const ReleasePart& part) { return part.items.empty(); });
  return parts;
}

std::string ReleaseCounts(const ReleaseReport& report) {
  const Summary& counts = report.decision.counts;
  return fmt::format(
      "{}: {} within, {} beyond, {} not measured{}",
      Counted(static_cast<int>(report.result.comparisons.size()), "arc"),
      counts.within,
      counts.beyond,
      counts.not_measured,
      counts.bent > 0 ? fmt::format(", {} bent", counts.bent) : "");
}

}  // namespace gatedyno
