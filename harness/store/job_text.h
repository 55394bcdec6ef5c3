// Jobs, outcomes and progress as the store's text columns.

#ifndef GATEDYNO_STORE_JOB_TEXT_H_
#define GATEDYNO_STORE_JOB_TEXT_H_

#include <string>

#include "harness/base/result.h"
#include "harness/record/job.h"
#include "harness/record/outcome.h"
#include "harness/record/run_progress.h"

namespace gatedyno {

// The job but for its key, label and deck, which have columns of their own, and
// for its wish for waves.
std::string MeasuresToText(const Job& job);
// `named` has the key, label and deck; the rest comes from the text.
Result<Job> JobFromText(const Job& named, const std::string& measures);

// Bytes of the message that are not UTF-8 are replaced.  Waves are left out: a
// store of a million jobs keeps numbers, and simulates again for a picture.
std::string OutcomeToText(const Outcome& outcome);
Result<Outcome> OutcomeFromText(const std::string& text);

std::string ProgressToText(const RunProgress& progress);
Result<RunProgress> ProgressFromText(const std::string& text);

}  // namespace gatedyno

#endif  // GATEDYNO_STORE_JOB_TEXT_H_
