// A job, done: its deck run, its intervals measured.

#ifndef GATEDYNO_WORKER_MEASURE_H_
#define GATEDYNO_WORKER_MEASURE_H_

#include <set>
#include <string>
#include <vector>

#include "harness/record/job.h"
#include "harness/record/outcome.h"
#include "harness/worker/session.h"
#include "harness/worker/waveform.h"

namespace gatedyno {

// Every net the job asks about.
std::set<std::string> NetsOf(const Job& job);

// Swings first: a delay on a net that floats means nothing.  The outcome is
// measured or failed; simulator_s is left at 0.  Where the job wants waves, the
// times of its intervals are those that its values are the differences of.
// REQUIRES: a waveform for each of NetsOf(job).
Outcome Measure(const Job& job, const std::vector<Waveform>& waveforms);

// At the job's first rung.
// REQUIRES: session->usable().
Outcome RunJob(const Job& job, Session* session);

}  // namespace gatedyno

#endif  // GATEDYNO_WORKER_MEASURE_H_
