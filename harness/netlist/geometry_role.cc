#include "harness/netlist/geometry_role.h"

#include <algorithm>
#include <array>
#include <cstddef>

namespace gatedyno {
namespace {

struct RoleRow {
  GeometryRole role;
  std::string DeviceParameterNames::*name;  // Null: the fixed name below.
  std::string_view fixed_name;
  int length_power;
  std::string_view description;
};
constexpr std::array<RoleRow, 10> kRoles = {{
    {GeometryRole::kWidth, &DeviceParameterNames::width, "", 1, "a width"},
    {GeometryRole::kLength, &DeviceParameterNames::length, "", 1, "a length"},
    {GeometryRole::kFingers,
     &DeviceParameterNames::fingers,
     "",
     0,
     "a number of fingers"},
    {GeometryRole::kMultiplicity,
     &DeviceParameterNames::multiplicity,
     "",
     0,
     "a multiplicity"},
    {GeometryRole::kDrainArea,
     &DeviceParameterNames::drain_area,
     "",
     2,
     "a drain area"},
    {GeometryRole::kSourceArea,
     &DeviceParameterNames::source_area,
     "",
     2,
     "a source area"},
    {GeometryRole::kDrainPerimeter,
     &DeviceParameterNames::drain_perimeter,
     "",
     1,
     "a drain perimeter"},
    {GeometryRole::kSourcePerimeter,
     &DeviceParameterNames::source_perimeter,
     "",
     1,
     "a source perimeter"},
    {GeometryRole::kFins, nullptr, "nfin", 0, "a number of fins"},
    {GeometryRole::kInstanceMultiplicity, nullptr, "m", 0, "a multiplicity"},
}};

constexpr std::array<std::string_view, 9> kLayoutRemarks = {
    "sa", "sb", "sd", "nrd", "nrs", "sc", "sca", "scb", "scc"};

std::string NameIn(const RoleRow& row, const DeviceName& device) {
  return row.name == nullptr ? std::string(row.fixed_name)
                             : device.parameters.*row.name;
}

const RoleRow& RowOf(GeometryRole role) {
  return *std::find_if(kRoles.begin(),
                       kRoles.end(),
                       [role](const RoleRow& row) { return row.role == role; });
}

}  // namespace

std::optional<GeometryRole> RoleOf(const std::string& name,
                                   const DeviceName& device) {
  for (const RoleRow& row : kRoles) {
    if (NameIn(row, device) == name) {
      return row.role;
    }
  }
  return std::nullopt;
}

std::string DescribeRole(GeometryRole role, double unit_m) {
  constexpr std::array<std::string_view, 3> kUnits = {
      "", " in metres", " in square metres"};
  const RoleRow& row = RowOf(role);
  const std::string_view unit =
      unit_m == 1.0 ? kUnits[static_cast<size_t>(row.length_power)] : "";
  return std::string(row.description).append(unit);
}

int LengthPower(GeometryRole role) {
  return RowOf(role).length_power;
}

bool IsLayoutRemark(const std::string& name) {
  return std::find(kLayoutRemarks.begin(), kLayoutRemarks.end(), name) !=
         kLayoutRemarks.end();
}

std::vector<std::string> KnownParameterNames(const DeviceName& device) {
  std::vector<std::string> names;
  for (const RoleRow& row : kRoles) {
    const std::string name = NameIn(row, device);
    if (!name.empty() &&
        std::find(names.begin(), names.end(), name) == names.end()) {
      names.push_back(name);
    }
  }
  return names;
}

}  // namespace gatedyno
