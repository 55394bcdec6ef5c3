#include "harness/netlist/hierarchy.h"

#include <algorithm>
#include <cstddef>
#include <map>
#include <set>
#include <string>

#include <fmt/format.h>
#include <fmt/ranges.h>

#include "harness/base/text.h"
#include "harness/netlist/known_devices.h"

namespace gatedyno {
namespace {

constexpr int kDeepestNesting = 32;

class Walker {
 public:
  Walker(const Netlist& netlist, const ReaderOptions& options)
      : netlist_(netlist), options_(options) {}

  // Levels of instances below `subckt`, 0 for none.
  Parsed<int> Height(const Subckt& subckt) {
    const auto known = heights_.find(&subckt);
    if (known != heights_.end()) {
      return known->second;
    }
    int height = 0;
    path_.push_back(&subckt);
    for (const CellLine& line : subckt.lines) {
      if (const auto* instance = std::get_if<InstanceLine>(&line)) {
        Parsed<int> below = HeightOf(*instance);
        if (!below.ok()) {
          return below;
        }
        height = std::max(height, *below + 1);
      }
    }
    path_.pop_back();
    heights_.emplace(&subckt, height);
    return height;
  }

  bool IsInstantiated(const Subckt& subckt) const {
    return instantiated_.contains(&subckt);
  }

 private:
  Parsed<int> HeightOf(const InstanceLine& instance) {
    const Subckt* called = netlist_.Find(instance.subckt);
    if (called == nullptr) {
      return UnknownSubckt(instance);
    }
    if (const ParseStatus fits = CheckCall(instance, *called); !fits.ok()) {
      return Forward(fits);
    }
    instantiated_.insert(called);
    if (std::find(path_.begin(), path_.end(), called) != path_.end()) {
      return Complain(
          instance.subckt_position,
          fmt::format("subcircuit {} contains itself", Quote(instance.subckt)));
    }
    const bool too_long = path_.size() > kDeepestNesting;
    Parsed<int> below = too_long ? kDeepestNesting : Height(*called);
    if (below.ok() && *below >= kDeepestNesting) {
      return Complain(
          instance.subckt_position,
          fmt::format("instances nested more than {} deep", kDeepestNesting));
    }
    return below;
  }

  tl::unexpected<ParseError> UnknownSubckt(const InstanceLine& instance) const {
    if (FindDevice(options_, instance.subckt, false) != nullptr) {
      return Complain(instance.subckt_position,
                      fmt::format("device {} is no subcircuit of this node: "
                                  "write it on an M line",
                                  Quote(instance.subckt)));
    }
    return Complain(instance.subckt_position,
                    fmt::format("unknown subcircuit {}: neither this file nor "
                                "the node has it",
                                Quote(instance.subckt)));
  }

  static ParseStatus CheckCall(const InstanceLine& instance,
                               const Subckt& called) {
    if (instance.head.nets.size() != called.pins.size()) {
      return Complain(
          instance.subckt_position,
          fmt::format("subcircuit '{}' has {} pins ({}), got {} nets",
                      called.name,
                      called.pins.size(),
                      fmt::join(called.pins, " "),
                      instance.head.nets.size()));
    }
    for (const ParameterDefinition& given : instance.overrides) {
      if (!called.Declares(given.name) && given.name != "m") {
        return Complain(given.value.position,
                        fmt::format("unknown parameter {} of subcircuit '{}'",
                                    Quote(given.name),
                                    called.name));
      }
    }
    return std::monostate{};
  }

  const Netlist& netlist_;
  const ReaderOptions& options_;
  std::vector<const Subckt*> path_;
  std::map<const Subckt*, int> heights_;
  std::set<const Subckt*> instantiated_;
};

}  // namespace

Parsed<std::vector<const Subckt*>> FindTopCells(const Netlist& netlist,
                                                const ReaderOptions& options) {
  Walker walker(netlist, options);
  for (const Subckt& subckt : netlist.subckts) {
    if (const Parsed<int> height = walker.Height(subckt); !height.ok()) {
      return Forward(height);
    }
  }
  std::vector<const Subckt*> tops;
  for (const Subckt& subckt : netlist.subckts) {
    if (!walker.IsInstantiated(subckt)) {
      tops.push_back(&subckt);
    }
  }
  return tops;
}

}  // namespace gatedyno
