#include "harness/page/circuit_rows.h"

#include <algorithm>
#include <cmath>
#include <limits>
#include <numeric>
#include <tuple>
#include <utility>

namespace gatedyno {
namespace {

constexpr int kUnreached = std::numeric_limits<int>::max();

NetRole RoleOf(const Circuit& circuit,
               const CircuitStage& stage,
               const std::string& net) {
  if (net == circuit.power) {
    return NetRole::kPower;
  }
  if (net == circuit.ground) {
    return NetRole::kGround;
  }
  const bool output =
      std::find(stage.outputs.begin(), stage.outputs.end(), net) !=
      stage.outputs.end();
  return output ? NetRole::kOutput : NetRole::kInner;
}

// The stage's nets in order of appearance; upper and lower not yet in order.
StageRows Connect(const Circuit& circuit, const CircuitStage& stage) {
  StageRows found;
  const auto place_of = [&](const std::string& name) {
    const auto net = std::find_if(
        found.nets.begin(), found.nets.end(), [&](const StageNet& known) {
          return known.name == name;
        });
    const auto place = static_cast<size_t>(net - found.nets.begin());
    if (net == found.nets.end()) {
      found.nets.push_back({name, RoleOf(circuit, stage, name), 0});
    }
    return place;
  };
  for (const size_t device : stage.devices) {
    const CircuitDevice& drawn = circuit.devices[device];
    if (drawn.drain != drawn.source) {
      const size_t drain = place_of(drawn.drain);
      found.devices.push_back({device, drain, place_of(drawn.source)});
    }
  }
  return found;
}

// By net: the fewest devices from any net of the roles `from`, on ways that do
// not pass a net of the roles `ends`.
std::vector<int> Distances(const StageRows& stage,
                           const std::vector<NetRole>& from,
                           const std::vector<NetRole>& ends) {
  const auto is_one_of = [&](size_t net, const std::vector<NetRole>& roles) {
    return std::find(roles.begin(), roles.end(), stage.nets[net].role) !=
           roles.end();
  };
  std::vector<int> distances(stage.nets.size(), kUnreached);
  std::vector<size_t> reached;
  for (size_t net = 0; net < stage.nets.size(); ++net) {
    if (is_one_of(net, from)) {
      distances[net] = 0;
      reached.push_back(net);
    }
  }
  for (size_t next = 0; next < reached.size(); ++next) {
    const size_t net = reached[next];
    if (distances[net] > 0 && is_one_of(net, ends)) {
      continue;
    }
    for (const StageDevice& device : stage.devices) {
      const size_t other = device.upper == net ? device.lower : device.upper;
      if ((device.upper == net || device.lower == net) &&
          distances[other] == kUnreached) {
        distances[other] = distances[net] + 1;
        reached.push_back(other);
      }
    }
  }
  return distances;
}

double MeanOfNeighbours(const StageRows& stage,
                        const std::vector<double>& volts,
                        size_t net) {
  double sum = 0.0;
  int devices = 0;
  for (const StageDevice& device : stage.devices) {
    if (device.upper == net || device.lower == net) {
      sum += volts[device.upper == net ? device.lower : device.upper];
      ++devices;
    }
  }
  return sum / devices;
}

// By net: its voltage if every device were the same resistor, the power supply
// at 2 V, the outputs at 1 V and ground at 0 V.  Every device of a network in
// series and parallel then goes down from its higher end, and so do most of a
// bridge.
std::vector<double> Voltages(const StageRows& stage) {
  constexpr int kMostRounds = 2000;  // Past it, a drawing is less tidy.
  constexpr double kSettled = 1e-9;
  std::vector<double> volts(stage.nets.size(), 1.0);
  for (size_t net = 0; net < stage.nets.size(); ++net) {
    const NetRole role = stage.nets[net].role;
    volts[net] = role == NetRole::kPower    ? 2.0
                 : role == NetRole::kGround ? 0.0
                                            : 1.0;
  }
  double change = 1.0;
  for (int round = 0; round < kMostRounds && change > kSettled; ++round) {
    change = 0.0;
    for (size_t net = 0; net < stage.nets.size(); ++net) {
      if (stage.nets[net].role == NetRole::kInner) {
        const double mean = MeanOfNeighbours(stage, volts, net);
        change = std::max(change, std::abs(mean - volts[net]));
        volts[net] = mean;
      }
    }
  }
  return volts;
}

enum class Zone { kPower, kPullUp, kOutputs, kPullDown, kGround };

// Sorts nets from the top; no two are equal.
using Height = std::tuple<Zone, long, long, size_t>;

std::vector<Height> HeightsOf(const StageRows& stage) {
  constexpr double kMicrovolts = 1e6;  // What is closer counts as level.
  constexpr NetRole kPower = NetRole::kPower;
  constexpr NetRole kGround = NetRole::kGround;
  constexpr NetRole kOutput = NetRole::kOutput;
  const auto below_power =
      Distances(stage, {kPower}, {kPower, kGround, kOutput});
  const auto above_ground =
      Distances(stage, {kGround}, {kPower, kGround, kOutput});
  const auto from_power = Distances(stage, {kPower}, {kGround});
  const auto from_ground = Distances(stage, {kGround}, {kPower});
  const auto from_output = Distances(stage, {kOutput}, {kPower, kGround});
  const std::vector<double> volts = Voltages(stage);
  std::vector<Height> heights;
  for (size_t net = 0; net < stage.nets.size(); ++net) {
    const bool up = below_power[net] != kUnreached;
    const bool down = above_ground[net] != kUnreached;
    const NetRole role = stage.nets[net].role;
    const long depth = -std::lround(kMicrovolts * volts[net]);
    if (role == kPower || role == kGround) {
      const Zone end = role == kPower ? Zone::kPower : Zone::kGround;
      heights.emplace_back(end, 0, 0, net);
    } else if (role == kOutput || (up && down)) {
      heights.emplace_back(
          Zone::kOutputs, from_power[net], -from_ground[net], net);
    } else if (up) {
      heights.emplace_back(Zone::kPullUp, depth, from_power[net], net);
    } else {
      heights.emplace_back(Zone::kPullDown, depth, from_output[net], net);
    }
  }
  return heights;
}

// Rows by the longest way from the top; then the nets of the pull-up as low as
// their devices allow.  `order`: the nets from the top.
void SetRows(const std::vector<size_t>& order,
             const std::vector<Height>& heights,
             StageRows* stage) {
  int last = 0;
  for (const size_t net : order) {
    int& row = stage->nets[net].row;
    for (const StageDevice& device : stage->devices) {
      if (device.lower == net) {
        row = std::max(row, stage->nets[device.upper].row + 1);
      }
    }
    const Zone zone = std::get<Zone>(heights[net]);
    row = std::max(row, zone == Zone::kPower ? 0 : 1);
    row = zone == Zone::kGround ? std::max(row, last + 1) : row;
    last = std::max(last, row);
  }
  for (auto net = order.rbegin(); net != order.rend(); ++net) {
    if (std::get<Zone>(heights[*net]) != Zone::kPullUp) {
      continue;
    }
    int lowest = kUnreached;
    for (const StageDevice& device : stage->devices) {
      if (device.upper == *net) {
        lowest = std::min(lowest, stage->nets[device.lower].row - 1);
      }
    }
    int& row = stage->nets[*net].row;
    row = lowest == kUnreached ? row : lowest;
  }
}

}  // namespace

StageRows FindRows(const Circuit& circuit, const CircuitStage& stage) {
  StageRows found = Connect(circuit, stage);
  const std::vector<Height> heights = HeightsOf(found);
  for (StageDevice& device : found.devices) {
    if (heights[device.lower] < heights[device.upper]) {
      std::swap(device.upper, device.lower);
    }
  }
  std::vector<size_t> order(found.nets.size());
  std::iota(order.begin(), order.end(), size_t{0});
  std::sort(order.begin(), order.end(), [&](size_t a, size_t b) {
    return heights[a] < heights[b];
  });
  SetRows(order, heights, &found);
  return found;
}

}  // namespace gatedyno
