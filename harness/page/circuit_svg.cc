#include "harness/page/circuit_svg.h"

#include <algorithm>
#include <cmath>
#include <vector>

#include <fmt/format.h>

#include "harness/page/label_text.h"
#include "harness/report/html_text.h"

namespace gatedyno {
namespace {

// In pixels.  A symbol's origin is the middle of its wire.
constexpr int kHalfSymbol = 12;  // From its origin to where the wires go on.
constexpr int kGateReach = 22;   // From its origin left to the gate's name.
constexpr int kSlot = 44;        // From a row to the next.
constexpr int kTrack = 15;       // From a track to the next.
constexpr int kGap = 5;          // Between what belongs together.
constexpr int kBetween = 14;     // Between a column's text and the next.
constexpr int kMargin = 3;
constexpr int kRailOverhang = 9;  // Of a supply's bar over its last wires.
constexpr int kPowerRoom = 20;    // Over the first row, for the power's name.
constexpr int kGroundRoom = 19;   // Under the last row, for ground's symbol.
constexpr int kHalfText = 4;      // From the middle of a line to its base.
// Of the fixed-width fonts in reports/page.css the widest has 0.602 em.
constexpr double kGatePlace = 0.602 * 12;
constexpr double kSmallPlace = 0.602 * 11;
constexpr int kMostPlaces = 14;

constexpr std::string_view kSymbols =
    "<svg class=\"unseen\" width=\"0\" height=\"0\" aria-hidden=\"true\">"
    "<defs>\n"
    "<g id=\"nmos\"><path d=\"M0-12V-7H-7M-7 7H0V12M-11 0H-19\"/>"
    "<path class=\"thick\" d=\"M-7-10V10M-11-7V7\"/></g>\n"
    "<g id=\"pmos\"><path d=\"M0-12V-7H-7M-7 7H0V12M-17 0H-19\"/>"
    "<path class=\"thick\" d=\"M-7-10V10M-11-7V7\"/>"
    "<circle cx=\"-14.3\" cy=\"0\" r=\"2.7\"/></g>\n"
    "<path id=\"ground\" d=\"M0 0V5M-8 5H8M-5 9H5M-2 13H2\"/>\n"
    "</defs></svg>\n";

int WidthOf(const std::string& text, double place) {
  return static_cast<int>(std::ceil(LabelPlaces(text) * place));
}

std::string Short(const std::string& name) {
  return ShortLabel(name, kMostPlaces);
}

class StageDrawing {
 public:
  StageDrawing(const Circuit& circuit,
               const StageLayout& layout,
               const CircuitSizes& sizes)
      : circuit_(circuit), layout_(layout), sizes_(sizes) {
    MeasureColumns();
    MeasureRows();
  }

  std::string Svg(std::string_view label) {
    for (const PlacedDevice& device : layout_.devices) {
      AddDevice(device);
    }
    for (const PlacedNet& net : layout_.nets) {
      AddNet(net);
    }
    return fmt::format(
        "<svg role=\"img\" aria-label=\"{}\" width=\"{}\" height=\"{}\" "
        "viewBox=\"0 0 {} {}\"><path d=\"{}\"/><path class=\"dots\" d=\"{}\"/>"
        "{}<g class=\"gate\">{}</g>{}</svg>\n",
        Html(label),
        width_,
        height_,
        width_,
        height_,
        wires_,
        dots_,
        symbols_,
        gates_,
        names_);
  }

 private:
  const CircuitDevice& DeviceOf(const PlacedDevice& device) const {
    return circuit_.devices[device.between.device];
  }

  void MeasureColumns() {
    int gate = 0;
    int beside = 0;
    int after = 0;  // Right of the last column: outputs and the ground's name.
    for (const PlacedDevice& device : layout_.devices) {
      const CircuitDevice& drawn = DeviceOf(device);
      gate = std::max(gate, WidthOf(Short(drawn.gate), kGatePlace));
      beside = std::max(beside, WidthOf(sizes_.Beside(drawn), kSmallPlace));
    }
    for (const PlacedNet& net : layout_.nets) {
      const int name = WidthOf(Short(net.net.name), kSmallPlace);
      (net.net.role == NetRole::kInner ? beside : after) =
          std::max(net.net.role == NetRole::kInner ? beside : after, name);
    }
    first_x_ = kMargin + gate + kGateReach;
    pitch_ = kGap + beside + kBetween + gate + kGateReach;
    right_x_ = first_x_ + (layout_.columns - 1) * pitch_ + 2 * kGap + beside;
    width_ = right_x_ + kGap + after + kMargin;
  }

