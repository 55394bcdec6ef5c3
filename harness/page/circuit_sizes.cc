#include "harness/page/circuit_sizes.h"

#include <algorithm>

#include <fmt/format.h>

namespace gatedyno {

CircuitSizes::CircuitSizes(const Circuit& circuit) {
  constexpr double kInMicrometresM = 10e-6;
  constexpr double kMicrometresPerMetre = 1e6;
  const auto is_large = [](const CircuitDevice& device) {
    return device.width_m >= kInMicrometresM;
  };
  if (std::any_of(circuit.devices.begin(), circuit.devices.end(), is_large)) {
    unit_ = "µm";
    per_metre_ = kMicrometresPerMetre;
  }
  for (const CircuitDevice& device : circuit.devices) {
    const std::string length = Number(device.length_m);
    if (!common_length_.empty() && length != common_length_) {
      common_length_.clear();
      return;
    }
    common_length_ = length;
  }
}

std::string CircuitSizes::Number(double metres) const {
  return fmt::format("{:.6g}", metres * per_metre_);
}

std::string CircuitSizes::Beside(const CircuitDevice& device) const {
  const std::string width = Number(device.width_m);
  return common_length_.empty()
             ? fmt::format("{}/{} {}", width, Number(device.length_m), unit_)
             : fmt::format("{} {}", width, unit_);
}

}  // namespace gatedyno
