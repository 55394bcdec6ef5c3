#include "tests/bench/script_deck.h"

#include <algorithm>
#include <cassert>
#include <cmath>

#include <fmt/format.h>

#include "harness/base/text.h"
#include "harness/deck/deck_text.h"
#include "harness/deck/instance.h"
#include "harness/deck/stage_measures.h"

namespace gatedyno {
namespace {

NetId PinNamed(const Cell& cell, const std::string& name) {
  return *std::find_if(cell.pins.begin(), cell.pins.end(), [&](NetId pin) {
    return EqualsIgnoringCase(cell.net_name(pin), name);
  });
}

class LoadWriter {
 public:
  LoadWriter(const Bench& bench, const StageTest& test)
      : test_(test), writer_(*test.cell, *bench.node) {}

  std::string Lines() {
    const int copies = static_cast<int>(std::lround(test_.fanout));
    for (int load = 0; load < copies; ++load) {
      const std::string prefix = fmt::format("la{}", load);
      Add(prefix, kOutputNet, prefix + "_out");
      for (int next = 0; next < copies; ++next) {
        const std::string outer = fmt::format("lb{}_{}", load, next);
        Add(outer, prefix + "_out", outer + "_out");
      }
    }
    return std::move(lines_);
  }

 private:
  void Add(const std::string& prefix,
           const std::string& in,
           const std::string& out) {
    const Cell& cell = *test_.cell;
    Instance instance{prefix, {}, 1.0};
    for (const SideInput& side : test_.arc.side) {
      instance.nets[PinNamed(cell, side.pin)] =
          side.high ? kPowerNet : kGroundNet;
    }
    instance.nets[PinNamed(cell, test_.arc.pin)] = in;
    instance.nets[PinNamed(cell, test_.arc.output)] = out;
    lines_ += writer_.Lines(instance);
  }

  const StageTest& test_;
  const CellWriter writer_;
  std::string lines_;
};

// The simulator gives up ("timestep too small") where the last fixed step ends
// within rounding of the stop time: tried, 8 % of the script's decks.
constexpr double kStepsBeyondStop = 0.5;

}  // namespace

std::string WithFixedStep(std::string deck, const Job& job, double step_s) {
  const size_t begin = deck.find(".tran ");
  assert(begin != std::string::npos);
  const std::string step = DeckNumber(step_s);
  return deck.replace(
      begin,
      deck.find('\n', begin) - begin,
      fmt::format(".tran {} {} 0 {}",
                  step,
                  DeckNumber(job.stop_s + kStepsBeyondStop * step_s),
                  step));
}

std::string ScriptDeck(const Bench& bench,
                       const StageTest& test,
                       const Job& job) {
  std::string deck = job.deck;
  const size_t begin = deck.find("* load: ");
  const size_t end = deck.find(".tran ", begin);
  assert(begin != std::string::npos && end != std::string::npos);
  deck.replace(begin, end - begin, LoadWriter(bench, test).Lines());
  return WithFixedStep(std::move(deck), job, kScriptStep_s);
}

}  // namespace gatedyno
