// What a job's nets did over time.

#ifndef GATEDYNO_RECORD_WAVEFORM_H_
#define GATEDYNO_RECORD_WAVEFORM_H_

#include <string>
#include <vector>

namespace gatedyno {

// One net's voltage over time.
struct Waveform {
  std::string net;
  std::vector<double> time_s;     // Increasing; at least one.
  std::vector<double> voltage_v;  // As many.

  bool operator==(const Waveform&) const = default;
};

// When an interval began and ended: where its crossings lie on the waveforms.
struct TimedInterval {
  std::string name;  // Interval::name.
  double from_s = 0.0;
  double to_s = 0.0;

  bool operator==(const TimedInterval&) const = default;
};

// All that was simulated of a job, for who asks for it (Job::wants_waves).
struct Waves {
  std::vector<Waveform> waveforms;       // Of the nets the job asks about.
  std::vector<TimedInterval> intervals;  // In the job's order.

  bool operator==(const Waves&) const = default;
};

}  // namespace gatedyno

#endif  // GATEDYNO_RECORD_WAVEFORM_H_
