// Runs a deck in `ngspice -b`, a child process apart from the program's own
// worker: the independent way of measuring something in a test.

#ifndef GATEDYNO_TESTS_SUPPORT_NGSPICE_BATCH_H_
#define GATEDYNO_TESTS_SUPPORT_NGSPICE_BATCH_H_

#include <map>
#include <string>
#include <string_view>

#include "harness/base/result.h"

namespace gatedyno {

// Results of .meas lines by name, in lower case.
using BatchMeasures = std::map<std::string, double>;

// `deck` is the whole text from the title line to .end; includes need absolute
// paths.  Put `.options num_threads=1` into it: the simulator's second thread
// only costs time on small circuits.  Fails with the simulator's words when it
// reports an error, when a .meas fails, or when it measures nothing; the deck
// and the log are then left under testing::TempDir() and named in the message.
Result<BatchMeasures> RunBatch(std::string_view deck);

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_SUPPORT_NGSPICE_BATCH_H_
