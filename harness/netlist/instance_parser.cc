#include "harness/netlist/instance_parser.h"

#include <string>
#include <utility>

#include <fmt/format.h>

#include "harness/netlist/known_devices.h"
#include "harness/netlist/line_head.h"
#include "harness/netlist/mosfet_parser.h"
#include "harness/netlist/name.h"
#include "harness/netlist/value_parser.h"

namespace gatedyno {
namespace {

ParseStatus RefuseSlash(const Fields& fields) {
  for (const Token& word : fields.words) {
    if (word.text == "/") {
      return Complain(word.position,
                      "a '/' before the subcircuit's name is not SPICE: leave "
                      "it out");
    }
  }
  return std::monostate{};
}

}  // namespace

Parsed<CellLine> ParseInstance(const LogicalLine& line,
                               const Fields& fields,
                               const ReaderOptions& options) {
  if (const ParseStatus refused = RefuseSlash(fields); !refused.ok()) {
    return Forward(refused);
  }
  const Token& last = fields.words.back();
  if (fields.words.size() < 2) {
    return Complain(last.position,
                    fmt::format("expected nets and a subcircuit name after {}",
                                Quote(last.text)));
  }
  if (const DeviceName* device = FindDevice(options, last.text, true)) {
    return ParseSubcircuitDevice(line, fields, *device);
  }
  Parsed<LineHead> head = ParseHead(fields, fields.words.size() - 2);
  if (!head.ok()) {
    return Forward(head);
  }
  Parsed<std::string> subckt = ParseName(last, "a subcircuit name");
  if (!subckt.ok()) {
    return Forward(subckt);
  }
  auto overrides = ParseParameters(line, fields.assignments);
  if (!overrides.ok()) {
    return Forward(overrides);
  }
  return InstanceLine{*std::move(head),
                      *std::move(subckt),
                      last.position,
                      *std::move(overrides)};
}

}  // namespace gatedyno
