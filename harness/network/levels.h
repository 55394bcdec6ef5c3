// Switch-level evaluation: which supply does each net see through the devices
// that conduct?
//
// One: driven.  Both: shorted.  None: floating.  Inner nets of a stack may
// float; an output must not.

#ifndef GATEDYNO_NETWORK_LEVELS_H_
#define GATEDYNO_NETWORK_LEVELS_H_

#include <cstdint>
#include <string>
#include <vector>

#include "harness/network/group.h"
#include "harness/network/switch_network.h"

namespace gatedyno {

enum class Level : std::uint8_t { kLow, kHigh, kFloating, kShorted };

// Values of a cell's inputs: bit i is input i, in pin order.
using InputVector = std::uint32_t;

constexpr bool IsHigh(InputVector vector, int input) {
  return ((vector >> input) & 1U) != 0;
}
constexpr InputVector Toggled(InputVector vector, int input) {
  return vector ^ (InputVector{1} << input);
}

// By NetId.
using Levels = std::vector<Level>;

// Whether the device conducts.  A gate that is neither high nor low counts as
// off: its own group is at fault and is reported first.
bool Conducts(const Switch& device, const Levels& levels);

// `groups` ordered.  Nets of no group that are no input float.
Levels Evaluate(const SwitchNetwork& network,
                const std::vector<Group>& groups,
                const std::vector<NetId>& inputs,
                InputVector vector);

// "a=1 b=0".
std::string DescribeVector(const Cell& cell,
                           const std::vector<NetId>& inputs,
                           InputVector vector);

}  // namespace gatedyno

#endif  // GATEDYNO_NETWORK_LEVELS_H_
