#include "harness/network/series_parallel.h"

#include <algorithm>

#include <fmt/format.h>

namespace gatedyno {
namespace {

using Form = SeriesParallel::Form;

// A part of the network between two nets, in series from `a` to `b`.
struct Way {
  NetId a = 0;
  NetId b = 0;
  SeriesParallel tree;
};

void Reverse(Way& way) {
  std::swap(way.a, way.b);
  // Parts of parallel ways inside keep their own order from output to rail
  // only if they are turned too.
  const auto turn = [](auto&& self, SeriesParallel& tree) -> void {
    if (tree.form == Form::kSeries) {
      std::reverse(tree.parts.begin(), tree.parts.end());
    }
    for (SeriesParallel& part : tree.parts) {
      self(self, part);
    }
  };
  turn(turn, way.tree);
}

SeriesParallel Join(Form form, SeriesParallel first, SeriesParallel second) {
  SeriesParallel joined = {form, -1, {}};
  for (SeriesParallel* tree : {&first, &second}) {
    if (tree->form == form) {
      joined.parts.insert(
          joined.parts.end(), tree->parts.begin(), tree->parts.end());
    } else {
      joined.parts.push_back(std::move(*tree));
    }
  }
  return joined;
}

bool MergeParallel(std::vector<Way>& ways) {
  for (size_t i = 0; i < ways.size(); ++i) {
    for (size_t j = i + 1; j < ways.size(); ++j) {
      if (ways[i].a == ways[j].b && ways[i].b == ways[j].a) {
        Reverse(ways[j]);
      }
      if (ways[i].a == ways[j].a && ways[i].b == ways[j].b) {
        ways[i].tree = Join(
            Form::kParallel, std::move(ways[i].tree), std::move(ways[j].tree));
        ways.erase(ways.begin() + static_cast<std::ptrdiff_t>(j));
        return true;
      }
    }
  }
  return false;
}

// Joins the only two ways at `net`.
bool MergeSeries(std::vector<Way>& ways, NetId net) {
  std::vector<size_t> at;
  for (size_t i = 0; i < ways.size(); ++i) {
    if (ways[i].a == net || ways[i].b == net) {
      at.push_back(i);
    }
  }
  if (at.size() != 2) {
    return false;
  }
  Way& first = ways[at[0]];
  Way& second = ways[at[1]];
  if (first.b != net) {
    Reverse(first);
  }
  if (second.a != net) {
    Reverse(second);
  }
  first.tree =
      Join(Form::kSeries, std::move(first.tree), std::move(second.tree));
  first.b = second.b;
  ways.erase(ways.begin() + static_cast<std::ptrdiff_t>(at[1]));
  return true;
}

bool MergeAnySeries(std::vector<Way>& ways, const std::vector<NetId>& inner) {
  return std::any_of(inner.begin(), inner.end(), [&](NetId net) {
    return MergeSeries(ways, net);
  });
}

}  // namespace

std::optional<SeriesParallel> ReduceSeriesParallel(const SwitchNetwork& network,
                                                   const RailNetwork& rail) {
  std::vector<Way> ways;
  for (const int index : rail.switches) {
    const Switch& device = network.switches[static_cast<size_t>(index)];
    ways.push_back({device.drain, device.source, {Form::kDevice, index, {}}});
  }
  while (MergeParallel(ways) || MergeAnySeries(ways, rail.inner)) {
  }
  if (ways.size() != 1) {
    return std::nullopt;
  }
  if (ways.front().a != rail.output) {
    Reverse(ways.front());
  }
  return std::move(ways.front().tree);
}

// NOLINTNEXTLINE(misc-no-recursion): as deep as the tree.
int Height(const SeriesParallel& tree) {
  if (tree.form == Form::kDevice) {
    return 1;
  }
  int height = 0;
  for (const SeriesParallel& part : tree.parts) {
    const int own = Height(part);
    height = tree.form == Form::kSeries ? height + own : std::max(height, own);
  }
  return height;
}

// NOLINTNEXTLINE(misc-no-recursion): as deep as the tree.
SeriesParallel DualOf(const SeriesParallel& tree) {
  SeriesParallel dual = tree;
  if (tree.form != Form::kDevice) {
    dual.form = tree.form == Form::kSeries ? Form::kParallel : Form::kSeries;
  }
  for (SeriesParallel& part : dual.parts) {
    part = DualOf(part);
  }
  return dual;
}

// NOLINTNEXTLINE(misc-no-recursion): as deep as the tree.
std::string CanonicalText(const SwitchNetwork& network,
                          const SeriesParallel& tree) {
  if (tree.form == Form::kDevice) {
    return fmt::format("{}",
                       network.switches[static_cast<size_t>(tree.index)].gate);
  }
  std::vector<std::string> parts;
  for (const SeriesParallel& part : tree.parts) {
    parts.push_back(CanonicalText(network, part));
  }
  std::sort(parts.begin(), parts.end());
  return fmt::format(
      "{}({})", tree.form == Form::kSeries ? "s" : "p", fmt::join(parts, ","));
}

}  // namespace gatedyno
