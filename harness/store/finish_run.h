// Keeps what a run gave, as RunResultFromTexts() (record/run_result_json.h)
// reads it.

#ifndef GATEDYNO_STORE_FINISH_RUN_H_
#define GATEDYNO_STORE_FINISH_RUN_H_

#include "harness/record/run_result.h"
#include "harness/store/store.h"

namespace gatedyno {

// The errors are those of Store::FinishRun.
Status FinishRun(RunId run, const RunResult& result, Store* store);

}  // namespace gatedyno

#endif  // GATEDYNO_STORE_FINISH_RUN_H_
