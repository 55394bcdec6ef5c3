#include "harness/network/group.h"

#include <algorithm>
#include <map>
#include <numeric>

#include <fmt/format.h>

#include "harness/network/cell_error.h"

namespace gatedyno {
namespace {

bool Contains(const std::vector<NetId>& nets, NetId net) {
  return std::find(nets.begin(), nets.end(), net) != nets.end();
}

void AddOnce(std::vector<NetId>& nets, NetId net) {
  if (!Contains(nets, net)) {
    nets.push_back(net);
  }
}

// By NetId: a number shared by the nets of a group.
std::vector<int> LabelNets(const SwitchNetwork& network) {
  std::vector<int> label(static_cast<size_t>(network.net_count()));
  std::iota(label.begin(), label.end(), 0);
  for (const Switch& device : network.switches) {
    if (network.is_supply(device.drain) || network.is_supply(device.source)) {
      continue;
    }
    const int kept = label[static_cast<size_t>(device.drain)];
    const int lost = label[static_cast<size_t>(device.source)];
    std::replace(label.begin(), label.end(), lost, kept);
  }
  return label;
}

bool GatesSomething(const SwitchNetwork& network, NetId net) {
  return std::any_of(network.switches.begin(),
                     network.switches.end(),
                     [&](const Switch& device) { return device.gate == net; });
}

// Whether a supply reaches `start` over channels without passing another pin.
bool SupplyReaches(const SwitchNetwork& network,
                   const Group& group,
                   NetId start) {
  std::vector<NetId> reached = {start};
  for (size_t next = 0; next < reached.size(); ++next) {
    const NetId net = reached[next];
    for (const int index : group.switches) {
      const Switch& device = network.switches[static_cast<size_t>(index)];
      if (device.drain != net && device.source != net) {
        continue;
      }
      const NetId other = device.across(net);
      if (network.is_supply(other)) {
        return true;
      }
      if (!Contains(network.signal_pins, other)) {
        AddOnce(reached, other);
      }
    }
  }
  return false;
}

void SortOutNets(const SwitchNetwork& network, Group& group) {
  for (const NetId net : group.nets) {
    const bool is_pin = Contains(network.signal_pins, net);
    if (is_pin && !SupplyReaches(network, group, net)) {
      group.pass_inputs.push_back(net);
    } else if (is_pin || GatesSomething(network, net)) {
      group.outputs.push_back(net);
    }
  }
}

bool Feeds(const Group& from, const Group& to) {
  return std::any_of(from.outputs.begin(), from.outputs.end(), [&](NetId net) {
    return Contains(to.gates, net);
  });
}

tl::unexpected<Error> FeedbackError(const Cell& cell,
                                    const std::vector<Group>& ring) {
  std::vector<std::string_view> names;
  for (const Group& group : ring) {
    for (const NetId net : group.outputs) {
      names.push_back(cell.net_name(net));
    }
  }
  return CellError(
      cell,
      fmt::format("feedback through {} {}: cells with feedback are not "
                  "estimated",
                  names.size() == 1 ? "net" : "nets",
                  fmt::join(names, ", ")));
}

// Leaves only groups that are part of a ring or lie between rings.
void DropFeedForward(std::vector<Group>& groups) {
  const auto feeds_none = [&](const Group& group) {
    return std::none_of(groups.begin(), groups.end(), [&](const Group& other) {
      return Feeds(group, other);
    });
  };
  auto leaf = std::find_if(groups.begin(), groups.end(), feeds_none);
  while (leaf != groups.end()) {
    groups.erase(leaf);
    leaf = std::find_if(groups.begin(), groups.end(), feeds_none);
  }
}

}  // namespace

std::vector<Group> FindGroups(const SwitchNetwork& network) {
  const std::vector<int> label = LabelNets(network);
  std::map<int, Group> by_label;
  for (size_t i = 0; i < network.switches.size(); ++i) {
    const Switch& device = network.switches[i];
    const NetId net =
        network.is_supply(device.drain) ? device.source : device.drain;
    if (network.is_supply(net) || !device.has_channel()) {
      continue;
    }
    Group& group = by_label[label[static_cast<size_t>(net)]];
    group.switches.push_back(static_cast<int>(i));
    for (const NetId end : {device.drain, device.source}) {
      if (!network.is_supply(end)) {
        AddOnce(group.nets, end);
      }
    }
    if (!network.is_supply(device.gate)) {
      AddOnce(group.gates, device.gate);
    }
  }
  std::vector<Group> groups;
  for (auto& [_, group] : by_label) {
    SortOutNets(network, group);
    groups.push_back(std::move(group));
  }
  return groups;
}

Result<std::vector<Group>> OrderGroups(const Cell& cell,
                                       std::vector<Group> groups) {
  std::vector<Group> ordered;
  while (!groups.empty()) {
    const auto fed_by_none = [&](const Group& group) {
      return std::none_of(
          groups.begin(), groups.end(), [&](const Group& other) {
            return Feeds(other, group);
          });
    };
    const auto next = std::find_if(groups.begin(), groups.end(), fed_by_none);
    if (next == groups.end()) {
      DropFeedForward(groups);
      return FeedbackError(cell, groups);
    }
    ordered.push_back(std::move(*next));
    groups.erase(next);
  }
  return ordered;
}

int LongestWay(const std::vector<Group>& groups) {
  int longest = 0;
  std::vector<int> depth(groups.size(), 1);
  for (size_t to = 0; to < groups.size(); ++to) {
    for (size_t from = 0; from < to; ++from) {
      if (Feeds(groups[from], groups[to])) {
        depth[to] = std::max(depth[to], depth[from] + 1);
      }
    }
    longest = std::max(longest, depth[to]);
  }
  return longest;
}

}  // namespace gatedyno
