// A runner that answers from a function or a table, for tests: no unit test
// above this layer needs a simulator.

#ifndef GATEDYNO_SIM_TABLE_RUNNER_H_
#define GATEDYNO_SIM_TABLE_RUNNER_H_

#include <functional>
#include <map>
#include <string>
#include <vector>

#include "harness/sim/runner.h"

namespace gatedyno {

class TableRunner : public SimRunner {
 public:
  using Answer = std::function<Outcome(const Job& job)>;

  explicit TableRunner(Answer answer);
  // By Job::label.  A job whose label is not in the table ends as failed.
  explicit TableRunner(std::map<std::string, Outcome> by_label);

  Status Run(JobSource& jobs, const OnOutcome& on_outcome) override;

  // Every job asked for so far, in order.
  const std::vector<Job>& asked() const { return asked_; }

 private:
  Answer answer_;
  std::vector<Job> asked_;
};

// A measured outcome, for tables.
Outcome MeasuredOutcome(std::map<std::string, double> values_s);

}  // namespace gatedyno

#endif  // GATEDYNO_SIM_TABLE_RUNNER_H_
