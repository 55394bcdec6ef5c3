// Subcircuits with everything they instantiate -> flat Cells.
//
// Devices and nets inside instance x1 are named "x1.m1", "x1.net".  m= on an
// X line multiplies everything inside: M lines by multiplicity, R / m, C * m
// (the internal nets of the copies are at equal voltages, so one net stands
// for all).

#ifndef GATEDYNO_NETLIST_FLATTEN_H_
#define GATEDYNO_NETLIST_FLATTEN_H_

#include <string>
#include <vector>

#include "harness/netlist/cell.h"
#include "harness/netlist/definition.h"
#include "harness/netlist/parse_error.h"
#include "harness/netlist/reader.h"

namespace gatedyno {

// One cell for each of `tops`, supplies recognised.
// REQUIRES: `tops` are what FindTopCells(netlist, options) found.
Parsed<std::vector<Cell>> FlattenCells(const std::string& file_name,
                                       const Netlist& netlist,
                                       const std::vector<const Subckt*>& tops,
                                       const ReaderOptions& options);

}  // namespace gatedyno

#endif  // GATEDYNO_NETLIST_FLATTEN_H_
