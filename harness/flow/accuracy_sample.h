// The sample of a run's jobs that is simulated again, one rung tighter.

#ifndef GATEDYNO_FLOW_ACCURACY_SAMPLE_H_
#define GATEDYNO_FLOW_ACCURACY_SAMPLE_H_

#include <array>
#include <map>
#include <string>

#include "harness/record/accuracy_check.h"
#include "harness/record/outcome.h"

namespace gatedyno {

class AccuracySample {
 public:
  // One job in so many: a few per cent of a run's time.
  static constexpr unsigned kOneIn = 25;

  explicit AccuracySample(double promised) : promised_(promised) {}

  // By the key, so that the same jobs are asked of every run, and each once.
  bool Wants(const std::string& job_key) const;

  // REQUIRES: both are measured, on fanout decks of the same arc and fanout.
  // `label` is for people: the job that was simulated twice.
  void Add(const std::string& job_key,
           const std::string& label,
           const Outcome& run,
           const Outcome& tighter);

  // The same whatever order the jobs ended in.
  AccuracyCheck Check() const;

  // Standard uncertainty of a delay by the settings, relative: the root mean
  // square of the changes, enlarged where few delays were compared (Student's
  // t); by the promise, as the half width of an even distribution, where none.
  double DelayUncertainty() const;

 private:
  double promised_;
  struct Change {
    std::string label;
    std::array<double, 2> relative = {};  // Of the delays of both edges.
  };

  std::map<std::string, Change> changes_;  // By key.
};

}  // namespace gatedyno

#endif  // GATEDYNO_FLOW_ACCURACY_SAMPLE_H_
