#include "harness/network/rail_network.h"

#include <algorithm>

namespace gatedyno {
namespace {

bool Contains(const std::vector<NetId>& nets, NetId net) {
  return std::find(nets.begin(), nets.end(), net) != nets.end();
}

const Switch& SwitchAt(const SwitchNetwork& network, int index) {
  return network.switches[static_cast<size_t>(index)];
}

bool IsTiedOff(const SwitchNetwork& network, const Switch& device) {
  return device.gate ==
         (device.polarity == Polarity::kN ? network.ground : network.power);
}

void SpreadFromRail(const SwitchNetwork& network,
                    const Group& group,
                    RailNetwork& found) {
  const auto is_end = [&](NetId net) {
    return net == found.output || network.is_supply(net);
  };
  std::vector<NetId> reached = {found.rail};
  for (size_t next = 0; next < reached.size(); ++next) {
    for (const int index : group.switches) {
      const Switch& device = SwitchAt(network, index);
      const bool touches =
          device.drain == reached[next] || device.source == reached[next];
      if (!touches || IsTiedOff(network, device) ||
          Contains(found.switches, index)) {
        continue;
      }
      found.switches.push_back(index);
      const NetId other = device.across(reached[next]);
      if (!is_end(other) && !Contains(reached, other)) {
        reached.push_back(other);
        found.inner.push_back(other);
      }
    }
  }
}

// Drops devices that end on a net with nothing else on it.
void DropDeadEnds(const SwitchNetwork& network, RailNetwork& found) {
  const auto ends_on = [&](NetId net) {
    return std::count_if(
        found.switches.begin(), found.switches.end(), [&](int index) {
          const Switch& device = SwitchAt(network, index);
          return device.drain == net || device.source == net;
        });
  };
  const auto is_dead_end = [&](NetId net) { return ends_on(net) < 2; };
  auto dead = std::find_if(found.inner.begin(), found.inner.end(), is_dead_end);
  while (dead != found.inner.end()) {
    const NetId net = *dead;
    std::erase_if(found.switches, [&](int index) {
      const Switch& device = SwitchAt(network, index);
      return device.drain == net || device.source == net;
    });
    found.inner.erase(dead);
    dead = std::find_if(found.inner.begin(), found.inner.end(), is_dead_end);
  }
}

}  // namespace

RailNetwork FindRailNetwork(const SwitchNetwork& network,
                            const Group& group,
                            NetId output,
                            NetId rail) {
  RailNetwork found = {output, rail, {}, {}};
  SpreadFromRail(network, group, found);
  const NetId other_rail =
      rail == network.power ? network.ground : network.power;
  std::erase_if(found.switches, [&](int index) {
    const Switch& device = SwitchAt(network, index);
    return device.drain == other_rail || device.source == other_rail;
  });
  DropDeadEnds(network, found);
  std::sort(found.switches.begin(), found.switches.end());
  return found;
}

}  // namespace gatedyno
