// Jobs that are all known before the first one runs.

#ifndef GATEDYNO_SIM_JOB_LIST_H_
#define GATEDYNO_SIM_JOB_LIST_H_

#include <optional>
#include <utility>
#include <vector>

#include "harness/sim/runner.h"

namespace gatedyno {

class JobList : public JobSource {
 public:
  explicit JobList(std::vector<Job> jobs) : jobs_(std::move(jobs)) {}

  std::optional<Job> Next() override {
    return next_ < jobs_.size() ? std::optional(jobs_[next_++]) : std::nullopt;
  }

 private:
  std::vector<Job> jobs_;
  size_t next_ = 0;
};

}  // namespace gatedyno

#endif  // GATEDYNO_SIM_JOB_LIST_H_
