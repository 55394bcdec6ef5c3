#include "harness/network/switch_network.h"

#include <algorithm>
#include <numeric>

#include <fmt/format.h>

#include "harness/network/cell_error.h"

namespace gatedyno {
namespace {

bool Contains(const std::vector<NetId>& nets, NetId net) {
  return std::find(nets.begin(), nets.end(), net) != nets.end();
}

std::vector<NetId> SignalPins(const Cell& cell) {
  std::vector<NetId> signals;
  for (const NetId pin : cell.pins) {
    if (pin != cell.power && pin != cell.ground &&
        !Contains(cell.bodies, pin)) {
      signals.push_back(pin);
    }
  }
  return signals;
}

// Makes the two ends of every resistor one net, named after the pin if one end
// is a pin.
Status MergeResistors(const Cell& cell, SwitchNetwork& network) {
  const auto is_pin = [&](NetId net) {
    return network.is_supply(net) || Contains(network.signal_pins, net);
  };
  for (const Resistor& resistor : cell.resistors) {
    const NetId a = network.same_as[static_cast<size_t>(resistor.a)];
    const NetId b = network.same_as[static_cast<size_t>(resistor.b)];
    if (a == b) {
      continue;
    }
    if (is_pin(a) && is_pin(b)) {
      return CellErrorAt(
          cell,
          resistor.place,
          fmt::format("resistor {} joins the pins {} and {}: resistive loads "
                      "are not estimated",
                      resistor.name,
                      cell.net_name(a),
                      cell.net_name(b)));
    }
    const NetId kept = is_pin(b) ? b : a;
    const NetId lost = kept == a ? b : a;
    std::replace(network.same_as.begin(), network.same_as.end(), lost, kept);
  }
  return Ok();
}

Status RefuseSupplyShorts(const Cell& cell, const SwitchNetwork& network) {
  for (size_t i = 0; i < network.switches.size(); ++i) {
    const Switch& device = network.switches[i];
    const NetId off =
        device.polarity == Polarity::kN ? network.ground : network.power;
    if (device.has_channel() && network.is_supply(device.drain) &&
        network.is_supply(device.source) && device.gate != off) {
      return CellErrorAt(cell,
                         cell.mosfets[i].place,
                         fmt::format("{} joins the supplies when it conducts",
                                     cell.mosfets[i].name));
    }
  }
  return Ok();
}

}  // namespace

Result<SwitchNetwork> BuildSwitchNetwork(const Cell& cell) {
  if (cell.power < 0 || cell.ground < 0) {
    return CellError(cell,
                     fmt::format("has no {} pin",
                                 cell.power < 0 ? "power supply" : "ground"));
  }
  SwitchNetwork network;
  network.power = cell.power;
  network.ground = cell.ground;
  network.signal_pins = SignalPins(cell);
  network.same_as.resize(cell.nets.size());
  std::iota(network.same_as.begin(), network.same_as.end(), 0);
  if (const Status merged = MergeResistors(cell, network); !merged.ok()) {
    return Forward(merged);
  }
  const auto merged = [&](NetId net) {
    return network.same_as[static_cast<size_t>(net)];
  };
  for (const Mosfet& mosfet : cell.mosfets) {
    network.switches.push_back({mosfet.polarity,
                                merged(mosfet.gate),
                                merged(mosfet.drain),
                                merged(mosfet.source)});
  }
  if (const Status refused = RefuseSupplyShorts(cell, network); !refused.ok()) {
    return Forward(refused);
  }
  return network;
}

}  // namespace gatedyno
