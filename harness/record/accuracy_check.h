// The promise of a run about its delays, and how it was checked.
//
// A sample of the run's jobs is simulated again with settings one rung tighter;
// what that changes is taken for the error of the run's own settings.

#ifndef GATEDYNO_RECORD_ACCURACY_CHECK_H_
#define GATEDYNO_RECORD_ACCURACY_CHECK_H_

#include <string>

namespace gatedyno {

struct AccuracyCheck {
  double promised = 0.0;  // Largest error of a delay, relative.
  int delays = 0;         // Compared; 0: nothing could be checked.
  double rms = 0.0;       // Of the relative changes; enters u(g) and u(p).
  double largest = 0.0;   // Absolute value of the largest.
  std::string worst;      // Its job's label.

  bool met() const { return delays > 0 && largest <= promised; }
};

}  // namespace gatedyno

#endif  // GATEDYNO_RECORD_ACCURACY_CHECK_H_
