#include "harness/page/page_circuit.h"

#include <algorithm>
#include <cstddef>
#include <vector>

#include <fmt/format.h>

#include "harness/page/circuit_layout.h"
#include "harness/page/circuit_sizes.h"
#include "harness/page/circuit_svg.h"
#include "harness/report/html_text.h"
#include "harness/report/verdict_text.h"

namespace gatedyno {
namespace {

// "y = !(a & b)" for a pin that has a function, else the net's name.
std::string FunctionOf(const CellSummary& cell, const std::string& output) {
  const auto function = std::find_if(
      cell.functions.begin(), cell.functions.end(), [&](const std::string& f) {
        return f.starts_with(output + " = ");
      });
  return function == cell.functions.end() ? output : *function;
}

// "stage 2 of nand2, y = !(a & b): 2 PMOS and 2 NMOS devices".
std::string LabelOf(const CellSummary& cell, size_t stage) {
  const CircuitStage& drawn = cell.circuit.stages[stage];
  std::string outputs;
  for (const std::string& output : drawn.outputs) {
    outputs += ", " + FunctionOf(cell, output);
  }
  const auto p_type = std::count_if(
      drawn.devices.begin(), drawn.devices.end(), [&](size_t device) {
        return cell.circuit.devices[device].p_type;
      });
  const auto all = static_cast<std::ptrdiff_t>(drawn.devices.size());
  return fmt::format("stage {} of {}{}: {} PMOS and {} NMOS devices",
                     stage + 1,
                     cell.name,
                     outputs,
                     p_type,
                     all - p_type);
}

std::string Drawings(const CellSummary& cell, const CircuitSizes& sizes) {
  std::string drawings;
  for (size_t i = 0; i < cell.circuit.stages.size(); ++i) {
    const StageLayout layout =
        LayOutStage(cell.circuit, cell.circuit.stages[i]);
    if (!layout.devices.empty()) {
      drawings += StageSvg(cell.circuit, layout, sizes, LabelOf(cell, i));
    }
  }
  return drawings;
}

// "Not drawn: m7 (drain and source on y)."; empty when all are drawn.
std::string NotDrawn(const Circuit& circuit) {
  std::vector<bool> drawn(circuit.devices.size());
  for (const CircuitStage& stage : circuit.stages) {
    for (const size_t device : stage.devices) {
      drawn[device] =
          circuit.devices[device].drain != circuit.devices[device].source;
    }
  }
  std::string names;
  for (size_t i = 0; i < circuit.devices.size(); ++i) {
    const CircuitDevice& device = circuit.devices[i];
    if (drawn[i]) {
      continue;
    }
    names += names.empty() ? " Not drawn: " : ", ";
    names += device.drain == device.source
                 ? fmt::format("{} (drain and source on {})",
                               HtmlName(device.name),
                               HtmlName(device.source))
                 : fmt::format("{} (always off, from {} to {})",
                               HtmlName(device.name),
                               HtmlName(device.drain),
                               HtmlName(device.source));
  }
  return names.empty() ? names : names + '.';
}

std::string DeviceRow(const CircuitDevice& device, const CircuitSizes& sizes) {
  return fmt::format(
      "<tr><th scope=\"row\">{}<td>{}<td>{}<td>{}<td>{}<td>{}<td>{}\n",
      Html(device.name),
      device.p_type ? "PMOS" : "NMOS",
      Html(device.gate),
      Html(device.drain),
      Html(device.source),
      sizes.Number(device.width_m),
      sizes.Number(device.length_m));
}

std::string DeviceTable(const CellSummary& cell, const CircuitSizes& sizes) {
  std::string rows;
  for (const CircuitDevice& device : cell.circuit.devices) {
    rows += DeviceRow(device, sizes);
  }
  return fmt::format(
      "<details><summary>{2}</summary><div class=\"wide\" role=\"region\" "
      "tabindex=\"0\" aria-label=\"devices of {0}\"><table class=\"devices\">"
      "<thead><tr><th scope=\"col\">device</th><th scope=\"col\">type</th><th "
      "scope=\"col\">gate</th><th scope=\"col\">drain</th><th scope=\"col\">"
      "source</th><th scope=\"col\">width, {1}</th><th scope=\"col\">length, "
      "{1}</th></tr></thead>\n<tbody>\n{3}</tbody></table></div></details>",
      Html(cell.name),
      sizes.unit(),
      Counted(static_cast<int>(cell.circuit.devices.size()), "device"),
      rows);
}

}  // namespace

std::string CircuitFigure(const CellSummary& cell) {
  if (cell.circuit.devices.empty()) {
    return "<p>No drawing: this run kept no transistors.</p>\n";
  }
  const CircuitSizes sizes(cell.circuit);
  return fmt::format(
      "<figure class=\"circuit\"><div class=\"wide\" role=\"region\" "
      "tabindex=\"0\" aria-label=\"transistors of {}\">\n{}</div><figcaption>"
      "{}{}</figcaption>{}</figure>\n",
      Html(cell.name),
      Drawings(cell, sizes),
      sizes.common_length().empty()
          ? "Beside each device: width/length."
          : fmt::format("Beside each device: width; all lengths {} {}.",
                        sizes.common_length(),
                        sizes.unit()),
      NotDrawn(cell.circuit),
      DeviceTable(cell, sizes));
}

}  // namespace gatedyno
