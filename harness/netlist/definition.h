// A netlist as parsed: definitions with their expressions, nothing evaluated
// and nothing flattened yet.

#ifndef GATEDYNO_NETLIST_DEFINITION_H_
#define GATEDYNO_NETLIST_DEFINITION_H_

#include <cstddef>
#include <map>
#include <optional>
#include <string>
#include <variant>
#include <vector>

#include "harness/netlist/expression.h"
#include "harness/netlist/geometry_role.h"
#include "harness/netlist/parse_error.h"
#include "harness/netlist/reader.h"

namespace gatedyno {

// An expression and how to speak of it.
struct Value {
  Expression expression;
  std::string spelling;  // "W={2*wn}".
  SourcePosition position;
};

struct ParameterDefinition {
  std::string name;  // Lower case.
  Value value;
};

// What every device line starts with.
struct LineHead {
  std::string name;
  SourcePosition position;
  std::vector<std::string> nets;
};

// An M line, or an X line naming a device of the process.
struct DeviceLine {
  LineHead head;                       // Drain, gate, source, body.
  const DeviceName* device = nullptr;  // In the ReaderOptions.
  std::map<GeometryRole, Value> geometry;
  // Layout remarks, checked and not used.
  std::vector<ParameterDefinition> remarks;
};

// An R or C line.
struct PassiveLine {
  LineHead head;
  bool is_capacitor = false;
  Value value;
  std::optional<Value> multiplicity;
};

// An X line naming another .subckt.
struct InstanceLine {
  LineHead head;
  std::string subckt;  // As written.
  SourcePosition subckt_position;
  std::vector<ParameterDefinition> overrides;
};

using CellLine = std::variant<DeviceLine, PassiveLine, InstanceLine>;

struct Subckt {
  std::string name;
  SourcePosition position;       // Of ".subckt".
  SourcePosition name_position;  // Of the name after it.
  std::vector<std::string> pins;
  std::vector<ParameterDefinition> header;  // May be overridden.
  std::vector<ParameterDefinition> locals;  // Its .param lines.
  std::vector<CellLine> lines;

  // Whether an X line may override `parameter` (lower case).
  bool Declares(const std::string& parameter) const;
  // Whether any expression inside uses it.
  bool Uses(const std::string& parameter) const;
};

struct Netlist {
  std::vector<Subckt> subckts;
  std::map<std::string, size_t> index;  // By lower-case name.
  std::vector<ParameterDefinition> globals;
  std::optional<Value> scale;  // Of .option scale=.

  // Null when there is none; `subckt` in any letter case.
  const Subckt* Find(const std::string& subckt) const;
};

}  // namespace gatedyno

#endif  // GATEDYNO_NETLIST_DEFINITION_H_
