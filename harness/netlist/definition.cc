#include "harness/netlist/definition.h"

#include <algorithm>

#include "harness/base/text.h"

namespace gatedyno {
namespace {

bool UsesName(const Value& value, const std::string& name) {
  const std::vector<Step>& steps = value.expression.steps;
  return std::any_of(steps.begin(), steps.end(), [&name](const Step& step) {
    return step.operation == Operation::kName && step.name == name;
  });
}

bool UsesName(const std::vector<ParameterDefinition>& parameters,
              const std::string& name) {
  return std::any_of(
      parameters.begin(), parameters.end(), [&name](const auto& parameter) {
        return UsesName(parameter.value, name);
      });
}

bool UsesName(const DeviceLine& line, const std::string& name) {
  return std::any_of(line.geometry.begin(),
                     line.geometry.end(),
                     [&name](const auto& role_and_value) {
                       return UsesName(role_and_value.second, name);
                     });
}

bool UsesName(const PassiveLine& line, const std::string& name) {
  return UsesName(line.value, name) ||
         (line.multiplicity && UsesName(*line.multiplicity, name));
}

bool UsesName(const InstanceLine& line, const std::string& name) {
  return UsesName(line.overrides, name);
}

}  // namespace

bool Subckt::Declares(const std::string& parameter) const {
  return std::any_of(
      header.begin(), header.end(), [&parameter](const auto& declared) {
        return declared.name == parameter;
      });
}

bool Subckt::Uses(const std::string& parameter) const {
  return UsesName(header, parameter) || UsesName(locals, parameter) ||
         std::any_of(
             lines.begin(), lines.end(), [&parameter](const CellLine& line) {
               return std::visit(
                   [&parameter](const auto& one) {
                     return UsesName(one, parameter);
                   },
                   line);
             });
}

const Subckt* Netlist::Find(const std::string& subckt) const {
  const auto found = index.find(ToLower(subckt));
  return found == index.end() ? nullptr : &subckts[found->second];
}

}  // namespace gatedyno
