// The lines of a deck that say where it is simulated: node and corner.

#ifndef GATEDYNO_DECK_DECK_HEAD_H_
#define GATEDYNO_DECK_DECK_HEAD_H_

#include <cstddef>
#include <optional>
#include <string>

#include "harness/node/process_node.h"

namespace gatedyno {

// Where a deck is simulated.
struct Bench {
  const ProcessNode* node = nullptr;  // Outlives the Bench.
  Corner corner;
  std::string models_fingerprint;  // Of the corner's process.
  std::string simulator;           // Name and version, for the job's key.
  size_t rung = 0;                 // Of the ladder; see sim_settings.h.
  // Wall clock for one job, in place of an estimate.
  std::optional<double> time_limit_s = std::nullopt;
};

// Temperature, process parameters and supply; everything but the
// models, so that it is the same wherever they are installed.
std::string DeckHead(const Bench& bench);

// The lines that read the models of the bench's process.
std::string ModelLines(const Bench& bench);

}  // namespace gatedyno

#endif  // GATEDYNO_DECK_DECK_HEAD_H_
