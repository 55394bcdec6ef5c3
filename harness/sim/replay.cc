#include "harness/sim/replay.h"

#include <cassert>
#include <map>
#include <string>
#include <utility>

#include "harness/sim/job_list.h"
#include "harness/sim/pool_worker.h"

namespace gatedyno {

Job OnlyRung(const Job& job, size_t rung) {
  Job alone = job;
  alone.time_limit_s = TimeLimitOf({.job = job, .rung = rung});
  if (!job.settings.empty()) {
    alone.settings = {job.settings[rung]};
  }
  return alone;
}

Result<std::vector<Outcome>> SimulateAgain(std::vector<Job> jobs,
                                           SimRunner* runner) {
  std::map<std::string, size_t> places;
  for (const Job& job : jobs) {
    places.emplace(job.key, places.size());
  }
  assert(places.size() == jobs.size());
  std::vector<Outcome> outcomes(jobs.size());
  JobList list(std::move(jobs));
  const Status ran =
      runner->Run(list, [&](const Job& job, const Outcome& outcome) {
        outcomes.at(places.at(job.key)) = outcome;
        return Ok();
      });
  if (!ran.ok()) {
    return Forward(ran);
  }
  return outcomes;
}

}  // namespace gatedyno
