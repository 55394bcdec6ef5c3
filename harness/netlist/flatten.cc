#include "harness/netlist/flatten.h"

#include <optional>
#include <utility>

#include <fmt/format.h>

#include "harness/base/text.h"
#include "harness/netlist/expansion.h"
#include "harness/netlist/geometry.h"
#include "harness/netlist/scope.h"
#include "harness/netlist/supplies.h"

namespace gatedyno {
namespace {

// The file's own parameters win over the node's.
void DefineGlobals(const Netlist& netlist,
                   const ReaderOptions& options,
                   Scope& globals) {
  for (const ParameterDefinition& parameter : netlist.globals) {
    globals.Define(parameter);
  }
  for (const auto& [name, value] : options.parameters) {
    globals.Define(ToLower(name), value);
  }
}

Parsed<std::optional<double>> EvaluateScale(const Netlist& netlist,
                                            Scope& globals) {
  if (!netlist.scale) {
    return std::optional<double>();
  }
  const Parsed<double> scale_m =
      EvaluatePositive(*netlist.scale, "a number of metres", globals);
  if (!scale_m.ok()) {
    return Forward(scale_m);
  }
  return std::optional(*scale_m);
}

Parsed<Cell> FlattenCell(const Subckt& top, const ExpansionContext& context) {
  Parsed<Cell> cell = Expansion(context).Run(top);
  if (!cell.ok()) {
    return cell;
  }
  if (cell->mosfets.empty()) {
    return Complain(top.name_position,
                    fmt::format("cell '{}' has no transistor", top.name));
  }
  const ParseStatus recognised = RecogniseSupplies(top, context.options, *cell);
  if (!recognised.ok()) {
    return Forward(recognised);
  }
  return cell;
}

}  // namespace

Parsed<std::vector<Cell>> FlattenCells(const std::string& file_name,
                                       const Netlist& netlist,
                                       const std::vector<const Subckt*>& tops,
                                       const ReaderOptions& options) {
  Scope globals(nullptr);
  DefineGlobals(netlist, options, globals);
  if (const ParseStatus checked = globals.CheckAll(); !checked.ok()) {
    return Forward(checked);
  }
  const Parsed<std::optional<double>> scale_m = EvaluateScale(netlist, globals);
  if (!scale_m.ok()) {
    return Forward(scale_m);
  }
  ExpansionBudget budget;
  const ExpansionContext context{
      file_name, netlist, options, globals, *scale_m, budget};
  std::vector<Cell> cells;
  for (const Subckt* top : tops) {
    Parsed<Cell> cell = FlattenCell(*top, context);
    if (!cell.ok()) {
      return Forward(cell);
    }
    cells.push_back(*std::move(cell));
  }
  return cells;
}

}  // namespace gatedyno
