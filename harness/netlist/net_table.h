// Names of a cell's nets and devices while it is flattened.

#ifndef GATEDYNO_NETLIST_NET_TABLE_H_
#define GATEDYNO_NETLIST_NET_TABLE_H_

#include <optional>
#include <string>
#include <unordered_map>
#include <unordered_set>
#include <utility>
#include <vector>

#include "harness/base/text.h"
#include "harness/netlist/cell.h"

namespace gatedyno {

// Net "0" of SPICE: one net through the whole hierarchy.
inline constexpr const char* kGlobalGround = "0";

class NetTable {
 public:
  // A new net; nothing when its name, in any letter case, is taken.
  std::optional<NetId> Add(const std::string& name) {
    const auto id = static_cast<NetId>(names_.size());
    if (!ids_.emplace(ToLower(name), id).second) {
      return std::nullopt;
    }
    names_.push_back(name);
    return id;
  }

  // Nothing when there is no such net.
  std::optional<NetId> Find(const std::string& name) const {
    const auto found = ids_.find(ToLower(name));
    return found == ids_.end() ? std::nullopt : std::optional(found->second);
  }

  // Whether the device's name is new, in any letter case.
  bool AddDevice(const std::string& name) {
    return devices_.insert(ToLower(name)).second;
  }

  std::vector<std::string> TakeNames() { return std::move(names_); }

 private:
  std::vector<std::string> names_;
  std::unordered_map<std::string, NetId> ids_;
  std::unordered_set<std::string> devices_;
};

}  // namespace gatedyno

#endif  // GATEDYNO_NETLIST_NET_TABLE_H_
