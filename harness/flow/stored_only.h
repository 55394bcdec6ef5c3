// A runner that simulates nothing: what a store does not have is missing.
//
// With a desk that saves nothing it shows what a plan would give from a store
// as it is.  A changed netlist, model, corner or accuracy makes other jobs,
// which are missing: no old number is ever taken for a new one.

#ifndef GATEDYNO_FLOW_STORED_ONLY_H_
#define GATEDYNO_FLOW_STORED_ONLY_H_

#include <string>

#include "harness/base/result.h"
#include "harness/flow/prepared_run.h"
#include "harness/record/run_result.h"
#include "harness/sim/runner.h"
#include "harness/store/store.h"

namespace gatedyno {

class StoredOnly : public SimRunner {
 public:
  // `store` outlives the runner.
  explicit StoredOnly(Store* store) : store_(store) {}

  // A job ends as it did in the store; one that is not there ends as failed,
  // "not in the store".  Fails where the store cannot be read.
  Status Run(JobSource& jobs, const OnOutcome& on_outcome) override;

  // Those that the store does not have, or that have not ended there.
  int missing() const { return missing_; }

 private:
  Result<Outcome> OutcomeOf(const Job& job);

  Store* store_;
  int missing_ = 0;
};

// A plan's result, of what a store has.
struct FromStore {
  RunResult result;
  int missing_jobs = 0;  // At least: an arc asks for more once it has some.
};

// Writes nothing.  `simulator` is part of every job's key: the one whose
// outcomes are wanted.  Fails as Characterize does.
Result<FromStore> CharacterizeFromStore(const PreparedRun& run,
                                        const std::string& simulator,
                                        Store* store);

}  // namespace gatedyno

#endif  // GATEDYNO_FLOW_STORED_ONLY_H_
