// Circuits for the tests of what draws them.
//
//   const Circuit inverter = CircuitBuilder()
//                                .P("mp", "y", "a", "vdd")
//                                .N("mn", "y", "a", "vss")
//                                .Stage({"y"});
//
// Supplies are called vdd and vss; widths are 360 nm (P) and 180 nm (N),
// lengths 45 nm.

#ifndef GATEDYNO_TESTS_SUPPORT_TEST_CIRCUIT_H_
#define GATEDYNO_TESTS_SUPPORT_TEST_CIRCUIT_H_

#include <string>
#include <vector>

#include "harness/record/circuit.h"

namespace gatedyno {

class CircuitBuilder {
 public:
  CircuitBuilder& P(const std::string& name,
                    const std::string& drain,
                    const std::string& gate,
                    const std::string& source) {
    circuit_.devices.push_back(
        {name, true, gate, drain, source, 360e-9, 45e-9});
    return *this;
  }
  CircuitBuilder& N(const std::string& name,
                    const std::string& drain,
                    const std::string& gate,
                    const std::string& source) {
    circuit_.devices.push_back(
        {name, false, gate, drain, source, 180e-9, 45e-9});
    return *this;
  }
  // All devices since the last stage.
  CircuitBuilder& Stage(const std::vector<std::string>& outputs) {
    CircuitStage stage{outputs, {}};
    while (next_ < circuit_.devices.size()) {
      stage.devices.push_back(next_++);
    }
    circuit_.stages.push_back(stage);
    return *this;
  }
  operator Circuit() const {  // NOLINT: that is what it is for.
    Circuit circuit = circuit_;
    circuit.power = "vdd";
    circuit.ground = "vss";
    return circuit;
  }

 private:
  Circuit circuit_;
  size_t next_ = 0;
};

inline Circuit Nand2Circuit() {
  return CircuitBuilder()
      .P("mp_a", "y", "a", "vdd")
      .P("mp_b", "y", "b", "vdd")
      .N("mn_a", "y", "a", "n1")
      .N("mn_b", "n1", "b", "vss")
      .Stage({"y"});
}

// Of all four ways from the output to ground, two go through mn_x, which
// conducts in both directions; and the same in the pull-up.
inline Circuit BridgeCircuit() {
  return CircuitBuilder()
      .P("mp_a", "p1", "a", "vdd")
      .P("mp_b", "p2", "b", "vdd")
      .P("mp_x", "p1", "x", "p2")
      .P("mp_c", "y", "c", "p1")
      .P("mp_d", "y", "d", "p2")
      .N("mn_a", "y", "a", "n1")
      .N("mn_b", "y", "b", "n2")
      .N("mn_x", "n2", "x", "n1")
      .N("mn_c", "n1", "c", "vss")
      .N("mn_d", "n2", "d", "vss")
      .N("mn_e", "y", "e", "vss")
      .Stage({"y"});
}

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_SUPPORT_TEST_CIRCUIT_H_
