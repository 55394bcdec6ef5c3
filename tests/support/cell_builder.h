// Cells for tests, written device by device.
//
//   const Cell nand2 = CellBuilder("nand2")
//                          .Pins({"a", "b", "y", "vdd", "vss"})
//                          .P("m1", "y", "a", "vdd", 2)
//                          .P("m2", "y", "b", "vdd", 2)
//                          .N("m3", "y", "a", "n1", 2)
//                          .N("m4", "n1", "b", "vss", 2)
//                          .Build();
//
// Supplies are called vdd and vss.  Widths are in units of 100 nm and lengths
// in units of 50 nm, unless told otherwise.

#ifndef GATEDYNO_TESTS_SUPPORT_CELL_BUILDER_H_
#define GATEDYNO_TESTS_SUPPORT_CELL_BUILDER_H_

#include <string>
#include <vector>

#include "harness/netlist/cell.h"

namespace gatedyno {

class CellBuilder {
 public:
  explicit CellBuilder(const std::string& name) {
    cell_.name = name;
    cell_.place = {name + ".sp", 1, 1};
  }

  CellBuilder& Unit(double width_m) {
    unit_m_ = width_m;
    return *this;
  }
  CellBuilder& Pins(const std::vector<std::string>& names) {
    for (const std::string& name : names) {
      cell_.pins.push_back(Net(name));
    }
    return *this;
  }
  // A pin of a well or substrate.
  CellBuilder& Body(const std::string& name) {
    cell_.pins.push_back(Net(name));
    cell_.bodies.push_back(Net(name));
    return *this;
  }
  CellBuilder& N(const std::string& name,
                 const std::string& drain,
                 const std::string& gate,
                 const std::string& source,
                 double width,
                 double length = 1.0) {
    return Device(name, Polarity::kN, {drain, gate, source}, width, length);
  }
  CellBuilder& P(const std::string& name,
                 const std::string& drain,
                 const std::string& gate,
                 const std::string& source,
                 double width,
                 double length = 1.0) {
    return Device(name, Polarity::kP, {drain, gate, source}, width, length);
  }
  // Both devices of an inverter, "<output>n" and "<output>p".
  CellBuilder& Inverter(const std::string& input,
                        const std::string& output,
                        double n_width,
                        double p_width) {
    return N(output + "n", output, input, "vss", n_width)
        .P(output + "p", output, input, "vdd", p_width);
  }
  CellBuilder& R(const std::string& name,
                 const std::string& a,
                 const std::string& b,
                 double resistance_ohm) {
    cell_.resistors.push_back(
        {name, Net(a), Net(b), resistance_ohm, NextPlace()});
    return *this;
  }
  CellBuilder& C(const std::string& name,
                 const std::string& a,
                 const std::string& b,
                 double capacitance_f) {
    cell_.capacitors.push_back(
        {name, Net(a), Net(b), capacitance_f, NextPlace()});
    return *this;
  }

  Cell Build() {
    const auto pin_named = [this](const std::string& name) {
      for (const NetId pin : cell_.pins) {
        if (cell_.net_name(pin) == name) {
          return pin;
        }
      }
      return NetId{-1};
    };
    cell_.power = pin_named("vdd");
    cell_.ground = pin_named("vss");
    return cell_;
  }

 private:
  struct Ends {
    std::string drain;
    std::string gate;
    std::string source;
  };

  NetId Net(const std::string& name) {
    for (size_t i = 0; i < cell_.nets.size(); ++i) {
      if (cell_.nets[i] == name) {
        return static_cast<NetId>(i);
      }
    }
    cell_.nets.push_back(name);
    return static_cast<NetId>(cell_.nets.size()) - 1;
  }
  SourcePlace NextPlace() { return {cell_.name + ".sp", ++line_, 1}; }

  CellBuilder& Device(const std::string& name,
                      Polarity polarity,
                      const Ends& ends,
                      double width,
                      double length) {
    constexpr double kLengthUnitM = 50e-9;
    Mosfet mosfet;
    mosfet.name = name;
    mosfet.model = polarity == Polarity::kN ? "nch" : "pch";
    mosfet.polarity = polarity;
    mosfet.drain = Net(ends.drain);
    mosfet.gate = Net(ends.gate);
    mosfet.source = Net(ends.source);
    mosfet.body = Net(polarity == Polarity::kN ? "vss" : "vdd");
    mosfet.width_m = width * unit_m_;
    mosfet.length_m = length * kLengthUnitM;
    mosfet.place = NextPlace();
    cell_.mosfets.push_back(mosfet);
    return *this;
  }

  Cell cell_;
  double unit_m_ = 100e-9;
  int line_ = 1;
};

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_SUPPORT_CELL_BUILDER_H_
