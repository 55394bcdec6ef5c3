#include "tests/models/card_bench.h"

#include <cmath>
#include <fstream>
#include <string>

#include <fmt/format.h>

#include "tests/support/ngspice_batch.h"

namespace gatedyno {
namespace {

// Drain voltage of the linear region, as usual for thresholds.
constexpr double kLinearDrainV = 0.05;
// Threshold criterion per square of channel; 100 nA is common practice.
constexpr double kThresholdA = 100e-9;
constexpr double kSwingSpanV = 0.1;
constexpr double kDeviceWidthM = 1e-6;

// FO4 a metre of drawn length, to choose pulse and stop times: 333 ps/um
// (Harris, lecture tables).
constexpr double kTypicalFo4SPerM = 333e-6;

std::string ModelFolder() {
  return std::string(GATEDYNO_SOURCE_DIR) + "/models";
}

// Title, process parameters, card, temperature, accuracy.
std::string DeckHead(const CardNode& node, const Conditions& conditions) {
  std::string head = "* " + node.name + "\n.param";
  for (const auto& [name, value] : conditions.process) {
    head += fmt::format(" {}={}", name, value);
  }
  // chgtol: the simulator's default is more than the charge on a gate.
  // gmin: its default hides the smallest leakage currents.
  return head + fmt::format(
                    "\n.include \"{}/{}.sp\"\n.temp {}\n"
                    ".options num_threads=1 reltol=1e-4 chgtol=1e-18 trtol=1 "
                    "gmin=1e-15\n",
                    ModelFolder(),
                    node.name,
                    conditions.temperature_c);
}

// One M line with contacted diffusion on both sides; permod=1 counts the gate
// edge into the perimeter.
std::string DeviceLine(const CardNode& node,
                       char polarity,
                       std::string_view nets,
                       double width_m,
                       double length_m,
                       double multiplicity = 1.0) {
  const double area_m2 = width_m * node.contacted_m;
  const double edge_m = 2 * (width_m + node.contacted_m);
  return fmt::format("{} {}_{} w={} l={} as={} ad={} ps={} pd={} m={}\n",
                     nets,
                     node.name,
                     polarity,
                     width_m,
                     length_m,
                     area_m2,
                     area_m2,
                     edge_m,
                     edge_m,
                     multiplicity);
}

// Five inverters from net `in`, each driving `fanout` of its own kind, with
// measures rise<fanout> and fall<fanout> on the third.
std::string InverterChain(const CardNode& node, double supply_v, int fanout) {
  std::string text;
  std::string in = "in";
  double copies = 1.0;
  for (int stage = 1; stage <= 5; ++stage) {
    const std::string id = fmt::format("h{}_{}", fanout, stage);
    text += DeviceLine(node,
                       'n',
                       fmt::format("mn{0} {0} {1} 0 0", id, in),
                       node.unit_width_m,
                       node.length_m,
                       copies);
    text += DeviceLine(node,
                       'p',
                       fmt::format("mp{0} {0} {1} vdd vdd", id, in),
                       2 * node.unit_width_m,
                       node.length_m,
                       copies);
    in = id;
    copies *= fanout;
  }
  text += fmt::format(
      ".meas tran rise{0} trig v(h{0}_2) val={1} fall=1 "
      "targ v(h{0}_3) val={1} rise=1\n"
      ".meas tran fall{0} trig v(h{0}_2) val={1} rise=1 "
      "targ v(h{0}_3) val={1} fall=1\n",
      fanout,
      supply_v / 2);
  return text;
}

// One pulse through every chain, long enough for the slowest corner.
std::string PulseAndStop(const CardNode& node, double supply_v) {
  const double unit_s = kTypicalFo4SPerM * node.length_m;
  return fmt::format(
      "vdd vdd 0 {}\nvin in 0 pulse(0 {} {} {} {} {} {})\n"
      ".tran {} {} 0 {}\n",
      supply_v,
      supply_v,
      10 * unit_s,
      2 * unit_s,
      2 * unit_s,
      60 * unit_s,
      300 * unit_s,
      unit_s / 3,
      130 * unit_s,
      unit_s / 3);
}

InverterFigures FiguresFromDelays(const BatchMeasures& delays) {
  InverterFigures figures;
  figures.fo4_rise_s = delays.at("rise4");
  figures.fo4_fall_s = delays.at("fall4");
  figures.fo4_s = (figures.fo4_rise_s + figures.fo4_fall_s) / 2;
  const double at_1_s = (delays.at("rise1") + delays.at("fall1")) / 2;
  const double at_6_s = (delays.at("rise6") + delays.at("fall6")) / 2;
  figures.tau_s = (at_6_s - at_1_s) / 5;
  figures.parasitic = at_1_s / figures.tau_s - 1;
  return figures;
}

// Signs of a p device's voltages and currents are those of an n device
// reversed.
double Sign(char polarity) {
  return polarity == 'n' ? 1.0 : -1.0;
}

DeviceFigures FiguresFromCurrents(const BatchMeasures& measures,
                                  double supply_v) {
  const auto magnitude = [&](const char* name) {
    return std::abs(measures.at(name));
  };
  DeviceFigures figures;
  figures.on_a_per_m = magnitude("on") / kDeviceWidthM;
  figures.off_a_per_m = magnitude("off") / kDeviceWidthM;
  figures.threshold_linear_v = magnitude("vtlin");
  figures.threshold_saturated_v = magnitude("vtsat");
  figures.barrier_lowering =
      (figures.threshold_linear_v - figures.threshold_saturated_v) /
      (supply_v - kLinearDrainV);
  figures.swing_v =
      kSwingSpanV / std::log10(magnitude("swing1") / magnitude("swing0"));
  return figures;
}

}  // namespace

CardNode LoadCardNode(std::string_view name) {
  std::ifstream file(fmt::format("{}/{}.json", ModelFolder(), name));
  const auto json = nlohmann::json::parse(file);
  CardNode node;
  node.name = name;
  node.supply_v = json.at("supply_v");
  node.length_m = json.at("drawn_length_m");
  node.unit_width_m = json.at("parameters").at("wunit");
  node.contacted_m = json.at("diffusion").at("contacted_m");
  for (const auto& process : json.at("processes")) {
    node.processes[process.at("name")] = process.at("parameters");
  }
  node.corners = json.at("corners");
  return node;
}

Conditions NominalConditions(const CardNode& node,
                             const std::string& process,
                             double temperature_c) {
  return {node.processes.at(process), node.supply_v, temperature_c};
}

Result<DeviceFigures> MeasureDevice(const CardNode& node,
                                    char polarity,
                                    const Conditions& conditions,
                                    double length_scale) {
  const double sign = Sign(polarity);
  const double supply_v = conditions.supply_v;
  const double length_m = node.length_m * length_scale;
  std::string deck = DeckHead(node, conditions);
  deck += fmt::format("vg g 0 0\nvd d 0 {}\nvlin l 0 {}\n",
                      sign * supply_v,
                      sign * kLinearDrainV);
  deck += DeviceLine(node, polarity, "m1 d g 0 0", kDeviceWidthM, length_m);
  deck += DeviceLine(node, polarity, "m2 l g 0 0", kDeviceWidthM, length_m);
  // The sweep passes both ends: the simulator finds nothing at its last point.
  deck += fmt::format(
      ".dc vg {} {} {}\n.meas dc on find i(vd) at={}\n"
      ".meas dc off find i(vd) at=0\n.meas dc swing0 find i(vlin) at=0\n"
      ".meas dc swing1 find i(vlin) at={}\n",
      -0.3 * sign,
      (supply_v + 0.01) * sign,
      0.005 * sign,
      supply_v * sign,
      kSwingSpanV * sign);
  const double criterion_a = kThresholdA * kDeviceWidthM / length_m;
  deck += fmt::format(
      ".meas dc vtsat when i(vd)={0}\n.meas dc vtlin when i(vlin)={0}\n.end\n",
      -sign * criterion_a);
  const Result<BatchMeasures> measures = RunBatch(deck);
  if (!measures.ok()) {
    return Forward(measures);
  }
  return FiguresFromCurrents(*measures, supply_v);
}

Result<OnCurrents> MeasureOnCurrents(const CardNode& node,
                                     const Conditions& conditions) {
  std::string deck = DeckHead(node, conditions);
  deck += fmt::format("vd d 0 {}\nvn d n 0\nvp p 0 0\n", conditions.supply_v);
  deck += DeviceLine(node, 'n', "m1 n d 0 0", kDeviceWidthM, node.length_m);
  deck += DeviceLine(node, 'p', "m2 p 0 d d", kDeviceWidthM, node.length_m);
  deck += fmt::format(
      ".dc vd {0} {1} {2}\n.meas dc on_n find i(vn) at={0}\n"
      ".meas dc on_p find i(vp) at={0}\n.end\n",
      conditions.supply_v,
      conditions.supply_v + 0.02,
      0.01);
  const Result<BatchMeasures> measures = RunBatch(deck);
  if (!measures.ok()) {
    return Forward(measures);
  }
  return OnCurrents{measures->at("on_n") / kDeviceWidthM,
                    measures->at("on_p") / kDeviceWidthM};
}

Result<InverterFigures> MeasureInverter(const CardNode& node,
                                        const Conditions& conditions) {
  std::string deck = DeckHead(node, conditions);
  deck += PulseAndStop(node, conditions.supply_v);
  for (const int fanout : {1, 4, 6}) {
    deck += InverterChain(node, conditions.supply_v, fanout);
  }
  const Result<BatchMeasures> delays = RunBatch(deck + ".end\n");
  if (!delays.ok()) {
    return Forward(delays);
  }
  return FiguresFromDelays(*delays);
}

}  // namespace gatedyno
