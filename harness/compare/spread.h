// How far a figure holds from one run to another: its changes over many arcs.

#ifndef GATEDYNO_COMPARE_SPREAD_H_
#define GATEDYNO_COMPARE_SPREAD_H_

#include <cstddef>
#include <optional>
#include <string>
#include <vector>

#include "harness/compare/versus.h"

namespace gatedyno {

// Of the changes c of arcs; those without one do not count.
struct Spread {
  int count = 0;
  double mean = 0.0;                // 0 where there is no arc.
  std::optional<double> deviation;  // Standard, n - 1; none below two arcs.
  // Places in Versus::arcs, largest |c| first; at most as many as asked for.
  std::vector<std::size_t> largest;
};

// What is spread: c of one of an arc's figures.
using RelativeChange = std::optional<double> (*)(const ArcPair& pair);

std::optional<double> EffortChange(const ArcPair& pair);
std::optional<double> ParasiticChange(const ArcPair& pair);  // p in tau.
std::optional<double> ParasiticInPInvChange(const ArcPair& pair);

// `places` are in Versus::arcs.
Spread SpreadOf(const Versus& versus,
                const std::vector<std::size_t>& places,
                RelativeChange change,
                std::size_t largest_count = 3);

// Every place of Versus::arcs.
std::vector<std::size_t> AllPlaces(const Versus& versus);

// How many of the changes are at most `limit`, up or down.
int CountWithin(const Versus& versus, RelativeChange change, double limit);

// Arcs whose output is driven alike.
struct ArcGroup {
  std::string name;  // "fall, pull-down 2 high".
  std::vector<std::size_t> places;
};

// By the edge and, for cells of one stage, by the tallest stack of the network
// that drives it, as `run` describes the cells: falling edges first, lower
// stacks first, cells of several stages last.
std::vector<ArcGroup> GroupByStack(const Versus& versus, const RunResult& run);

}  // namespace gatedyno

#endif  // GATEDYNO_COMPARE_SPREAD_H_
