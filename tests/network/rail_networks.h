// Both networks of a cell's first output.

#ifndef GATEDYNO_TESTS_NETWORK_RAIL_NETWORKS_H_
#define GATEDYNO_TESTS_NETWORK_RAIL_NETWORKS_H_

#include <gtest/gtest.h>

#include "harness/network/analysis.h"
#include "harness/network/rail_network.h"

namespace gatedyno {

struct Networks {
  Cell cell;
  NetworkAnalysis analysis;
  RailNetwork down;
  RailNetwork up;
};

inline Networks NetworksOf(const Cell& cell) {
  Networks found = {cell, {}, {}, {}};
  Result<NetworkAnalysis> analysis = AnalyseNetwork(cell);
  if (!analysis.ok()) {
    ADD_FAILURE() << analysis.error().message;
    return found;
  }
  found.analysis = std::move(*analysis);
  const SwitchNetwork& network = found.analysis.network;
  const NetId output = found.analysis.outputs.front();
  const Group& group = found.analysis.group_of(output);
  found.down = FindRailNetwork(network, group, output, network.ground);
  found.up = FindRailNetwork(network, group, output, network.power);
  return found;
}

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_NETWORK_RAIL_NETWORKS_H_
