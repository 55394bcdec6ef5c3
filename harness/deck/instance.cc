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

class InstanceWriter {
 public:
  InstanceWriter(const Instance& instance, const ProcessNode& node)
      : instance_(instance), cell_(*instance.cell), node_(node) {
    const bool has_subcircuit =
        std::any_of(cell_.mosfets.begin(),
                    cell_.mosfets.end(),
                    [this](const Mosfet& mosfet) {
                      return DeviceOf(mosfet).is_subcircuit;
                    });
    (has_subcircuit ? tapped_copies_ : line_copies_) = instance.copies;
  }

  std::string Lines() {
    for (const Mosfet& mosfet : cell_.mosfets) {
      AddMosfet(mosfet);
    }
    // Copies in parallel divide a resistance and multiply a capacitance.
    for (const Resistor& resistor : cell_.resistors) {
      AddPassive(
          'r', resistor.a, resistor.b, resistor.resistance_ohm / line_copies_);
    }
    for (const Capacitor& capacitor : cell_.capacitors) {
      AddPassive('c',
                 capacitor.a,
                 capacitor.b,
                 capacitor.capacitance_f * line_copies_);
    }
    return std::move(text_);
  }

 private:
  using Taps = std::map<std::string, std::string>;  // Inner nets by outer.

  // Where this copy joins a net: behind a tap, unless the net is its own.
  std::string Net(NetId net) {
    const std::string outer = OuterNet(net);
    return outer == InnerNet(net) ? outer : Tap(outer, tapped_copies_, taps_);
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

  std::string InnerNet(NetId net) const {
    return fmt::format("{}_n{}", instance_.prefix, net);
  }

  std::string OuterNet(NetId net) const {
    if (net == cell_.power) {
      return std::string(kPowerNet);
    }
    if (net == cell_.ground) {
      return std::string(kGroundNet);
    }
    if (const auto given = instance_.nets.find(net);
        given != instance_.nets.end()) {
      return given->second;
    }
    const bool is_body =
        std::find(cell_.bodies.begin(), cell_.bodies.end(), net) !=
        cell_.bodies.end();
    return is_body ? BodyNet(net) : InnerNet(net);
  }

  std::string BodyNet(NetId net) const {
    const auto& wells = node_.p_body_names;
    const bool is_well =
        std::find(wells.begin(), wells.end(), ToLower(cell_.net_name(net))) !=
        wells.end();
    return std::string(is_well ? kPowerNet : kGroundNet);
  }

  const NodeDevice& DeviceOf(const Mosfet& mosfet) const {
    const auto found =
        std::find_if(node_.devices.begin(),
                     node_.devices.end(),
                     [&](const NodeDevice& device) {
                       return std::find(device.names.begin(),
                                        device.names.end(),
                                        mosfet.model) != device.names.end();
                     });
    assert(found != node_.devices.end());
    return *found;
  }

  void AddMosfet(const Mosfet& mosfet) {
    const NodeDevice& device = DeviceOf(mosfet);
    const DeviceParameterNames& names = device.parameters;
    const double unit = device.unit_m;
    const Diffusion diffusion = DiffusionOf(cell_, mosfet, node_.diffusion);
    const std::string terminals = Terminals(mosfet, device.is_subcircuit);
    text_ += fmt::format("{}{}_{}{} {}",
                         device.is_subcircuit ? 'x' : 'm',
                         instance_.prefix,
                         ++elements_,
                         terminals,
                         device.model);
    AddParameter(names.width, mosfet.width_m / unit);
    AddParameter(names.length, mosfet.length_m / unit);
    if (mosfet.fingers != 1.0) {
      AddParameter(names.fingers, mosfet.fingers);
    }
    AddParameter(names.drain_area, diffusion.drain_area_m2 / unit / unit);
    AddParameter(names.source_area, diffusion.source_area_m2 / unit / unit);
    AddParameter(names.drain_perimeter, diffusion.drain_perimeter_m / unit);
    AddParameter(names.source_perimeter, diffusion.source_perimeter_m / unit);
    if (!device.is_subcircuit) {
      AddParameter(names.multiplicity, mosfet.multiplicity * line_copies_);
    }
    text_ += '\n';
  }

  std::string Terminals(const Mosfet& mosfet, bool is_subcircuit) {
    Taps taps;
    const double copies = is_subcircuit ? mosfet.multiplicity : 1.0;
    std::string nets;
    for (const NetId net :
         {mosfet.drain, mosfet.gate, mosfet.source, mosfet.body}) {
      nets += " " + Tap(Net(net), copies, taps);
    }
    return nets;
  }

  void AddParameter(const std::string& name, double value) {
    text_ += fmt::format(" {}={}", name, DeckNumber(value));
  }

  void AddPassive(char kind, NetId a, NetId b, double value) {
    const std::string nets = Net(a) + " " + Net(b);
    text_ += fmt::format("{}{}_{} {} {}\n",
                         kind,
                         instance_.prefix,
                         ++elements_,
                         nets,
                         DeckNumber(value));
  }

  const Instance& instance_;
  const Cell& cell_;
  const ProcessNode& node_;
  double line_copies_ = 1.0;    // By the values on the lines.
  double tapped_copies_ = 1.0;  // By taps; the other of the two is 1.
  Taps taps_;
  std::string text_;
  int elements_ = 0;
};

}  // namespace

std::string InstanceLines(const Instance& instance, const ProcessNode& node) {
  return InstanceWriter(instance, node).Lines();
}

}  // namespace gatedyno
