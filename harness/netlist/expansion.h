// One cell being flattened: its devices and nets so far.

#ifndef GATEDYNO_NETLIST_EXPANSION_H_
#define GATEDYNO_NETLIST_EXPANSION_H_

#include <optional>
#include <set>
#include <string>

#include "harness/netlist/cell.h"
#include "harness/netlist/definition.h"
#include "harness/netlist/expansion_budget.h"
#include "harness/netlist/frame.h"
#include "harness/netlist/net_table.h"
#include "harness/netlist/parse_error.h"
#include "harness/netlist/reader.h"
#include "harness/netlist/scope.h"

namespace gatedyno {

// What all the cells of a text have in common.
struct ExpansionContext {
  const std::string& file_name;
  const Netlist& netlist;
  const ReaderOptions& options;
  Scope& globals;
  std::optional<double> scale_m;  // The file's .option scale.
  ExpansionBudget& budget;
};

class Expansion {
 public:
  explicit Expansion(const ExpansionContext& context) : context_(context) {}

  // REQUIRES: called once.
  Parsed<Cell> Run(const Subckt& top);

 private:
  // Defines the frame's own parameters (what the X line passes is there
  // already) and adds its lines to the cell.
  ParseStatus Expand(Frame& frame);
  ParseStatus AddLines(Frame& frame);
  ParseStatus Add(const DeviceLine& line, Frame& frame);
  ParseStatus Add(const PassiveLine& line, Frame& frame);
  ParseStatus Add(const InstanceLine& line, Frame& frame);
  ParseStatus CheckRemarks(const DeviceLine& line, Frame& frame);

  // The device's name in the flat cell.
  Parsed<std::string> NameOf(const LineHead& head, const Frame& frame);
  // The nets of a line, made on first use.
  Parsed<std::vector<NetId>> NetsOf(const LineHead& head, Frame& frame);
  std::optional<NetId> FindOrAddNet(const std::string& name, Frame& frame);
  SourcePlace PlaceOf(SourcePosition position) const;

  ExpansionContext context_;
  Cell cell_;
  NetTable table_;
  std::set<std::string> unused_remarks_;
};

}  // namespace gatedyno

#endif  // GATEDYNO_NETLIST_EXPANSION_H_
