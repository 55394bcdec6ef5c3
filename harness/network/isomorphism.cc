#include "harness/network/isomorphism.h"

#include <algorithm>
#include <map>
#include <tuple>

#include "harness/network/series_parallel.h"

namespace gatedyno {
namespace {

// A device as an undirected labelled edge: lower end, upper end, gate.
using Link = std::tuple<NetId, NetId, NetId>;

Link LinkBetween(NetId a, NetId b, NetId gate) {
  return {std::min(a, b), std::max(a, b), gate};
}

std::vector<Link> LinksOf(const SwitchNetwork& network,
                          const RailNetwork& rail) {
  std::vector<Link> links;
  for (const int index : rail.switches) {
    const Switch& device = network.switches[static_cast<size_t>(index)];
    links.push_back(LinkBetween(device.drain, device.source, device.gate));
  }
  std::sort(links.begin(), links.end());
  return links;
}

// Backtracking over the matchings of the inner nets.
class Matcher {
 public:
  Matcher(const SwitchNetwork& network,
          const RailNetwork& from,
          const RailNetwork& to)
      : inner_from_(from.inner),
        inner_to_(to.inner),
        from_(LinksOf(network, from)),
        to_(LinksOf(network, to)) {}

  bool Match(std::map<NetId, NetId> ends) {
    image_ = std::move(ends);
    return inner_from_.size() == inner_to_.size() &&
           from_.size() == to_.size() && MatchFrom(0);
  }

 private:
  // The devices whose two ends are matched, moved over, all exist there.
  bool Agrees() const {
    std::vector<Link> moved;
    for (const auto& [a, b, gate] : from_) {
      const auto to_a = image_.find(a);
      const auto to_b = image_.find(b);
      if (to_a != image_.end() && to_b != image_.end()) {
        moved.push_back(LinkBetween(to_a->second, to_b->second, gate));
      }
    }
    std::sort(moved.begin(), moved.end());
    return std::includes(to_.begin(), to_.end(), moved.begin(), moved.end());
  }

  // NOLINTNEXTLINE(misc-no-recursion): one level per inner net.
  bool MatchFrom(size_t position) {
    if (!Agrees()) {
      return false;
    }
    if (position == inner_from_.size()) {
      return true;
    }
    for (const NetId candidate : inner_to_) {
      const bool taken =
          std::any_of(image_.begin(), image_.end(), [&](const auto& matched) {
            return matched.second == candidate;
          });
      if (taken) {
        continue;
      }
      image_[inner_from_[position]] = candidate;
      if (MatchFrom(position + 1)) {
        return true;
      }
      image_.erase(inner_from_[position]);
    }
    return false;
  }

  std::vector<NetId> inner_from_;
  std::vector<NetId> inner_to_;
  std::vector<Link> from_;
  std::vector<Link> to_;
  std::map<NetId, NetId> image_;
};

}  // namespace

bool SameTopology(const SwitchNetwork& network,
                  const RailNetwork& a,
                  const RailNetwork& b) {
  const auto tree_a = ReduceSeriesParallel(network, a);
  const auto tree_b = ReduceSeriesParallel(network, b);
  if (tree_a && tree_b) {
    return CanonicalText(network, *tree_a) == CanonicalText(network, *tree_b);
  }
  if (tree_a || tree_b) {
    return false;
  }
  Matcher matcher(network, a, b);
  return matcher.Match({{a.output, b.output}, {a.rail, b.rail}}) ||
         matcher.Match({{a.output, b.rail}, {a.rail, b.output}});
}

}  // namespace gatedyno