  void MeasureRows() {
    int y = kPowerRoom;
    for (const int tracks : layout_.tracks) {
      row_y_.push_back(y);
      y += (tracks - 1) * kTrack + kSlot;
    }
    height_ = y - kSlot + kGroundRoom;
  }

  int X(int column) const {
    return column == layout_.columns ? right_x_ : first_x_ + column * pitch_;
  }
  int Y(const PlacedNet& net) const {
    return row_y_[static_cast<size_t>(net.net.row)] + net.track * kTrack;
  }
  int SlotY(int slot) const {
    return row_y_[static_cast<size_t>(slot) + 1] - kSlot / 2;
  }

  void AddWire(int x1, int y1, int x2, int y2) {
    wires_ += fmt::format("M{} {}", x1, y1);
    wires_ += y1 == y2 ? fmt::format("H{}", x2) : fmt::format("V{}", y2);
  }

  // `html` on the line whose middle is at `y`; `more`: attributes, each after a
  // blank.
  static std::string Text(int x,
                          int y,
                          const std::string& html,
                          std::string_view more = "") {
    return fmt::format(
        "<text x=\"{}\" y=\"{}\"{}>{}</text>", x, y + kHalfText, more, html);
  }

  // In full where the mouse rests on it.
  static std::string Name(const std::string& name) {
    const std::string shown = Short(name);
    return shown == name
               ? Html(name)
               : fmt::format("{}<title>{}</title>", Html(shown), Html(name));
  }

  void AddDevice(const PlacedDevice& device) {
    const CircuitDevice& drawn = DeviceOf(device);
    const int x = X(device.column);
    const int y = SlotY(device.slot);
    AddWire(x, Y(layout_.nets[device.between.upper]), x, y - kHalfSymbol);
    AddWire(x, y + kHalfSymbol, x, Y(layout_.nets[device.between.lower]));
    symbols_ += fmt::format("<use href=\"#{}\" x=\"{}\" y=\"{}\"/>",
                            drawn.p_type ? "pmos" : "nmos",
                            x,
                            y);
    gates_ += Text(x - kGateReach, y, Name(drawn.gate));
    names_ += Text(x + kGap, y, sizes_.Beside(drawn));
  }

  void AddNet(const PlacedNet& net) {
    const int y = Y(net);
    for (const int column : net.dots) {
      dots_ += fmt::format("M{} {}h0", X(column), y);
    }
    if (net.net.role == NetRole::kPower || net.net.role == NetRole::kGround) {
      AddSupply(net);
      return;
    }
    const int end = X(net.last_column);
    if (net.first_column < net.last_column) {
      AddWire(X(net.first_column), y, end, y);
    }
    names_ += Text(end + kGap,
                   y,
                   Name(net.net.name),
                   net.net.role == NetRole::kOutput ? " class=\"output\"" : "");
  }

  void AddSupply(const PlacedNet& net) {
    const int first = X(net.first_column);
    const int last = X(net.last_column);
    const int middle = (first + last) / 2;
    const int y = Y(net);
    AddWire(first - kRailOverhang, y, last + kRailOverhang, y);
    if (net.net.role == NetRole::kPower) {
      names_ += Text(first - kRailOverhang, y - 2 * kGap, Name(net.net.name));
    } else {
      symbols_ +=
          fmt::format("<use href=\"#ground\" x=\"{}\" y=\"{}\"/>", middle, y);
      names_ += Text(middle + 2 * kGap, y + 2 * kGap, Name(net.net.name));
    }
  }

  const Circuit& circuit_;
  const StageLayout& layout_;
  const CircuitSizes& sizes_;
  int first_x_ = 0;
  int pitch_ = 0;
  int right_x_ = 0;
  int width_ = 0;
  int height_ = 0;
  std::vector<int> row_y_;  // Of each row's first track.
  std::string wires_;
  std::string dots_;
  std::string symbols_;
  std::string gates_;
  std::string names_;
};

}  // namespace

std::string CircuitSymbols() {
  return std::string(kSymbols);
}

std::string StageSvg(const Circuit& circuit,
                     const StageLayout& layout,
                     const CircuitSizes& sizes,
                     std::string_view label) {
  return StageDrawing(circuit, layout, sizes).Svg(label);
}

}  // namespace gatedyno
