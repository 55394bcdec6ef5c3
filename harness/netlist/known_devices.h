// The devices a node knows, by the names cell netlists give them.

#ifndef GATEDYNO_NETLIST_KNOWN_DEVICES_H_
#define GATEDYNO_NETLIST_KNOWN_DEVICES_H_

#include <string>
#include <string_view>

#include "harness/netlist/reader.h"

namespace gatedyno {

// Null when the options have no such device; `name` in any letter case.
const DeviceName* FindDevice(const ReaderOptions& options,
                             std::string_view name,
                             bool is_subcircuit);

// "nfet, pfet", for messages.
std::string ListDevices(const ReaderOptions& options, bool is_subcircuit);

}  // namespace gatedyno

#endif  // GATEDYNO_NETLIST_KNOWN_DEVICES_H_
