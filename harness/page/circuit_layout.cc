#include "harness/page/circuit_layout.h"

#include <algorithm>
#include <numeric>

namespace gatedyno {
namespace {

int TopOf(const StageLayout& layout, const PlacedDevice& device) {
  return layout.nets[device.between.upper].net.row;
}

int BottomOf(const StageLayout& layout, const PlacedDevice& device) {
  return layout.nets[device.between.lower].net.row;
}

// Whether the wires of two devices fit in one column: they share no row, or
// meet end to end on one net.
bool FitTogether(const StageLayout& layout,
                 const PlacedDevice& a,
                 const PlacedDevice& b) {
  const PlacedDevice& above = TopOf(layout, a) < TopOf(layout, b) ? a : b;
  const PlacedDevice& below = &above == &a ? b : a;
  const int end = BottomOf(layout, above);
  const int begin = TopOf(layout, below);
  return end < begin ||
         (end == begin && above.between.lower == below.between.upper);
}

// Gives columns to the devices below a net, each followed by those below it.
class ColumnFinder {
 public:
  explicit ColumnFinder(StageLayout* layout)
      : layout_(layout), visited_(layout->nets.size()) {}

  void PlaceBelow(size_t net) {
    if (visited_[net]) {
      return;
    }
    visited_[net] = true;
    for (PlacedDevice& device : layout_->devices) {
      if (device.between.upper == net) {
        device.column = ColumnFor(device);
        placed_.push_back(&device);
        layout_->columns = std::max(layout_->columns, device.column + 1);
        PlaceBelow(device.between.lower);
      }
    }
  }

 private:
  bool IsFree(int column, const PlacedDevice& device) const {
    return std::all_of(
        placed_.begin(), placed_.end(), [&](const PlacedDevice* other) {
          return other->column != column ||
                 FitTogether(*layout_, *other, device);
        });
  }

  int ColumnFor(const PlacedDevice& device) const {
    for (const PlacedDevice* above : placed_) {
      if (above->between.lower == device.between.upper &&
          IsFree(above->column, device)) {
        return above->column;
      }
    }
    int column = 0;
    while (!IsFree(column, device)) {
      ++column;
    }
    return column;
  }

  StageLayout* layout_;
  std::vector<bool> visited_;  // By net.
  std::vector<const PlacedDevice*> placed_;
};

void PlaceDevices(StageLayout* layout) {
  std::vector<size_t> from_top(layout->nets.size());
  std::iota(from_top.begin(), from_top.end(), size_t{0});
  std::stable_sort(from_top.begin(), from_top.end(), [&](size_t a, size_t b) {
    return layout->nets[a].net.row < layout->nets[b].net.row;
  });
  ColumnFinder finder(layout);
  for (const size_t net : from_top) {
    finder.PlaceBelow(net);
  }
  for (PlacedDevice& device : layout->devices) {
    device.slot = (TopOf(*layout, device) + BottomOf(*layout, device) - 1) / 2;
  }
}

// The columns where `net` goes up and those where it goes down.
struct Ends {
  std::vector<int> up;
  std::vector<int> down;
};

Ends EndsOf(const StageLayout& layout, size_t net) {
  Ends ends;
  for (const PlacedDevice& device : layout.devices) {
    if (device.between.lower == net) {
      ends.up.push_back(device.column);
    }
    if (device.between.upper == net) {
      ends.down.push_back(device.column);
    }
  }
  return ends;
}

void SetBar(const Ends& ends, int right_edge, PlacedNet* net) {
  net->first_column = right_edge;
  net->last_column = net->net.role == NetRole::kOutput ? right_edge : 0;
  for (const std::vector<int>* columns : {&ends.up, &ends.down}) {
    for (const int column : *columns) {
      net->first_column = std::min(net->first_column, column);
      net->last_column = std::max(net->last_column, column);
    }
  }
  const auto has = [](const std::vector<int>& columns, int column) {
    return std::find(columns.begin(), columns.end(), column) != columns.end();
  };
  for (int at = net->first_column; at <= net->last_column; ++at) {
    const int devices = int{has(ends.up, at)} + int{has(ends.down, at)};
    const int wires =
        devices + int{at > net->first_column} + int{at < net->last_column};
    if (devices > 0 && wires > 2) {
      net->dots.push_back(at);
    }
  }
}

// From the left, each bar on the first track of its row that is free.
void SetTracks(StageLayout* layout) {
  std::vector<PlacedNet*> order;
  int rows = 0;
  for (PlacedNet& net : layout->nets) {
    order.push_back(&net);
    rows = std::max(rows, net.net.row + 1);
  }
  std::stable_sort(
      order.begin(), order.end(), [](const PlacedNet* a, const PlacedNet* b) {
        return a->first_column < b->first_column;
      });
  std::vector<std::vector<int>> ends(static_cast<size_t>(rows));
  for (PlacedNet* net : order) {
    std::vector<int>& tracks = ends[static_cast<size_t>(net->net.row)];
    auto track = std::find_if(tracks.begin(), tracks.end(), [&](int end) {
      return end < net->first_column;
    });
    if (track == tracks.end()) {
      track = tracks.insert(track, 0);
    }
    *track = net->last_column;
    net->track = static_cast<int>(track - tracks.begin());
  }
  for (const std::vector<int>& tracks : ends) {
    layout->tracks.push_back(std::max(1, static_cast<int>(tracks.size())));
  }
}

}  // namespace

StageLayout LayOutStage(const Circuit& circuit, const CircuitStage& stage) {
  const StageRows rows = FindRows(circuit, stage);
  StageLayout layout;
  for (const StageNet& net : rows.nets) {
    layout.nets.push_back({net, 0, 0, 0, {}});
  }
  for (const StageDevice& device : rows.devices) {
    layout.devices.push_back({device, 0, 0});
  }
  PlaceDevices(&layout);
  for (size_t net = 0; net < layout.nets.size(); ++net) {
    SetBar(EndsOf(layout, net), layout.columns, &layout.nets[net]);
  }
  SetTracks(&layout);
  return layout;
}

}  // namespace gatedyno
