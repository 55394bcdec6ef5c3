#include "harness/netlist/supplies.h"

#include <algorithm>
#include <string>
#include <string_view>
#include <vector>

#include <fmt/format.h>
#include <fmt/ranges.h>

#include "harness/base/text.h"
#include "harness/netlist/net_table.h"

namespace gatedyno {
namespace {

using Names = std::vector<std::string>;

bool Contains(const Names& names, std::string_view name) {
  return std::any_of(names.begin(), names.end(), [name](const auto& one) {
    return EqualsIgnoringCase(one, name);
  });
}

// The one pin of `cell` whose name is among `names`; -1 for none.
Parsed<NetId> FindPin(const Subckt& top,
                      const Cell& cell,
                      const Names& names,
                      std::string_view kind) {
  NetId found = -1;
  for (const NetId pin : cell.pins) {
    if (!Contains(names, cell.net_name(pin))) {
      continue;
    }
    if (found >= 0) {
      return Complain(top.name_position,
                      fmt::format("cell '{}' has two {} pins, '{}' and '{}'",
                                  cell.name,
                                  kind,
                                  cell.net_name(found),
                                  cell.net_name(pin)));
    }
    found = pin;
  }
  return found;
}

tl::unexpected<ParseError> NoPin(const Subckt& top,
                                 const Names& names,
                                 std::string_view kind) {
  return Complain(top.name_position,
                  fmt::format("cell '{}' has no {} pin: recognised are {}",
                              top.name,
                              kind,
                              fmt::join(names, ", ")));
}

// Net "0" where it is not a pin; -1 for none.
NetId LooseGlobalGround(const Cell& cell) {
  const auto found =
      std::find(cell.nets.begin(), cell.nets.end(), kGlobalGround);
  const auto net = static_cast<NetId>(found - cell.nets.begin());
  const bool is_pin =
      std::find(cell.pins.begin(), cell.pins.end(), net) != cell.pins.end();
  return found == cell.nets.end() || is_pin ? -1 : net;
}

void Rename(NetId from, NetId to, NetId& net) {
  // Ids above `from` move down by one: the net leaves the list.
  net = net == from ? to : net;
  net = net > from ? net - 1 : net;
}

// REQUIRES: `to` is a pin and `from` is not, hence to < from.
void JoinNets(NetId from, NetId to, Cell& cell) {
  for (Mosfet& mosfet : cell.mosfets) {
    Rename(from, to, mosfet.drain);
    Rename(from, to, mosfet.gate);
    Rename(from, to, mosfet.source);
    Rename(from, to, mosfet.body);
  }
  for (Resistor& resistor : cell.resistors) {
    Rename(from, to, resistor.a);
    Rename(from, to, resistor.b);
  }
  for (Capacitor& capacitor : cell.capacitors) {
    Rename(from, to, capacitor.a);
    Rename(from, to, capacitor.b);
  }
  cell.nets.erase(cell.nets.begin() + from);
}

ParseStatus TakeGlobalGround(const Subckt& top,
                             const ReaderOptions& options,
                             Cell& cell) {
  const NetId loose = LooseGlobalGround(cell);
  if (loose < 0) {
    return std::monostate{};
  }
  if (!Contains(options.ground_names, kGlobalGround)) {
    return Complain(top.name_position,
                    fmt::format("cell '{}' uses net 0, which is no ground of "
                                "this node: recognised are {}",
                                cell.name,
                                fmt::join(options.ground_names, ", ")));
  }
  if (cell.ground < 0) {
    cell.ground = loose;
    cell.pins.push_back(loose);
    return std::monostate{};
  }
  cell.warnings.push_back(fmt::format("net 0 is taken as the ground pin '{}'",
                                      cell.net_name(cell.ground)));
  JoinNets(loose, cell.ground, cell);
  return std::monostate{};
}

}  // namespace

ParseStatus RecogniseSupplies(const Subckt& top,
                              const ReaderOptions& options,
                              Cell& cell) {
  const Parsed<NetId> power = FindPin(top, cell, options.power_names, "power");
  if (!power.ok()) {
    return Forward(power);
  }
  const Parsed<NetId> ground =
      FindPin(top, cell, options.ground_names, "ground");
  if (!ground.ok()) {
    return Forward(ground);
  }
  cell.power = *power;
  cell.ground = *ground;
  if (ParseStatus taken = TakeGlobalGround(top, options, cell); !taken.ok()) {
    return taken;
  }
  if (cell.power < 0) {
    return NoPin(top, options.power_names, "power");
  }
  if (cell.ground < 0) {
    return NoPin(top, options.ground_names, "ground");
  }
  for (const NetId pin : cell.pins) {
    if (pin != cell.power && pin != cell.ground &&
        Contains(options.body_names, cell.net_name(pin))) {
      cell.bodies.push_back(pin);
    }
  }
  return std::monostate{};
}

}  // namespace gatedyno
