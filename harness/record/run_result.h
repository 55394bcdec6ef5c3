// All that one run of a plan gave: what every report is made of.

#ifndef GATEDYNO_RECORD_RUN_RESULT_H_
#define GATEDYNO_RECORD_RUN_RESULT_H_

#include <string>
#include <vector>

#include "harness/record/accuracy_check.h"
#include "harness/record/circuit.h"
#include "harness/record/comparison.h"
#include "harness/record/exemption.h"

namespace gatedyno {

// What a report says of a cell above its arcs.
struct CellSummary {
  std::string name;
  std::vector<std::string> functions;  // "y = !(a & b)", one an output.
  int stages = 1;
  int tallest_pull_down = 0;
  int tallest_pull_up = 0;
  Circuit circuit = {};  // Without devices for a run of an older gatedyno.
};

struct FailedJob {
  std::string key;
  std::string label;
  std::string message;
};

struct JobCounts {
  int wanted = 0;  // Distinct jobs of the plan.
  int reused = 0;  // Already measured in the store.
  int simulated = 0;
  int failed = 0;
};

// How the run was made; enough to make it again.
struct RunFacts {
  std::string title;
  std::string node;  // Name.
  std::string node_title;
  Drive drive = Drive::kMatched;
  std::vector<double> fanouts;  // Empty: chosen arc by arc.
  double accuracy = 0.0;        // Asked for, of each delay.
  Tolerance tolerance;
  std::vector<ToleranceRule> tolerance_rules = {};
  std::vector<Exemption> exemptions = {};
  std::string program;  // "gatedyno 0.1.0".
  std::string simulator;
  std::string started;  // ISO 8601, UTC.
};

struct RunResult {
  RunFacts facts;
  std::vector<CellSummary> cells;         // In plan order.
  std::vector<Calibration> calibrations;  // One a corner that has one.
  std::vector<Comparison> comparisons;    // By corner, cell, arc.
  std::vector<FailedJob> failed_jobs;
  std::vector<std::string> warnings;
  AccuracyCheck accuracy;
  JobCounts jobs;
};

}  // namespace gatedyno

#endif  // GATEDYNO_RECORD_RUN_RESULT_H_
