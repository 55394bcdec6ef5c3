#include "harness/netlist/mosfet_parser.h"

#include <cstddef>
#include <optional>
#include <utility>

#include <fmt/format.h>
#include <fmt/ranges.h>

#include "harness/netlist/geometry_role.h"
#include "harness/netlist/known_devices.h"
#include "harness/netlist/line_head.h"
#include "harness/netlist/value_parser.h"

namespace gatedyno {
namespace {

constexpr size_t kTerminals = 4;

ParseStatus AddParameter(const LogicalLine& line,
                         const Assignment& assignment,
                         DeviceLine& device) {
  const std::optional<GeometryRole> role =
      RoleOf(assignment.name, *device.device);
  if (!role && !IsLayoutRemark(assignment.name)) {
    return Complain(
        assignment.position,
        fmt::format("unknown parameter {} of device '{}': known are {}",
                    Quote(assignment.name),
                    device.device->name,
                    fmt::join(KnownParameterNames(*device.device), ", ")));
  }
  Parsed<Value> value =
      ParseValue(line,
                 assignment,
                 role ? DescribeRole(*role, device.device->unit_m) : "a value");
  if (!value.ok()) {
    return Forward(value);
  }
  if (role) {
    device.geometry.emplace(*role, *std::move(value));
  } else {
    device.remarks.push_back({assignment.name, *std::move(value)});
  }
  return std::monostate{};
}

Parsed<CellLine> ParseDevice(const LogicalLine& line,
                             const Fields& fields,
                             const DeviceName& name) {
  Parsed<LineHead> head = ParseHead(fields, kTerminals);
  if (!head.ok()) {
    return Forward(head);
  }
  DeviceLine device;
  device.head = *std::move(head);
  device.device = &name;
  for (const Assignment& assignment : fields.assignments) {
    const ParseStatus added = AddParameter(line, assignment, device);
    if (!added.ok()) {
      return Forward(added);
    }
  }
  return CellLine(std::move(device));
}

tl::unexpected<ParseError> UnknownDevice(const Token& name,
                                         const ReaderOptions& options) {
  if (FindDevice(options, name.text, true) != nullptr) {
    return Complain(name.position,
                    fmt::format("device {} is a subcircuit of this node: write "
                                "it on an X line",
                                Quote(name.text)));
  }
  return Complain(name.position,
                  fmt::format("unknown device {}: this node knows {}",
                              Quote(name.text),
                              ListDevices(options, false)));
}

}  // namespace

Parsed<CellLine> ParseMosfet(const LogicalLine& line,
                             const Fields& fields,
                             const ReaderOptions& options) {
  // The name, four nets and the device.
  constexpr size_t kWords = kTerminals + 2;
  if (const ParseStatus refused = RefuseParamsKeyword(fields); !refused.ok()) {
    return Forward(refused);
  }
  if (fields.words.size() < kWords) {
    return Complain(
        fields.words[0].position,
        fmt::format("expected drain, gate, source, body and device after {}, "
                    "got {} words",
                    Quote(fields.words[0].text),
                    fields.words.size() - 1));
  }
  const Token& name = fields.words[kWords - 1];
  const DeviceName* device = FindDevice(options, name.text, false);
  if (device == nullptr) {
    return UnknownDevice(name, options);
  }
  const ParseStatus no_more = RefuseMoreWords(fields, kWords, "device");
  if (!no_more.ok()) {
    return Forward(no_more);
  }
  return ParseDevice(line, fields, *device);
}

Parsed<CellLine> ParseSubcircuitDevice(const LogicalLine& line,
                                       const Fields& fields,
                                       const DeviceName& device) {
  const size_t net_count = fields.words.size() - 2;
  if (net_count != kTerminals) {
    return Complain(fields.words.back().position,
                    fmt::format("device '{}' has 4 nets (drain gate source "
                                "body), got {}",
                                device.name,
                                net_count));
  }
  return ParseDevice(line, fields, device);
}

}  // namespace gatedyno
