// How fast a run is, how long it will still take, and both for people.

#ifndef GATEDYNO_REPORT_PACE_H_
#define GATEDYNO_REPORT_PACE_H_

#include <optional>
#include <string>

#include "harness/record/run_progress.h"

namespace gatedyno {

// Jobs that have ended, simulated or taken from a store.
int JobsDone(const RunProgress& progress);

// Jobs simulated per second of a session that has gone on for `session_s`.
// What was taken from the store costs no time and says nothing of what is
// left.  None before a job was simulated.
std::optional<double> JobsPerSecond(const RunProgress& progress,
                                    double session_s);

// At `jobs_per_s`, for the jobs still expected.  None where it is not known how
// many there will be: before the run is planned, and past what was expected.
// REQUIRES: jobs_per_s > 0.
std::optional<double> SecondsLeft(const RunProgress& progress,
                                  double jobs_per_s);

// "12 of 80 jobs"; "12 jobs" where it is not known how many there will be.
std::string JobsText(const RunProgress& progress);

// "8 s", "1 min 40 s", "2 h 5 min", "3 d 4 h": two units, rounded to the
// smaller.
std::string DurationText(double seconds);

// "41/s", "3.2/s", "12/min", "0.5/min": two digits that count, or more.
std::string RateText(double jobs_per_s);

}  // namespace gatedyno

#endif  // GATEDYNO_REPORT_PACE_H_
