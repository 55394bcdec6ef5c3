// A cell: one flat transistor netlist with pins, as read from SPICE text.
//
// Nets are numbered; `nets[id]` is the name.  Names keep the letters of the
// file, and compare without case.  Everything downstream (switch-level
// analysis, estimates, decks) starts from this structure, never from the text.

#ifndef GATEDYNO_NETLIST_CELL_H_
#define GATEDYNO_NETLIST_CELL_H_

#include <optional>
#include <string>
#include <vector>

namespace gatedyno {

enum class Polarity { kN, kP };

using NetId = int;

// Where in a file something was written; line and column count from 1.
struct SourcePlace {
  std::string file;
  int line = 0;
  int column = 0;
};

// Diffusion areas and perimeters where the netlist gives them, for the whole
// device (all fingers, multiplicity not included).
struct DiffusionGeometry {
  std::optional<double> drain_area_m2;
  std::optional<double> source_area_m2;
  std::optional<double> drain_perimeter_m;
  std::optional<double> source_perimeter_m;
};

struct Mosfet {
  std::string name;   // "m1"; flattened: "x1.m1".
  std::string model;  // The device name as the netlist spells it, lower case.
  Polarity polarity = Polarity::kN;
  NetId drain = 0;
  NetId gate = 0;
  NetId source = 0;
  NetId body = 0;
  double width_m = 0.0;  // Total over fingers, one of `multiplicity`.
  double length_m = 0.0;
  double fingers = 1.0;
  double multiplicity = 1.0;  // Parallel copies.
  DiffusionGeometry diffusion;
  SourcePlace place;

  // Width of all the parallel copies together.
  double total_width_m() const { return width_m * multiplicity; }
};

struct Resistor {
  std::string name;
  NetId a = 0;
  NetId b = 0;
  double resistance_ohm = 0.0;
  SourcePlace place;
};

struct Capacitor {
  std::string name;
  NetId a = 0;
  NetId b = 0;
  double capacitance_f = 0.0;
  SourcePlace place;
};

struct Cell {
  std::string name;
  SourcePlace place;              // Of its .subckt line.
  std::vector<std::string> nets;  // By NetId.
  std::vector<NetId> pins;        // In .subckt order, supplies included.
  NetId power = -1;               // The pin recognised as the power supply.
  NetId ground = -1;
  std::vector<NetId> bodies;  // Pins that are neither supply nor signal:
                              // wells and substrates with a rail name.
  std::vector<Mosfet> mosfets;
  std::vector<Resistor> resistors;
  std::vector<Capacitor> capacitors;
  // Remarks that are no errors: "m1 w=93n is off the grid ...".
  std::vector<std::string> warnings;

  const std::string& net_name(NetId net) const {
    return nets[static_cast<size_t>(net)];
  }
};

}  // namespace gatedyno

#endif  // GATEDYNO_NETLIST_CELL_H_
