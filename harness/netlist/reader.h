// Reads cells from SPICE text.
//
// A file holds one or more .subckt definitions.  Understood: M lines, X lines
// (another .subckt of the same text, flattened; or a device of the process
// that is a subcircuit), R and C lines, .param, .subckt/.ends with parameters,
// .end, .option scale; `+` continuations; comments `*` (line) and `;`, `$`,
// `//` (inline); `{...}`, '...' and bare parameter expressions.  Anything else
// is an error at file:line:column with the line and a caret below it: nothing
// is skipped in silence.
//
// Where dialects differ:
//  - "1a", "4k7" and letters that are no unit ("2x", "1milli") are errors.
//  - w is the total width over the fingers.
//  - .option scale stands outside .subckt and holds for the whole file.
//  - m= on an X line multiplies everything inside, unless the .subckt declares
//    a parameter m.
//  - A .subckt sees its own parameters, the file's and the node's, not its
//    caller's; definitions may stand in any order.
//  - Net 0 is the ground where "0" is a ground name: joined with the ground
//    pin, or a last pin of its own.
//  - sa, sb, sd, sc, sca, scb, scc, nrd and nrs are accepted, not used, and
//    named in one warning a cell.
//  - After .end only comments may follow.

#ifndef GATEDYNO_NETLIST_READER_H_
#define GATEDYNO_NETLIST_READER_H_

#include <filesystem>
#include <map>
#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include "harness/base/result.h"
#include "harness/netlist/cell.h"

namespace gatedyno {

// Names, in lower case, of a device's geometry parameters.
struct DeviceParameterNames {
  std::string width = "w";
  std::string length = "l";
  std::string fingers = "nf";
  std::string multiplicity = "m";
  std::string drain_area = "ad";
  std::string source_area = "as";
  std::string drain_perimeter = "pd";
  std::string source_perimeter = "ps";
};

// One spelling of a device in cell netlists.
struct DeviceName {
  std::string name;  // Lower case.
  Polarity polarity = Polarity::kN;
  bool is_subcircuit = false;  // Written on X lines instead of M lines.
  DeviceParameterNames parameters;
  double unit_m = 1.0;  // Lengths are in this unit, areas in its
                        // square; a file's .option scale replaces it.
};

// What a netlist leaves to the process it is written for.
struct ReaderOptions {
  std::vector<DeviceName> devices;
  std::vector<std::string> power_names;  // Lower case.
  std::vector<std::string> ground_names;
  std::vector<std::string> body_names;
  // Parameters known before the file's own .param lines, which win.
  std::map<std::string, double> parameters;
  // Length where a device line has none.
  std::optional<double> default_length_m;
  // Width of one fin, for NFIN= (fins of one finger); without it NFIN is an
  // error.
  std::optional<double> fin_width_m;
};

// Every .subckt of `text` that no other one of it instantiates, in file order.
// `file_name` is what error messages call the text.
Result<std::vector<Cell>> ReadCells(std::string_view text,
                                    const std::string& file_name,
                                    const ReaderOptions& options);

// The same, from a file.
Result<std::vector<Cell>> ReadCellFile(const std::filesystem::path& path,
                                       const ReaderOptions& options);

}  // namespace gatedyno

#endif  // GATEDYNO_NETLIST_READER_H_
