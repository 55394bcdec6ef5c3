// One instance being flattened: what its lines' names stand for.

#ifndef GATEDYNO_NETLIST_FRAME_H_
#define GATEDYNO_NETLIST_FRAME_H_

#include <string>
#include <unordered_map>

#include <fmt/format.h>

#include "harness/netlist/cell.h"
#include "harness/netlist/definition.h"
#include "harness/netlist/scope.h"

namespace gatedyno {

struct Frame {
  const Subckt& subckt;
  std::string path;           // "x1.x2"; empty for the cell itself.
  double multiplicity = 1.0;  // Of all instances around, together.
  Scope scope;
  std::unordered_map<std::string, NetId> nets;  // By lower-case local name.

  std::string FullName(const std::string& name) const {
    return path.empty() ? name : fmt::format("{}.{}", path, name);
  }
};

}  // namespace gatedyno

#endif  // GATEDYNO_NETLIST_FRAME_H_
