#include "harness/deck/instance.h"

#include <algorithm>
#include <cassert>
#include <utility>

#include <fmt/format.h>

#include "harness/base/text.h"
#include "harness/deck/deck_text.h"
#include "harness/deck/diffusion.h"

namespace gatedyno {
namespace {

const NodeDevice& DeviceOf(const Mosfet& mosfet, const ProcessNode& node) {
  const auto found = std::find_if(
      node.devices.begin(), node.devices.end(), [&](const NodeDevice& device) {
        return std::find(device.names.begin(),
                         device.names.end(),
                         mosfet.model) != device.names.end();
      });
  assert(found != node.devices.end());
  return *found;
}

std::string_view BodyNet(const Cell& cell, NetId net, const ProcessNode& node) {
  const auto& wells = node.p_body_names;
  const bool is_well =
      std::find(wells.begin(), wells.end(), ToLower(cell.net_name(net))) !=
      wells.end();
  return is_well ? kPowerNet : kGroundNet;
}

// The lines of one instance, in the making.
class InstanceText {
 public:
  // `tapped` copies are made by taps, the rest is on the lines.
  InstanceText(const Instance& instance,
               std::vector<std::string> nets,
               double tapped_copies)
      : instance_(instance),
        nets_(std::move(nets)),
        tapped_copies_(tapped_copies) {}

  // "m<prefix>_<n> <drain> <gate> <source> <body>".
  void StartDevice(char kind,
                   const std::array<NetId, 4>& nets,
                   double multiplicity) {
    std::array<std::string, 4> joined;
    std::map<std::string, std::string> taps;
    for (size_t i = 0; i < nets.size(); ++i) {
      joined[i] = Tap(Net(nets[i]), multiplicity, taps);
    }
    StartLine(kind);
    for (const std::string& net : joined) {
      text_ += ' ';
      text_ += net;
    }
  }

  void AddPassive(char kind, NetId a, NetId b, double value) {
    const std::string first = Net(a);
    const std::string second = Net(b);
    StartLine(kind);
    text_ += fmt::format(" {} {} {}\n", first, second, DeckNumber(value));
  }

  void Append(std::string_view text) { text_ += text; }

  std::string Take() { return std::move(text_); }

 private:
  using Taps = std::map<std::string, std::string>;  // Inner nets by outer.

  void StartLine(char kind) {
    text_ += kind;
    text_ += instance_.prefix;
    text_ += '_';
    text_ += fmt::format_int(++elements_).c_str();
  }

  // Where this copy joins a net: behind a tap, unless the net is its own.
  std::string Net(NetId net) {
    const std::string& outer = nets_[static_cast<size_t>(net)];
    if (!outer.empty()) {
      return Tap(outer, tapped_copies_, taps_);
    }
    return fmt::format("{}_n{}", instance_.prefix, net);
  }

  std::string Tap(const std::string& outer, double copies, Taps& taps) {
    // Nothing is measured at ground, so its current need not be right.
    if (copies == 1.0 || outer == kGroundNet) {
      return outer;
    }
    const auto [tap, is_new] = taps.try_emplace(outer);
    if (is_new) {
      const std::string name =
          fmt::format("{}_{}", instance_.prefix, ++elements_);
      tap->second = fmt::format("{}_t{}", instance_.prefix, elements_);
      text_ += fmt::format("v{0} {1} {2} 0\nf{0} {1} 0 v{0} {3}\n",
                           name,
                           outer,
                           tap->second,
                           DeckNumber(copies - 1.0));
    }
    return tap->second;
  }

  const Instance& instance_;
  const std::vector<std::string> nets_;  // By net; empty: an inner one.
  const double tapped_copies_;
  Taps taps_;
  std::string text_;
  int elements_ = 0;
};

}  // namespace

CellWriter::CellWriter(const Cell& cell, const ProcessNode& node)
    : cell_(cell), fixed_nets_(cell.nets.size()) {
  for (const Mosfet& mosfet : cell.mosfets) {
    devices_.push_back(DeviceText(mosfet, node));
    has_subcircuit_ |= devices_.back().is_subcircuit;
  }
  for (const NetId body : cell.bodies) {
    fixed_nets_[static_cast<size_t>(body)] = BodyNet(cell, body, node);
  }
  fixed_nets_[static_cast<size_t>(cell.power)] = kPowerNet;
  fixed_nets_[static_cast<size_t>(cell.ground)] = kGroundNet;
}

CellWriter::Device CellWriter::DeviceText(const Mosfet& mosfet,
                                          const ProcessNode& node) const {
  const NodeDevice& device = DeviceOf(mosfet, node);
  const DeviceParameterNames& names = device.parameters;
  const double unit = device.unit_m;
  const Diffusion diffusion = DiffusionOf(cell_, mosfet, node.diffusion);
  std::string text = " " + device.model;
  const auto add = [&](const std::string& name, double value) {
    text += fmt::format(" {}={}", name, DeckNumber(value));
  };
  add(names.width, mosfet.width_m / unit);
  add(names.length, mosfet.length_m / unit);
  if (mosfet.fingers != 1.0) {
    add(names.fingers, mosfet.fingers);
  }
  add(names.drain_area, diffusion.drain_area_m2 / unit / unit);
  add(names.source_area, diffusion.source_area_m2 / unit / unit);
  add(names.drain_perimeter, diffusion.drain_perimeter_m / unit);
  add(names.source_perimeter, diffusion.source_perimeter_m / unit);
  if (!device.is_subcircuit) {
    text += fmt::format(" {}=", names.multiplicity);
  }
  return {.is_subcircuit = device.is_subcircuit,
          .multiplicity = mosfet.multiplicity,
          .nets = {mosfet.drain, mosfet.gate, mosfet.source, mosfet.body},
          .text = std::move(text)};
}

std::string CellWriter::Lines(const Instance& instance) const {
  std::vector<std::string> nets = fixed_nets_;
  for (const auto& [pin, net] : instance.nets) {
    std::string& place = nets[static_cast<size_t>(pin)];
    if (pin != cell_.power && pin != cell_.ground) {
      place = net;
    }
  }
  const double on_lines = has_subcircuit_ ? 1.0 : instance.copies;
  InstanceText text(
      instance, std::move(nets), has_subcircuit_ ? instance.copies : 1.0);
  for (const Device& device : devices_) {
    if (device.is_subcircuit) {
      text.StartDevice('x', device.nets, device.multiplicity);
      text.Append(device.text);
    } else {
      text.StartDevice('m', device.nets, 1.0);
      text.Append(device.text);
      text.Append(DeckNumber(device.multiplicity * on_lines));
    }
    text.Append("\n");
  }
  // Copies in parallel divide a resistance and multiply a capacitance.
  for (const Resistor& resistor : cell_.resistors) {
    text.AddPassive(
        'r', resistor.a, resistor.b, resistor.resistance_ohm / on_lines);
  }
  for (const Capacitor& capacitor : cell_.capacitors) {
    text.AddPassive(
        'c', capacitor.a, capacitor.b, capacitor.capacitance_f * on_lines);
  }
  return text.Take();
}

}  // namespace gatedyno
