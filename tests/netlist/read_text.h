// Reading netlist text in tests, with a small node of our own.

#ifndef GATEDYNO_TESTS_NETLIST_READ_TEXT_H_
#define GATEDYNO_TESTS_NETLIST_READ_TEXT_H_

#include <string>
#include <string_view>
#include <vector>

#include <fmt/format.h>
#include <gtest/gtest.h>

#include "harness/netlist/reader.h"

namespace gatedyno {

inline constexpr const char* kFile = "t.sp";

inline ReaderOptions TestOptions() {
  ReaderOptions options;
  options.devices.resize(2);
  options.devices[0].name = "nfet";
  options.devices[1].name = "pfet";
  options.devices[1].polarity = Polarity::kP;
  options.power_names = {"vdd"};
  options.ground_names = {"vss", "gnd", "0"};
  options.body_names = {"vnb", "vpb", "vdd", "vss"};
  options.parameters = {{"wunit", 90e-9}, {"lgate", 45e-9}};
  return options;
}

// A device of a kit that is a subcircuit counting in micrometres.
inline DeviceName KitDevice() {
  DeviceName device;
  device.name = "kit_n";
  device.is_subcircuit = true;
  device.parameters.width = "wr";
  device.parameters.length = "lr";
  device.parameters.multiplicity = "mult";
  device.unit_m = 1e-6;
  return device;
}

// The complaint about `text`, or "" when there is none.
inline std::string ComplaintAbout(
    std::string_view text, const ReaderOptions& options = TestOptions()) {
  const Result<std::vector<Cell>> cells = ReadCells(text, kFile, options);
  if (cells.ok()) {
    return "";
  }
  EXPECT_EQ(cells.error().kind, ErrorKind::kBadInput);
  return cells.error().message;
}

// The only cell of `text`, or a failed test and an empty one.
inline Cell ReadOne(std::string_view text,
                    const ReaderOptions& options = TestOptions()) {
  Result<std::vector<Cell>> cells = ReadCells(text, kFile, options);
  if (!cells.ok()) {
    ADD_FAILURE() << cells.error().message;
    return {};
  }
  EXPECT_EQ(cells->size(), 1U);
  return cells->empty() ? Cell{} : cells->front();
}

// "t.sp:LINE:COLUMN: message", the line, the caret.
inline std::string Worded(int line_number,
                          int column,
                          std::string_view message,
                          std::string_view line) {
  return fmt::format("{}:{}:{}: {}\n{}\n{:>{}}",
                     kFile,
                     line_number,
                     column,
                     message,
                     line,
                     "^",
                     column);
}

// A cell around one line, which is line 2 of the text.
inline std::string Around(std::string_view line) {
  return fmt::format(".subckt c a y vdd vss\n{}\n.ends\n", line);
}

// One inverter with `line` among its devices, again as line 2.
inline std::string InverterAround(std::string_view line) {
  return fmt::format(
      ".subckt c a y vdd vss\n{}\n"
      "mp y a vdd vdd pfet w=2u l=45n\n"
      "mn y a vss vss nfet w=1u l=45n\n.ends\n",
      line);
}

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_NETLIST_READ_TEXT_H_
