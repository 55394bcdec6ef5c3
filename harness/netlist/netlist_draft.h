// A netlist being collected line by line: the .subckt that is open, and which
// names are taken in which scope.

#ifndef GATEDYNO_NETLIST_NETLIST_DRAFT_H_
#define GATEDYNO_NETLIST_NETLIST_DRAFT_H_

#include <map>
#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include "harness/netlist/definition.h"
#include "harness/netlist/parse_error.h"

namespace gatedyno {

// Every name, in any letter case, is taken once: a subcircuit's in the file, a
// parameter's in the file or in its .subckt, a device's in its .subckt.
class NetlistDraft {
 public:
  bool is_open() const { return open_.has_value(); }

  ParseStatus Open(Subckt subckt);
  // `name` is what follows .ends, empty for nothing.
  ParseStatus Close(std::string_view name, SourcePosition position);
  // Of the open .subckt, or of the file where none is open.
  ParseStatus AddParameters(std::vector<ParameterDefinition> parameters);
  // REQUIRES: is_open().
  ParseStatus AddLine(CellLine line);
  // REQUIRES: !is_open().
  ParseStatus SetScale(Value scale);

  // Fails while a .subckt is open; `what` is where the text ends it.
  ParseStatus RequireClosed(SourcePosition position,
                            std::string_view what) const;
  // REQUIRES: called last.
  Parsed<Netlist> Finish();

 private:
  using NamesTaken = std::map<std::string, int>;  // With the line of each.

  static ParseStatus Take(NamesTaken& taken,
                          const std::string& name,
                          SourcePosition position);

  Netlist netlist_;
  std::optional<Subckt> open_;
  NamesTaken subckts_;
  NamesTaken globals_;
  NamesTaken locals_;
  NamesTaken devices_;
};

}  // namespace gatedyno

#endif  // GATEDYNO_NETLIST_NETLIST_DRAFT_H_
