#include "harness/effort/sized_network.h"

#include <algorithm>
#include <cassert>
#include <map>

#include <fmt/format.h>

namespace gatedyno {
namespace {

using Form = SeriesParallel::Form;

class PullUpBuilder {
 public:
  PullUpBuilder(const Cell& cell,
                const SwitchNetwork& network,
                const RailNetwork& old_up)
      : cell_(cell), network_(network) {
    assert(!old_up.switches.empty());
    pattern_ = cell.mosfets[static_cast<size_t>(old_up.switches.front())];
    pattern_.fingers = 1.0;
    pattern_.multiplicity = 1.0;
    pattern_.diffusion = {};
    unit_m_ = pattern_.width_m;
    for (auto index = old_up.switches.rbegin(); index != old_up.switches.rend();
         ++index) {
      cell_.mosfets.erase(cell_.mosfets.begin() + *index);
    }
  }

  // `share`: the part of the whole resistance allowed between the two nets.
  // NOLINTNEXTLINE(misc-no-recursion): as deep as the tree.
  void Place(const SeriesParallel& tree,
             NetId top,
             NetId bottom,
             double share) {
    switch (tree.form) {
      case Form::kDevice:
        AddDevice(network_.switches[static_cast<size_t>(tree.index)].gate,
                  top,
                  bottom,
                  unit_m_ / share);
        return;
      case Form::kParallel:
        for (const SeriesParallel& part : tree.parts) {
          Place(part, top, bottom, share);
        }
        return;
      case Form::kSeries:
        PlaceSeries(tree, top, bottom, share);
        return;
    }
  }

  void AddDevice(NetId gate, NetId drain, NetId source, double width_m) {
    Mosfet device = pattern_;
    device.name = fmt::format("other{}", ++added_);
    device.gate = gate;
    device.drain = drain;
    device.source = source;
    device.width_m = width_m;
    cell_.mosfets.push_back(std::move(device));
  }

  NetId NewNet() {
    cell_.nets.push_back(fmt::format("other.n{}", cell_.nets.size()));
    return static_cast<NetId>(cell_.nets.size()) - 1;
  }

  Cell Take() { return std::move(cell_); }

 private:
  // Width the tree puts on its end towards the output, per unit of 1 / share.
  // NOLINTNEXTLINE(misc-no-recursion): as deep as the tree.
  static double EndWidth(const SeriesParallel& tree) {
    switch (tree.form) {
      case Form::kDevice:
        return 1.0;
      case Form::kSeries:
        // The first part gets Height(part) / Height(tree) of the share.
        return EndWidth(tree.parts.front()) * Height(tree) /
               Height(tree.parts.front());
      case Form::kParallel:
        break;
    }
    double sum = 0.0;
    for (const SeriesParallel& part : tree.parts) {
      sum += EndWidth(part);
    }
    return sum;
  }

  // The part with the least diffusion goes next to the output.
  // NOLINTNEXTLINE(misc-no-recursion): as deep as the tree.
  void PlaceSeries(const SeriesParallel& tree,
                   NetId top,
                   NetId bottom,
                   double share) {
    std::vector<SeriesParallel> parts = tree.parts;
    std::stable_sort(parts.begin(),
                     parts.end(),
                     [](const SeriesParallel& a, const SeriesParallel& b) {
                       return EndWidth(a) / Height(a) < EndWidth(b) / Height(b);
                     });
    const double per_device = share / Height(tree);
    NetId above = top;
    for (const SeriesParallel& part : parts) {
      const NetId below = &part == &parts.back() ? bottom : NewNet();
      Place(part, above, below, per_device * Height(part));
      above = below;
    }
  }

  Cell cell_;
  const SwitchNetwork& network_;
  Mosfet pattern_;
  double unit_m_ = 0.0;
  int added_ = 0;
};

}  // namespace

Cell WithPullUpFromTree(const Cell& cell,
                        const SwitchNetwork& network,
                        const RailNetwork& old_up,
                        const SeriesParallel& tree) {
  PullUpBuilder builder(cell, network, old_up);
  builder.Place(tree, old_up.output, old_up.rail, 1.0);
  return builder.Take();
}

Cell WithPullUpRepeated(const Cell& cell,
                        const SwitchNetwork& network,
                        const RailNetwork& old_up,
                        const RailNetwork& down) {
  PullUpBuilder builder(cell, network, old_up);
  std::map<NetId, NetId> image = {{down.output, old_up.output},
                                  {down.rail, old_up.rail}};
  for (const NetId net : down.inner) {
    image[net] = builder.NewNet();
  }
  for (const int index : down.switches) {
    const Switch& device = network.switches[static_cast<size_t>(index)];
    builder.AddDevice(device.gate,
                      image.at(device.drain),
                      image.at(device.source),
                      cell.mosfets[static_cast<size_t>(index)].total_width_m());
  }
  return builder.Take();
}

void ScaleWidths(Cell& cell, size_t first, double factor) {
  for (size_t i = first; i < cell.mosfets.size(); ++i) {
    cell.mosfets[i].width_m *= factor;
  }
}

}  // namespace gatedyno
