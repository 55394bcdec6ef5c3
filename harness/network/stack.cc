#include "harness/network/stack.h"

#include <algorithm>

#include "harness/network/series_parallel.h"

namespace gatedyno {
namespace {

class StackSearch {
 public:
  StackSearch(const NetworkAnalysis& analysis, const RailNetwork& rail)
      : network_(analysis.network),
        rail_(rail),
        limit_(LimitOf(network_, rail)) {
    for (const int index : rail.switches) {
      VectorSet on;
      const Switch& device = network_.switches[static_cast<size_t>(index)];
      for (size_t v = 0; v < analysis.levels.size(); ++v) {
        on[v] = Conducts(device, analysis.levels[v]);
      }
      on_.push_back(on);
    }
  }

  int Tallest() {
    VectorSet all;
    all.set();
    Extend(rail_.output, all);
    return tallest_;
  }

 private:
  // No way is longer; reaching it ends the search.
  static int LimitOf(const SwitchNetwork& network, const RailNetwork& rail) {
    const auto tree = ReduceSeriesParallel(network, rail);
    return tree ? Height(*tree) : static_cast<int>(rail.inner.size()) + 1;
  }

  // `on`: the vectors for which the way so far conducts.
  // NOLINTNEXTLINE(misc-no-recursion): as deep as a stack is high.
  void Extend(NetId net, const VectorSet& on) {
    if (net == rail_.rail) {
      tallest_ = std::max(tallest_, static_cast<int>(way_.size()));
      return;
    }
    way_.push_back(net);
    for (size_t i = 0; i < rail_.switches.size() && tallest_ < limit_; ++i) {
      const Switch& device =
          network_.switches[static_cast<size_t>(rail_.switches[i])];
      if (device.drain != net && device.source != net) {
        continue;
      }
      const NetId next = device.across(net);
      const VectorSet both = on & on_[i];
      if (both.any() &&
          std::find(way_.begin(), way_.end(), next) == way_.end()) {
        Extend(next, both);
      }
    }
    way_.pop_back();
  }

  const SwitchNetwork& network_;
  const RailNetwork& rail_;
  std::vector<VectorSet> on_;  // By position in rail_.switches.
  std::vector<NetId> way_;
  int limit_ = 0;
  int tallest_ = 0;
};

}  // namespace

int TallestStack(const NetworkAnalysis& analysis, const RailNetwork& rail) {
  return StackSearch(analysis, rail).Tallest();
}

}  // namespace gatedyno
