#include "harness/record/circuit_json.h"

#include <cstddef>
#include <stdexcept>

#include <fmt/format.h>

namespace gatedyno {

NLOHMANN_DEFINE_TYPE_NON_INTRUSIVE(
    CircuitDevice, name, p_type, gate, drain, source, width_m, length_m)
NLOHMANN_DEFINE_TYPE_NON_INTRUSIVE(CircuitStage, outputs, devices)
NLOHMANN_DEFINE_TYPE_NON_INTRUSIVE(Circuit, power, ground, devices, stages)

nlohmann::json CircuitToJson(const Circuit& circuit) {
  return circuit;
}

Circuit ReadCircuit(const nlohmann::json& from) {
  auto circuit = from.get<Circuit>();
  for (const CircuitStage& stage : circuit.stages) {
    for (const size_t device : stage.devices) {
      if (device >= circuit.devices.size()) {
        throw std::out_of_range(fmt::format(
            "a stage has device {} of {}", device, circuit.devices.size()));
      }
    }
  }
  return circuit;
}

}  // namespace gatedyno
