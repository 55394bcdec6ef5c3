#include "harness/netlist/instance_call.h"

#include <cmath>
#include <string_view>

#include <fmt/format.h>

#include "harness/netlist/expression.h"
#include "harness/netlist/geometry.h"

namespace gatedyno {
namespace {

constexpr std::string_view kMultiplicity = "m";

ParseStatus PassMultiplicity(const Value& given, Frame& caller, Frame& called) {
  const bool declared = called.subckt.Declares(std::string(kMultiplicity));
  if (declared && !called.subckt.Uses(std::string(kMultiplicity))) {
    return Complain(given.position,
                    fmt::format("subcircuit '{}' declares m and does not use "
                                "it: the copies would be lost",
                                called.subckt.name));
  }
  const Parsed<double> copies =
      EvaluatePositive(given, "a multiplicity", caller.scope);
  if (!copies.ok()) {
    return Forward(copies);
  }
  if (declared) {
    called.scope.Define(std::string(kMultiplicity), *copies);
    return std::monostate{};
  }
  called.multiplicity *= *copies;
  if (!std::isnormal(called.multiplicity)) {
    return WrongValue(given, "a multiplicity in range", *copies);
  }
  return std::monostate{};
}

}  // namespace

ParseStatus PassParameters(const InstanceLine& line,
                           Frame& caller,
                           Frame& called) {
  for (const ParameterDefinition& given : line.overrides) {
    if (given.name == kMultiplicity) {
      ParseStatus passed = PassMultiplicity(given.value, caller, called);
      if (!passed.ok()) {
        return passed;
      }
      continue;
    }
    const Parsed<double> value = Evaluate(given.value.expression, caller.scope);
    if (!value.ok()) {
      return Forward(value);
    }
    called.scope.Define(given.name, *value);
  }
  return std::monostate{};
}

}  // namespace gatedyno
