// What a layout says to somebody who follows its wires with a pencil.

#ifndef GATEDYNO_TESTS_PAGE_DRAWN_WIRES_H_
#define GATEDYNO_TESTS_PAGE_DRAWN_WIRES_H_

#include <algorithm>
#include <map>
#include <string>
#include <vector>

#include <fmt/format.h>

#include "harness/page/circuit_layout.h"

namespace gatedyno {

struct Spot {
  int x = 0;
  int y = 0;

  auto operator<=>(const Spot&) const = default;
};

// From left to right or from top to bottom.
struct DrawnWire {
  Spot begin;
  Spot end;

  bool Passes(const Spot& spot) const {
    return begin.x <= spot.x && spot.x <= end.x && begin.y <= spot.y &&
           spot.y <= end.y;
  }
  bool EndsAt(const Spot& spot) const { return begin == spot || end == spot; }
};

class DrawnWires {
 public:
  explicit DrawnWires(const StageLayout& layout) : layout_(layout) {
    for (const PlacedNet& net : layout.nets) {
      wires_.push_back({{net.first_column, Y(net)}, {net.last_column, Y(net)}});
    }
    for (const PlacedDevice& device : layout.devices) {
      wires_.push_back({UpperEnd(device), SymbolTop(device)});
      Spot bottom = SymbolTop(device);
      ++bottom.y;
      wires_.push_back({bottom, LowerEnd(device)});
    }
    Join();
  }

  // Numbers of what is connected: the wires above and below the symbol.
  int above(size_t device) const { return group_[UpperWire(device)]; }
  int below(size_t device) const { return group_[UpperWire(device) + 1]; }
  int bar(size_t net) const { return group_[net]; }

  // Spots where three wire ends or more are joined, a wire that goes through
  // counting two.
  std::vector<Spot> Junctions() const {
    std::vector<Spot> junctions;
    for (const DrawnWire& wire : wires_) {
      for (const Spot& spot : {wire.begin, wire.end}) {
        if (Branches(spot) > 2) {
          junctions.push_back(spot);
        }
      }
    }
    std::sort(junctions.begin(), junctions.end());
    junctions.erase(std::unique(junctions.begin(), junctions.end()),
                    junctions.end());
    return junctions;
  }

  std::vector<Spot> Dots() const {
    std::vector<Spot> dots;
    for (const PlacedNet& net : layout_.nets) {
      for (const int column : net.dots) {
        dots.push_back({column, Y(net)});
      }
    }
    std::sort(dots.begin(), dots.end());
    return dots;
  }

 private:
  // Between two rows there is room for all tracks and a symbol of height 1.
  static constexpr int kRow = 1000;

  static int Y(const PlacedNet& net) { return net.net.row * kRow + net.track; }
  Spot UpperEnd(const PlacedDevice& device) const {
    return {device.column, Y(layout_.nets[device.between.upper])};
  }
  Spot LowerEnd(const PlacedDevice& device) const {
    return {device.column, Y(layout_.nets[device.between.lower])};
  }
  static Spot SymbolTop(const PlacedDevice& device) {
    return {device.column, device.slot * kRow + kRow / 2};
  }
  size_t UpperWire(size_t device) const {
    return layout_.nets.size() + 2 * device;
  }

  int Branches(const Spot& spot) const {
    int branches = 0;
    for (const DrawnWire& wire : wires_) {
      if (wire.begin != wire.end && wire.Passes(spot)) {
        branches += wire.EndsAt(spot) ? 1 : 2;
      }
    }
    return branches;
  }

  // Wires are joined where one ends; what only crosses is not.
  void Join() {
    for (size_t i = 0; i < wires_.size(); ++i) {
      group_.push_back(static_cast<int>(i));
    }
    for (size_t i = 0; i < wires_.size(); ++i) {
      for (size_t j = 0; j < wires_.size(); ++j) {
        if (wires_[j].Passes(wires_[i].begin) ||
            wires_[j].Passes(wires_[i].end)) {
          std::replace(group_.begin(), group_.end(), group_[i], group_[j]);
        }
      }
    }
  }

  const StageLayout& layout_;
  std::vector<DrawnWire> wires_;  // Of each net, then two of each device.
  std::vector<int> group_;        // By wire.
};

// What is wrong with the drawing of a stage; empty when it says what the
// netlist says.
inline std::vector<std::string> FaultsOf(const Circuit& circuit,
                                         const CircuitStage& stage,
                                         const StageLayout& layout) {
  std::vector<std::string> faults;
  std::map<size_t, int> times;
  std::map<Spot, std::string> symbols;
  const DrawnWires wires(layout);
  std::map<int, std::string> net_of;
  for (size_t net = 0; net < layout.nets.size(); ++net) {
    const std::string& name = layout.nets[net].net.name;
    const auto [known, is_new] = net_of.emplace(wires.bar(net), name);
    if (!is_new) {
      faults.push_back(fmt::format("{} touches {}", name, known->second));
    }
  }
  for (size_t i = 0; i < layout.devices.size(); ++i) {
    const PlacedDevice& placed = layout.devices[i];
    const CircuitDevice& device = circuit.devices[placed.between.device];
    ++times[placed.between.device];
    const auto [other, is_new] =
        symbols.emplace(Spot{placed.column, placed.slot}, device.name);
    if (!is_new) {
      faults.push_back(
          fmt::format("{} lies on {}", device.name, other->second));
    }
    std::vector<std::string> drawn = {net_of[wires.above(i)],
                                      net_of[wires.below(i)]};
    std::vector<std::string> wanted = {device.drain, device.source};
    std::sort(drawn.begin(), drawn.end());
    std::sort(wanted.begin(), wanted.end());
    if (drawn != wanted) {
      faults.push_back(fmt::format(
          "{} is drawn between {} and {}", device.name, drawn[0], drawn[1]));
    }
  }
  for (const size_t device : stage.devices) {
    const bool has_channel =
        circuit.devices[device].drain != circuit.devices[device].source;
    if (times[device] != int{has_channel}) {
      faults.push_back(fmt::format(
          "{} is drawn {} times", circuit.devices[device].name, times[device]));
    }
  }
  if (wires.Dots() != wires.Junctions()) {
    faults.push_back("dots are not where three wires meet");
  }
  return faults;
}

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_PAGE_DRAWN_WIRES_H_
