#include "harness/effort/drive.h"

#include <algorithm>
#include <cassert>
#include <cmath>

#include <Eigen/Cholesky>

namespace gatedyno {
namespace {

// Currents below this part of the whole are rounding: a balanced bridge.
constexpr double kNoCurrent = 1e-9;

const Switch& SwitchAt(const SwitchNetwork& network, int index) {
  return network.switches[static_cast<size_t>(index)];
}

// Position in `nets`, or -1 for a supply.
Eigen::Index RowOf(const std::vector<NetId>& nets, NetId net) {
  const auto found = std::find(nets.begin(), nets.end(), net);
  return found == nets.end() ? -1 : found - nets.begin();
}

std::vector<NetId> JoinedNets(const SwitchNetwork& network,
                              const std::vector<int>& conducting,
                              NetId output) {
  std::vector<NetId> nets = {output};
  for (size_t next = 0; next < nets.size(); ++next) {
    for (const int index : conducting) {
      const Switch& device = SwitchAt(network, index);
      if (device.drain != nets[next] && device.source != nets[next]) {
        continue;
      }
      const NetId other = device.across(nets[next]);
      if (!network.is_supply(other) && RowOf(nets, other) < 0) {
        nets.push_back(other);
      }
    }
  }
  return nets;
}

}  // namespace

Drive SolveDrive(const SwitchNetwork& network,
                 const Group& group,
                 const CellWidths& widths,
                 const Levels& levels,
                 NetId output) {
  std::vector<int> conducting;
  std::copy_if(group.switches.begin(),
               group.switches.end(),
               std::back_inserter(conducting),
               [&](int i) { return Conducts(SwitchAt(network, i), levels); });
  Drive drive;
  drive.nets = JoinedNets(network, conducting, output);
  const auto size = static_cast<Eigen::Index>(drive.nets.size());

  // In units of the largest conductance, to stay clear of tiny numbers.
  const double unit_m = *std::max_element(widths.conductance_m.begin(),
                                          widths.conductance_m.end());
  Eigen::MatrixXd nodal = Eigen::MatrixXd::Zero(size, size);
  for (const int index : conducting) {
    const Switch& device = SwitchAt(network, index);
    const double y = widths.conductance_m[static_cast<size_t>(index)] / unit_m;
    const Eigen::Index a = RowOf(drive.nets, device.drain);
    const Eigen::Index b = RowOf(drive.nets, device.source);
    if (a >= 0) {
      nodal(a, a) += y;
    }
    if (b >= 0) {
      nodal(b, b) += y;
    }
    if (a >= 0 && b >= 0) {
      nodal(a, b) -= y;
      nodal(b, a) -= y;
    }
  }
  const Eigen::LLT<Eigen::MatrixXd> factors(nodal);
  assert(factors.info() == Eigen::Success);
  const Eigen::VectorXd volts = factors.solve(Eigen::VectorXd::Unit(size, 0));

  drive.conductance_m = unit_m / volts(0);
  for (Eigen::Index k = 0; k < size; ++k) {
    drive.transfer_per_m.push_back(volts(k) / unit_m);
  }
  const auto volts_at = [&](NetId net) {
    const Eigen::Index row = RowOf(drive.nets, net);
    return row < 0 ? 0.0 : volts(row);
  };
  for (const int index : conducting) {
    const Switch& device = SwitchAt(network, index);
    const double y = widths.conductance_m[static_cast<size_t>(index)] / unit_m;
    if (std::abs(y * (volts_at(device.drain) - volts_at(device.source))) >
        kNoCurrent) {
      drive.carrying.push_back(index);
    }
  }
  return drive;
}

}  // namespace gatedyno
