// A job: one deck, what to measure on it, its limits.  The unit of work, of
// failure and of resuming.

#ifndef GATEDYNO_RECORD_JOB_H_
#define GATEDYNO_RECORD_JOB_H_

#include <cstddef>
#include <string>
#include <vector>

#include "harness/record/edge.h"

namespace gatedyno {

// The `occurrence`-th time (from 1) that v(net) passes `level_v` in direction
// `edge`.
struct Crossing {
  std::string net;
  double level_v = 0.0;
  Edge edge = Edge::kRise;
  int occurrence = 1;

  bool operator==(const Crossing&) const = default;
};

// value = time of `to` - time of `from`, seconds; may be negative.
struct Interval {
  std::string name;
  Crossing from;
  Crossing to;

  bool operator==(const Interval&) const = default;
};

// v(net) must go below `low_v` and above `high_v` within the run; a floating
// supply or an undriven gate simulates happily and returns nonsense.
struct SwingCheck {
  std::string net;
  double low_v = 0.0;
  double high_v = 0.0;

  bool operator==(const SwingCheck&) const = default;
};

struct Job {
  std::string key;    // Fingerprint of all that decides the outcome.
  std::string label;  // For people: "nand2 a->y h=4 typical".
  // The text but for the simulator's settings; see DeckText.
  std::string deck;
  // Lines that set the simulator, one text a rung: what is tried first, then
  // ever more careful ones.  None for a deck that brings its own.
  std::vector<std::string> settings;
  std::vector<Interval> intervals;
  std::vector<SwingCheck> swings;
  double stop_s = 0.0;  // The last time point the deck must reach.
  // Wall clock, before the worker is killed; for the first rung.
  double time_limit_s = 60.0;
  // The outcome shall hold what the nets did.  Changes no number, and is not
  // part of the key.
  bool wants_waves = false;

  bool operator==(const Job&) const = default;
};

// How often the job may be tried with other settings, itself included.
size_t RungCount(const Job& job);

// The whole deck: settings[rung] stand after its first line, the title.  Runs
// unchanged under a plain simulator.
// REQUIRES: rung < RungCount(job).
std::string DeckText(const Job& job, size_t rung);

}  // namespace gatedyno

#endif  // GATEDYNO_RECORD_JOB_H_
