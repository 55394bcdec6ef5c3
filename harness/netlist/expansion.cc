#include "harness/netlist/expansion.h"

#include <cmath>
#include <utility>
#include <variant>

#include <fmt/format.h>

#include "harness/base/text.h"
#include "harness/netlist/cell_warnings.h"
#include "harness/netlist/expression.h"
#include "harness/netlist/geometry.h"
#include "harness/netlist/instance_call.h"
#include "harness/netlist/passive_value.h"

namespace gatedyno {

Parsed<Cell> Expansion::Run(const Subckt& top) {
  cell_.name = top.name;
  cell_.place = PlaceOf(top.position);
  Frame frame{top, "", 1.0, Scope(&context_.globals), {}};
  for (const std::string& pin : top.pins) {
    // Distinct: the parser refuses a pin given twice.
    cell_.pins.push_back(*FindOrAddNet(pin, frame));
  }
  if (const ParseStatus expanded = Expand(frame); !expanded.ok()) {
    return Forward(expanded);
  }
  cell_.nets = table_.TakeNames();
  AddWarnings(unused_remarks_, cell_);
  return std::move(cell_);
}

ParseStatus Expansion::Expand(Frame& frame) {
  ParseStatus done = AddLines(frame);
  if (!done.ok() && done.error().instance.empty()) {
    done.error().instance = frame.path;
  }
  return done;
}

ParseStatus Expansion::AddLines(Frame& frame) {
  const Subckt& subckt = frame.subckt;
  if (ParseStatus spent = context_.budget.Spend(subckt); !spent.ok()) {
    return spent;
  }
  for (const ParameterDefinition& parameter : subckt.header) {
    frame.scope.Define(parameter);
  }
  for (const ParameterDefinition& parameter : subckt.locals) {
    frame.scope.Define(parameter);
  }
  if (ParseStatus checked = frame.scope.CheckAll(); !checked.ok()) {
    return checked;
  }
  for (const CellLine& line : subckt.lines) {
    ParseStatus added = std::visit(
        [this, &frame](const auto& one) { return Add(one, frame); }, line);
    if (!added.ok()) {
      return added;
    }
  }
  return std::monostate{};
}

ParseStatus Expansion::Add(const DeviceLine& line, Frame& frame) {
  Parsed<Mosfet> mosfet =
      EvaluateGeometry(line, context_.options, context_.scale_m, frame.scope);
  if (!mosfet.ok()) {
    return Forward(mosfet);
  }
  mosfet->multiplicity *= frame.multiplicity;
  if (!std::isnormal(mosfet->total_width_m())) {
    return Complain(line.head.position,
                    fmt::format("the width of {}, all copies together, is out "
                                "of range",
                                Quote(line.head.name)));
  }
  if (ParseStatus checked = CheckRemarks(line, frame); !checked.ok()) {
    return checked;
  }
  Parsed<std::string> name = NameOf(line.head, frame);
  if (!name.ok()) {
    return Forward(name);
  }
  const Parsed<std::vector<NetId>> nets = NetsOf(line.head, frame);
  if (!nets.ok()) {
    return Forward(nets);
  }
  mosfet->name = *std::move(name);
  mosfet->model = line.device->name;
  mosfet->polarity = line.device->polarity;
  mosfet->drain = (*nets)[0];
  mosfet->gate = (*nets)[1];
  mosfet->source = (*nets)[2];
  mosfet->body = (*nets)[3];
  mosfet->place = PlaceOf(line.head.position);
  cell_.mosfets.push_back(*std::move(mosfet));
  return std::monostate{};
}

// Not used, and yet not skipped: each must have a value.
ParseStatus Expansion::CheckRemarks(const DeviceLine& line, Frame& frame) {
  for (const ParameterDefinition& remark : line.remarks) {
    const Parsed<double> value = Evaluate(remark.value.expression, frame.scope);
    if (!value.ok()) {
      return Forward(value);
    }
    unused_remarks_.insert(remark.name);
  }
  return std::monostate{};
}

ParseStatus Expansion::Add(const PassiveLine& line, Frame& frame) {
  const Parsed<double> value =
      EvaluatePassive(line, frame.multiplicity, frame.scope);
  if (!value.ok()) {
    return Forward(value);
  }
  Parsed<std::string> name = NameOf(line.head, frame);
  if (!name.ok()) {
    return Forward(name);
  }
  const Parsed<std::vector<NetId>> nets = NetsOf(line.head, frame);
  if (!nets.ok()) {
    return Forward(nets);
  }
  const NetId a = (*nets)[0];
  const NetId b = (*nets)[1];
  const SourcePlace place = PlaceOf(line.head.position);
  if (line.is_capacitor) {
    cell_.capacitors.push_back({*std::move(name), a, b, *value, place});
  } else {
    cell_.resistors.push_back({*std::move(name), a, b, *value, place});
  }
  return std::monostate{};
}

ParseStatus Expansion::Add(const InstanceLine& line, Frame& frame) {
  const Subckt& called = *context_.netlist.Find(line.subckt);
  Frame inner{called,
              frame.FullName(line.head.name),
              frame.multiplicity,
              Scope(&context_.globals),
              {}};
  if (ParseStatus passed = PassParameters(line, frame, inner); !passed.ok()) {
    return passed;
  }
  const Parsed<std::vector<NetId>> nets = NetsOf(line.head, frame);
  if (!nets.ok()) {
    return Forward(nets);
  }
  for (size_t i = 0; i < nets->size(); ++i) {
    inner.nets.emplace(ToLower(called.pins[i]), (*nets)[i]);
  }
  return Expand(inner);
}

Parsed<std::string> Expansion::NameOf(const LineHead& head,
                                      const Frame& frame) {
  std::string full = frame.FullName(head.name);
  if (!table_.AddDevice(full)) {
    return Complain(
        head.position,
        fmt::format("two devices come to the name {}", Quote(full)));
  }
  return full;
}

Parsed<std::vector<NetId>> Expansion::NetsOf(const LineHead& head,
                                             Frame& frame) {
  std::vector<NetId> nets;
  for (const std::string& name : head.nets) {
    const std::optional<NetId> net = FindOrAddNet(name, frame);
    if (!net) {
      return Complain(head.position,
                      fmt::format("two nets come to the name {}",
                                  Quote(frame.FullName(name))));
    }
    nets.push_back(*net);
  }
  return nets;
}

// Nothing when a net of another instance has taken the flat name.
std::optional<NetId> Expansion::FindOrAddNet(const std::string& name,
                                             Frame& frame) {
  const std::string lower = ToLower(name);
  const auto known = frame.nets.find(lower);
  if (known != frame.nets.end()) {
    return known->second;
  }
  std::optional<NetId> net;
  if (lower == kGlobalGround) {
    net = table_.Find(lower);
  }
  if (!net) {
    net = table_.Add(lower == kGlobalGround ? name : frame.FullName(name));
  }
  if (net) {
    frame.nets.emplace(lower, *net);
  }
  return net;
}

SourcePlace Expansion::PlaceOf(SourcePosition position) const {
  return {context_.file_name, position.line, position.column};
}

}  // namespace gatedyno
