// The deck a designer would otherwise script for the same delay: the load
// written out as copies, each with its own copies on it, and a fixed small step
// instead of tolerances.
//
// Source, shaping stages, cell under test and .meas lines are those
// of our deck, so that both measure the same thing.

#ifndef GATEDYNO_TESTS_BENCH_SCRIPT_DECK_H_
#define GATEDYNO_TESTS_BENCH_SCRIPT_DECK_H_

#include <string>

#include "harness/deck/stage_job.h"
#include "harness/record/job.h"

namespace gatedyno {

inline constexpr double kScriptStep_s = 0.2e-12;

// `deck` with its .tran line replaced: steps of `step_s` at most, and half a
// step longer.
std::string WithFixedStep(std::string deck, const Job& job, double step_s);

// `job` is StageJob(bench, test).  REQUIRES: a whole fanout.
std::string ScriptDeck(const Bench& bench,
                       const StageTest& test,
                       const Job& job);

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_BENCH_SCRIPT_DECK_H_
