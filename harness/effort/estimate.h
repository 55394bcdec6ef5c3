// The hand numbers of a cell, from its netlist alone.
//
// Method: logical effort (Sutherland, Sproull, Harris, Logical Effort, 1999).
// Steps and formulas are beside the functions that do them.

#ifndef GATEDYNO_EFFORT_ESTIMATE_H_
#define GATEDYNO_EFFORT_ESTIMATE_H_

#include <string>
#include <vector>

#include "harness/base/result.h"
#include "harness/netlist/cell.h"
#include "harness/record/arc.h"
#include "harness/record/line.h"

namespace gatedyno {

struct EstimateOptions {
  // Declared ratio of PMOS to NMOS resistance per width; also the P/N width
  // ratio of the reference inverter.
  double mu = 2.0;
  // Keep every side vector of a (pin, output, edge) instead of the worst.
  bool all_side_vectors = false;
};

struct ArcEstimate {
  Arc arc;
  Estimate estimate;
};

// What the netlist's topology says of one output.
struct OutputEstimate {
  std::string output;
  std::string function;           // Over the pins: "!(a & b | c)".
  std::string kind;               // Of the last group: "complementary static".
  bool self_dual = false;         // Function f(!a, !b, ...) = !f(a, b, ...).
  bool repeated_network = false;  // Pull-up has the pull-down's topology.
  int tallest_pull_down = 0;      // Devices in series, last group.
  int tallest_pull_up = 0;
  // For a self-dual function: what the other topology would cost, in words
  // with numbers; empty otherwise.
  std::string other_topology;
};

struct CellEstimate {
  std::string cell;
  int stages = 1;  // Groups on the longest way from a pin to an output.
  std::vector<std::string> inputs;  // Pin order.
  std::vector<OutputEstimate> outputs;
  std::vector<ArcEstimate> arcs;  // By pin order, output, rise before fall.
  std::vector<std::string> warnings;
};

// Fails with kBadInput, naming the cell's place and the offending pin or input
// vector, for a cell without output, a pin never used, an output that floats
// or is shorted for some vector, networks that are not complementary, feedback,
// or more than 12 inputs.
Result<CellEstimate> EstimateCell(const Cell& cell,
                                  const EstimateOptions& options);

}  // namespace gatedyno

#endif  // GATEDYNO_EFFORT_ESTIMATE_H_
