#include "harness/deck/stimulus.h"

#include <cmath>

#include <fmt/format.h>

#include "harness/deck/deck_text.h"

namespace gatedyno {
namespace {

// Faster than any stage's own edge (an FO4 stage takes about 5), so that the
// first shaping stage alone decides its slope.  Tried at 45 and 130 nm: up to 3
// the slope of delay against fanout does not move, at 8 it is 0.1 % off, at 17
// 2 %.  It starts well below, because the calibration does not know tau yet and
// takes one several times too large.
constexpr double kRampInTau = 1.5;
constexpr double kSettling = 5.0;  // Windows per sum of 50 % delays.
// Largest time step.  Edges are found by the source's own corners and followed
// by local error control; this only keeps flat stretches from one long step.
constexpr double kStepsPerHalf = 8;

// Up to two digits, so that decks stay the same for tiny changes of tau.
double RoundUp(double seconds) {
  const double unit = std::pow(10.0, std::floor(std::log10(seconds)) - 1);
  return std::ceil(seconds / unit - 1e-9) * unit;
}

}  // namespace

Stimulus StimulusFor(double chain_tau, double time_unit_s) {
  const double ramp_s = RoundUp(kRampInTau * time_unit_s);
  return {
      .start_s = ramp_s,
      .ramp_s = ramp_s,
      .half_s = RoundUp(kSettling * (chain_tau + kRampInTau) * time_unit_s)};
}

std::string SourceLine(const Stimulus& stimulus, double supply_v) {
  return fmt::format("vsrc src 0 pulse(0 {} {} {} {} {} {})\n",
                     supply_v,
                     DeckNumber(stimulus.start_s),
                     DeckNumber(stimulus.ramp_s),
                     DeckNumber(stimulus.ramp_s),
                     DeckNumber(stimulus.half_s - stimulus.ramp_s),
                     DeckNumber(4 * stimulus.half_s));
}

std::string TransientLine(const Stimulus& stimulus) {
  const std::string step = DeckNumber(stimulus.half_s / kStepsPerHalf);
  return fmt::format(
      ".tran {} {} 0 {}\n", step, DeckNumber(stimulus.stop_s()), step);
}

}  // namespace gatedyno
