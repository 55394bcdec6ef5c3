// An output's function as a readable expression over the pins.
//
// Candidates: the networks themselves, stage by stage; the minimised sum of
// products of the function or of its complement; an exclusive or.  The one
// with the fewest names wins, then the one with the fewest negations.  Terms
// are in pin order.

#ifndef GATEDYNO_NETWORK_FUNCTION_TEXT_H_
#define GATEDYNO_NETWORK_FUNCTION_TEXT_H_

#include <string>

#include "harness/network/analysis.h"

namespace gatedyno {

// "!(a & b | c)"; "0" or "1" for an output that never moves.
// REQUIRES: a group drives `net`.
std::string FunctionText(const Cell& cell,
                         const NetworkAnalysis& analysis,
                         NetId net);

}  // namespace gatedyno

#endif  // GATEDYNO_NETWORK_FUNCTION_TEXT_H_
