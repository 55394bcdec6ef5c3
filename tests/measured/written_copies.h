// A fanout deck whose loads are written out copy by copy.

#ifndef GATEDYNO_TESTS_MEASURED_WRITTEN_COPIES_H_
#define GATEDYNO_TESTS_MEASURED_WRITTEN_COPIES_H_

#include "harness/flow/prepared_run.h"
#include "harness/record/arc.h"
#include "harness/record/job.h"

namespace gatedyno {

// The job of an arc of the run's only cell at fanout 4, with the number of
// copies of the loads as the deck writer gives it.
Job CountedCopies(const PreparedRun& run, const Arc& arc);

// The same deck, but for the load and its load, which are four instances of
// one copy each, and four instances on each of these.
Job WrittenCopies(const PreparedRun& run, const Arc& arc);

// Expects every interval of both to be equal to 1e-4.
void ExpectSameWithWrittenCopies(const PreparedRun& run, const Arc& arc);

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_MEASURED_WRITTEN_COPIES_H_
