// The lines of a deck that say where it is simulated: node, corner, settings.

#ifndef GATEDYNO_DECK_DECK_HEAD_H_
#define GATEDYNO_DECK_DECK_HEAD_H_

#include <string>

#include "harness/node/process_node.h"

namespace gatedyno {

// The simulator's defaults are wrong for femtofarad circuits: its charge
// tolerance, 1e-14 C, exceeds the charge on a gate, so that local error
// control never bites.  With these the delay of an FO4 edge is within 1e-4 of
// a 0.1 ps step's at a twentieth of the time.
struct SimSettings {
  double reltol = 1e-4;
  double chgtol_c = 1e-18;
  double trtol = 1.0;
};

// Where a deck is simulated.
struct Bench {
  const ProcessNode* node = nullptr;  // Outlives the Bench.
  Corner corner;
  std::string models_fingerprint;  // Of the corner's process.
  std::string simulator;           // Name and version, for the job's key.
  SimSettings settings;
};

// Options, temperature, process parameters and supply; everything but the
// models, so that it is the same wherever they are installed.
std::string DeckHead(const Bench& bench);

// The lines that read the models of the bench's process.
std::string ModelLines(const Bench& bench);

}  // namespace gatedyno

#endif  // GATEDYNO_DECK_DECK_HEAD_H_
