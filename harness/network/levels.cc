#include "harness/network/levels.h"

#include <fmt/format.h>

namespace gatedyno {
namespace {

// Marks the nets of the group that `rail` reaches; supplies block the way.
void SpreadFrom(NetId rail,
                const SwitchNetwork& network,
                const std::vector<int>& conducting,
                std::vector<bool>& reached) {
  const auto passes = [&](NetId from, NetId to) {
    return (from == rail ||
            (!network.is_supply(from) && reached[static_cast<size_t>(from)])) &&
           !network.is_supply(to) && !reached[static_cast<size_t>(to)];
  };
  bool changed = true;
  while (changed) {
    changed = false;
    for (const int index : conducting) {
      const Switch& device = network.switches[static_cast<size_t>(index)];
      for (const NetId from : {device.drain, device.source}) {
        if (passes(from, device.across(from))) {
          reached[static_cast<size_t>(device.across(from))] = true;
          changed = true;
        }
      }
    }
  }
}

Level LevelOf(bool sees_power, bool sees_ground) {
  if (sees_power) {
    return sees_ground ? Level::kShorted : Level::kHigh;
  }
  return sees_ground ? Level::kLow : Level::kFloating;
}

}  // namespace

bool Conducts(const Switch& device, const Levels& levels) {
  const Level on = device.polarity == Polarity::kN ? Level::kHigh : Level::kLow;
  return levels[static_cast<size_t>(device.gate)] == on;
}

Levels Evaluate(const SwitchNetwork& network,
                const std::vector<Group>& groups,
                const std::vector<NetId>& inputs,
                InputVector vector) {
  const auto count = static_cast<size_t>(network.net_count());
  Levels levels(count, Level::kFloating);
  levels[static_cast<size_t>(network.power)] = Level::kHigh;
  levels[static_cast<size_t>(network.ground)] = Level::kLow;
  for (size_t i = 0; i < inputs.size(); ++i) {
    levels[static_cast<size_t>(inputs[i])] =
        IsHigh(vector, static_cast<int>(i)) ? Level::kHigh : Level::kLow;
  }
  std::vector<bool> sees_power(count);
  std::vector<bool> sees_ground(count);
  for (const Group& group : groups) {
    std::vector<int> conducting;
    for (const int index : group.switches) {
      if (Conducts(network.switches[static_cast<size_t>(index)], levels)) {
        conducting.push_back(index);
      }
    }
    SpreadFrom(network.power, network, conducting, sees_power);
    SpreadFrom(network.ground, network, conducting, sees_ground);
    for (const NetId net : group.nets) {
      const auto id = static_cast<size_t>(net);
      levels[id] = LevelOf(sees_power[id], sees_ground[id]);
    }
  }
  return levels;
}

std::string DescribeVector(const Cell& cell,
                           const std::vector<NetId>& inputs,
                           InputVector vector) {
  std::string text;
  for (size_t i = 0; i < inputs.size(); ++i) {
    text += fmt::format("{}{}={}",
                        i == 0 ? "" : " ",
                        cell.net_name(inputs[i]),
                        IsHigh(vector, static_cast<int>(i)) ? 1 : 0);
  }
  return text;
}

}  // namespace gatedyno
