// Finds and reads the cells a plan or a command line names.

#ifndef GATEDYNO_FLOW_CELL_SET_H_
#define GATEDYNO_FLOW_CELL_SET_H_

#include <filesystem>
#include <string>
#include <vector>

#include "harness/base/result.h"
#include "harness/netlist/cell.h"
#include "harness/node/process_node.h"

namespace gatedyno {

// Names of the built-in cells, sorted.
std::vector<std::string> BuiltInCells();

// Files that `names` mean: a path of a netlist (relative to `folder`), or
// built-in cells by name with * and ?.  In the order named, each once.
Result<std::vector<std::filesystem::path>> CellFiles(
    const std::vector<std::string>& names, const std::filesystem::path& folder);

// Reads them all; fails when two cells have the same name.
Result<std::vector<Cell>> ReadCellSet(const std::vector<std::string>& names,
                                      const std::filesystem::path& folder,
                                      const ProcessNode& node);

}  // namespace gatedyno

#endif  // GATEDYNO_FLOW_CELL_SET_H_
