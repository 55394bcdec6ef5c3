#include "harness/netlist/known_devices.h"

#include <vector>

#include <fmt/format.h>
#include <fmt/ranges.h>

#include "harness/base/text.h"

namespace gatedyno {

const DeviceName* FindDevice(const ReaderOptions& options,
                             std::string_view name,
                             bool is_subcircuit) {
  for (const DeviceName& device : options.devices) {
    if (device.is_subcircuit == is_subcircuit &&
        EqualsIgnoringCase(device.name, name)) {
      return &device;
    }
  }
  return nullptr;
}

std::string ListDevices(const ReaderOptions& options, bool is_subcircuit) {
  std::vector<std::string> names;
  for (const DeviceName& device : options.devices) {
    if (device.is_subcircuit == is_subcircuit) {
      names.push_back(device.name);
    }
  }
  return names.empty() ? "none" : fmt::format("{}", fmt::join(names, ", "));
}

}  // namespace gatedyno
