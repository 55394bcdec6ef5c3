// What the parameters of a device line mean: one table.

#ifndef GATEDYNO_NETLIST_GEOMETRY_ROLE_H_
#define GATEDYNO_NETLIST_GEOMETRY_ROLE_H_

#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include "harness/netlist/reader.h"

namespace gatedyno {

enum class GeometryRole {
  kWidth,
  kLength,
  kFingers,
  kMultiplicity,
  kDrainArea,
  kSourceArea,
  kDrainPerimeter,
  kSourcePerimeter,
  kFins,
  // m= on a device subcircuit that calls its own multiplicity otherwise.
  kInstanceMultiplicity,
};

// The role of parameter `name` (lower case) on a line of `device`.
std::optional<GeometryRole> RoleOf(const std::string& name,
                                   const DeviceName& device);

// What a value of this role must be: "a width in metres"; "a width" where the
// device counts in another unit.
std::string DescribeRole(GeometryRole role, double unit_m);

// 1 for a length, 2 for an area, 0 for a plain number.
int LengthPower(GeometryRole role);

// Parameters of M lines that describe the layout around a device (stress,
// diffusion squares) and change no estimate: sa, sb, sd, nrd, nrs ...
bool IsLayoutRemark(const std::string& name);

// The names RoleOf knows for `device`, in the order of the roles.
std::vector<std::string> KnownParameterNames(const DeviceName& device);

}  // namespace gatedyno

#endif  // GATEDYNO_NETLIST_GEOMETRY_ROLE_H_
