#include "harness/compare/spread.h"

#include <algorithm>
#include <cmath>
#include <map>
#include <numeric>
#include <utility>

#include <fmt/format.h>

namespace gatedyno {
namespace {

// What a group is sorted by.
struct GroupKey {
  int height = 0;  // 0: a cell of several stages, or one not described.
  Edge edge = Edge::kFall;

  bool operator<(const GroupKey& other) const {
    // Unknown heights last.
    const auto rank = [](const GroupKey& key) {
      return std::pair(std::pair(key.height == 0, key.edge == Edge::kRise),
                       key.height);
    };
    return rank(*this) < rank(other);
  }
};

std::string GroupName(const GroupKey& key) {
  if (key.height == 0) {
    return fmt::format("{}, several stages", EdgeName(key.edge));
  }
  return fmt::format("{}, {} {} high",
                     EdgeName(key.edge),
                     key.edge == Edge::kFall ? "pull-down" : "pull-up",
                     key.height);
}

using CellsByName = std::map<std::string, const CellSummary*>;

GroupKey KeyOf(const Arc& arc, const CellsByName& cells) {
  const auto found = cells.find(arc.cell);
  if (found == cells.end() || found->second->stages != 1) {
    return {.height = 0, .edge = arc.edge};
  }
  const CellSummary& cell = *found->second;
  return {.height = arc.edge == Edge::kFall ? cell.tallest_pull_down
                                            : cell.tallest_pull_up,
          .edge = arc.edge};
}

std::optional<double> Relative(const std::optional<Change>& change) {
  return change ? std::optional(change->relative) : std::nullopt;
}

// One arc's change.
struct Placed {
  std::size_t place = 0;
  double relative = 0.0;
};

std::vector<Placed> Changes(const Versus& versus,
                            const std::vector<std::size_t>& places,
                            RelativeChange change) {
  std::vector<Placed> changes;
  for (const std::size_t place : places) {
    if (const std::optional<double> relative = change(versus.arcs[place])) {
      changes.push_back({place, *relative});
    }
  }
  return changes;
}

}  // namespace

std::optional<double> EffortChange(const ArcPair& pair) {
  return Relative(pair.effort);
}

std::optional<double> ParasiticChange(const ArcPair& pair) {
  return Relative(pair.parasitic);
}

std::optional<double> ParasiticInPInvChange(const ArcPair& pair) {
  return Relative(pair.parasitic_in_p_inv);
}

Spread SpreadOf(const Versus& versus,
                const std::vector<std::size_t>& places,
                RelativeChange change,
                std::size_t largest_count) {
  std::vector<Placed> changes = Changes(versus, places, change);
  Spread spread;
  spread.count = static_cast<int>(changes.size());
  if (changes.empty()) {
    return spread;
  }
  const double count = spread.count;
  double sum = 0.0;
  for (const Placed& placed : changes) {
    sum += placed.relative;
  }
  spread.mean = sum / count;
  if (spread.count > 1) {
    double squares = 0.0;
    for (const Placed& placed : changes) {
      squares += std::pow(placed.relative - spread.mean, 2);
    }
    spread.deviation = std::sqrt(squares / (count - 1.0));
  }
  std::stable_sort(
      changes.begin(), changes.end(), [](const Placed& a, const Placed& b) {
        return std::abs(a.relative) > std::abs(b.relative);
      });
  changes.resize(std::min(changes.size(), largest_count));
  for (const Placed& placed : changes) {
    spread.largest.push_back(placed.place);
  }
  return spread;
}

std::vector<std::size_t> AllPlaces(const Versus& versus) {
  std::vector<std::size_t> places(versus.arcs.size());
  std::iota(places.begin(), places.end(), std::size_t{0});
  return places;
}

int CountWithin(const Versus& versus, RelativeChange change, double limit) {
  return static_cast<int>(std::count_if(
      versus.arcs.begin(), versus.arcs.end(), [&](const ArcPair& pair) {
        const std::optional<double> relative = change(pair);
        return relative && std::abs(*relative) <= limit;
      }));
}

std::vector<ArcGroup> GroupByStack(const Versus& versus, const RunResult& run) {
  CellsByName cells;
  for (const CellSummary& cell : run.cells) {
    cells.emplace(cell.name, &cell);
  }
  std::map<GroupKey, std::vector<std::size_t>> groups;
  for (std::size_t i = 0; i < versus.arcs.size(); ++i) {
    groups[KeyOf(versus.arcs[i].a->arc, cells)].push_back(i);
  }
  std::vector<ArcGroup> named;
  named.reserve(groups.size());
  for (auto& [key, places] : groups) {
    named.push_back({GroupName(key), std::move(places)});
  }
  return named;
}

}  // namespace gatedyno
