// A run's verdict in a sentence, the same in every report for people.

#ifndef GATEDYNO_REPORT_VERDICT_TEXT_H_
#define GATEDYNO_REPORT_VERDICT_TEXT_H_

#include <map>
#include <string>

#include "harness/record/run_result.h"

namespace gatedyno {

// Cells by the worst that is said of one of their arcs, at any corner: beyond,
// then not measured, then within.
struct CellCounts {
  int within = 0;
  int beyond = 0;
  int not_measured = 0;
};

std::map<std::string, Verdict> VerdictsOfCells(const RunResult& result);
CellCounts CountCells(const RunResult& result);

// "3 of 26 arcs, in 2 of 9 cells, lie beyond what is allowed (g 25 %, p 35 % of
// the hand number); 1 arc was not measured."
std::string VerdictSentence(const RunResult& result);

// "g 25 %, p 35 % of the hand number", and that rules say something else for
// some arcs.
std::string AllowedText(const RunFacts& facts);

// "1 arc", "3 arcs".
std::string Counted(int count, const std::string& what);

}  // namespace gatedyno

#endif  // GATEDYNO_REPORT_VERDICT_TEXT_H_
