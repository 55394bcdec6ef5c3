#include "harness/deck/reference.h"

namespace gatedyno {

Cell ReferenceInverter(const ProcessNode& node) {
  enum : NetId { kIn, kOut, kPower, kGround };
  Cell cell;
  cell.name = "reference inverter";
  cell.nets = {"a", "y", node.power_names.front(), node.ground_names.front()};
  cell.pins = {kIn, kOut, kPower, kGround};
  cell.power = kPower;
  cell.ground = kGround;
  Mosfet pull_down;
  pull_down.name = "mn";
  pull_down.polarity = Polarity::kN;
  pull_down.model = node.device(Polarity::kN).names.front();
  pull_down.drain = kOut;
  pull_down.gate = kIn;
  pull_down.source = kGround;
  pull_down.body = kGround;
  pull_down.width_m = node.reference_width_m();
  pull_down.length_m = node.drawn_length_m;
  Mosfet pull_up = pull_down;
  pull_up.name = "mp";
  pull_up.polarity = Polarity::kP;
  pull_up.model = node.device(Polarity::kP).names.front();
  pull_up.source = kPower;
  pull_up.body = kPower;
  pull_up.width_m = node.mu * node.reference_width_m();
  cell.mosfets = {pull_down, pull_up};
  return cell;
}

double GateWidth(const Cell& cell, NetId pin) {
  double width_m = 0.0;
  for (const Mosfet& mosfet : cell.mosfets) {
    if (mosfet.gate == pin) {
      width_m += mosfet.total_width_m();
    }
  }
  return width_m;
}

}  // namespace gatedyno
