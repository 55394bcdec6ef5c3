// A cell's transistors as a report draws them.

#ifndef GATEDYNO_RECORD_CIRCUIT_H_
#define GATEDYNO_RECORD_CIRCUIT_H_

#include <cstddef>
#include <string>
#include <vector>

namespace gatedyno {

struct CircuitDevice {
  std::string name;  // As the netlist has it, flattened: "x1.m1".
  bool p_type = false;
  std::string gate;  // Names of nets; nets joined by a resistor are one.
  std::string drain;
  std::string source;
  double width_m = 0.0;  // Of all fingers and parallel copies together.
  double length_m = 0.0;

  bool operator==(const CircuitDevice&) const = default;
};

// One channel-connected group of devices.
struct CircuitStage {
  std::vector<std::string> outputs;  // Its nets that are pins or gate a device.
  std::vector<std::size_t> devices;  // Places in Circuit::devices.

  bool operator==(const CircuitStage&) const = default;
};

struct Circuit {
  std::string power;
  std::string ground;
  std::vector<CircuitDevice> devices;  // In netlist order.
  std::vector<CircuitStage> stages;    // Each after those that gate it.

  bool operator==(const Circuit&) const = default;
};

}  // namespace gatedyno

#endif  // GATEDYNO_RECORD_CIRCUIT_H_
