// Built-in cells on a built-in node, ready for decks.

#ifndef GATEDYNO_TESTS_DECK_TEST_BENCH_H_
#define GATEDYNO_TESTS_DECK_TEST_BENCH_H_

#include <string>

#include <gtest/gtest.h>

#include "harness/base/install.h"
#include "harness/deck/sim_settings.h"
#include "harness/deck/stage_job.h"
#include "harness/effort/estimate.h"
#include "harness/netlist/reader.h"
#include "tests/support/find_arc.h"

namespace gatedyno {

// About tau of p45; fixed, so that decks do not follow the simulator.
inline constexpr double kTimeUnit_s = 2.2e-12;

// The first cell of a built-in file.
inline Cell BuiltInCell(const std::string& name, const ProcessNode& node) {
  Result<std::vector<Cell>> cells = ReadCellFile(
      DecksFolder() / "cells" / (name + ".sp"), ReaderOptionsOf(node));
  EXPECT_TRUE(cells.ok()) << cells.error().message;
  return cells.ok() ? cells->front() : Cell();
}

inline const ProcessNode& NodeP45() {
  static const auto& node = *new Result<ProcessNode>(LoadNode("p45"));
  EXPECT_TRUE(node.ok()) << node.error().message;
  return *node;
}

inline Bench BenchOf(const ProcessNode& node) {
  return {.node = &node,
          .corner = node.corners.front(),
          .models_fingerprint = "models",
          .simulator = "simulator 1",
          .rung = RungFor(kDefaultAccuracy)};
}

// `cell` outlives the test.
inline StageTest TestOf(const Cell& cell,
                        const std::string& pin,
                        Edge edge,
                        double fanout,
                        Drive drive = Drive::kMatched) {
  const ArcEstimate found = FindArc(MustEstimate(cell), pin, edge);
  return {.cell = &cell,
          .arc = found.arc,
          .estimate = found.estimate,
          .fanout = fanout,
          .drive = drive,
          .time_unit_s = kTimeUnit_s};
}

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_DECK_TEST_BENCH_H_
