// Finding an arc's hand numbers in a cell's estimate.

#ifndef GATEDYNO_TESTS_SUPPORT_FIND_ARC_H_
#define GATEDYNO_TESTS_SUPPORT_FIND_ARC_H_

#include <string>

#include <gtest/gtest.h>

#include "harness/effort/estimate.h"

namespace gatedyno {

// The first of the pin's arcs with that output edge.
inline ArcEstimate FindArc(const CellEstimate& cell,
                           const std::string& pin,
                           Edge edge,
                           const std::string& output = "y") {
  for (const ArcEstimate& found : cell.arcs) {
    if (found.arc.pin == pin && found.arc.output == output &&
        found.arc.edge == edge) {
      return found;
    }
  }
  ADD_FAILURE() << cell.cell << " has no arc " << pin << "->" << output << " "
                << EdgeName(edge);
  return {};
}

// The estimate, or a failed test and an empty one.
inline CellEstimate MustEstimate(const Cell& cell,
                                 double mu = 2.0,
                                 bool all_side_vectors = false) {
  Result<CellEstimate> estimate = EstimateCell(cell, {mu, all_side_vectors});
  if (!estimate.ok()) {
    ADD_FAILURE() << estimate.error().message;
    return {};
  }
  return *estimate;
}

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_SUPPORT_FIND_ARC_H_
