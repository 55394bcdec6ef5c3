// The source of a deck and the time it runs: one rising and one falling edge,
// each with room to settle.

#ifndef GATEDYNO_DECK_STIMULUS_H_
#define GATEDYNO_DECK_STIMULUS_H_

#include <string>

namespace gatedyno {

struct Stimulus {
  double start_s = 0.0;  // Of the rising edge.
  double ramp_s = 0.0;   // Of either edge, 0 to 100 %.
  double half_s = 0.0;   // From the rising to the falling edge, and from there
                         // to the end.
  double stop_s() const { return start_s + 2 * half_s; }
};

// For a chain whose delays add up to `chain_tau` time units by hand.  The
// window is generous: with local error control flat stretches cost next to
// nothing, and the swing check tells when it was too short.
Stimulus StimulusFor(double chain_tau, double time_unit_s);

// The source line, on net "src", and the .tran line.
std::string SourceLine(const Stimulus& stimulus, double supply_v);
std::string TransientLine(const Stimulus& stimulus);

}  // namespace gatedyno

#endif  // GATEDYNO_DECK_STIMULUS_H_
