#include "harness/node/node_json.h"

#include <algorithm>
#include <set>
#include <system_error>

#include <fmt/format.h>

#include "harness/base/text.h"

namespace gatedyno {
namespace {

using nlohmann::json;
namespace fs = std::filesystem;

std::vector<std::string> LowerNames(const json& list) {
  std::vector<std::string> names;
  for (const json& name : list) {
    names.push_back(ToLower(name.get<std::string>()));
  }
  return names;
}

template <class T>
std::optional<T> Optional(const json& object, const char* key) {
  return object.contains(key) ? std::optional<T>(object[key].get<T>())
                              : std::nullopt;
}

DeviceParameterNames ParameterNames(const json& names) {
  const DeviceParameterNames usual;
  return {
      .width = names.value("width", usual.width),
      .length = names.value("length", usual.length),
      .fingers = names.value("fingers", usual.fingers),
      .multiplicity = names.value("multiplicity", usual.multiplicity),
      .drain_area = names.value("drain_area", usual.drain_area),
      .source_area = names.value("source_area", usual.source_area),
      .drain_perimeter = names.value("drain_perimeter", usual.drain_perimeter),
      .source_perimeter =
          names.value("source_perimeter", usual.source_perimeter)};
}

NodeDevice DeviceFromJson(const json& device) {
  return {
      .polarity = device["polarity"] == "n" ? Polarity::kN : Polarity::kP,
      .model = device["model"],
      .names = LowerNames(device["names"]),
      .is_subcircuit = device.value("subcircuit", false),
      .parameters = ParameterNames(device.value("parameters", json::object())),
      .unit_m = device.value("unit_m", 1.0)};
}

// Without links: the simulator looks for what the file includes where the file
// really is.
fs::path Canonical(const fs::path& path) {
  std::error_code failed;
  const fs::path absolute = fs::absolute(path, failed);
  const fs::path canonical = fs::weakly_canonical(absolute, failed);
  return failed ? absolute.lexically_normal() : canonical;
}

Process ProcessFromJson(const json& process, const fs::path& folder) {
  Process result{.name = process["name"],
                 .parameters = process.value("parameters",
                                             std::map<std::string, double>()),
                 .models = {}};
  for (const json& model : process["models"]) {
    result.models.push_back(
        {.path = Canonical(folder / model["file"].get<std::string>()),
         .section = model.value("section", "")});
  }
  return result;
}

Corner CornerFromJson(const json& corner) {
  return {.name = corner["name"],
          .process = corner["process"],
          .supply_v = corner["supply_v"],
          .temperature_c = corner["temperature_c"]};
}

// Reports and stores tell processes and corners apart by name.
template <class T>
Status CheckDistinct(const std::vector<T>& items,
                     const char* list,
                     const ProcessNode& node) {
  std::set<std::string> seen;
  for (size_t i = 0; i < items.size(); ++i) {
    if (!seen.insert(items[i].name).second) {
      return BadInput(fmt::format("{}: /{}/{}/name: '{}' is there already",
                                  node.file.string(),
                                  list,
                                  i,
                                  items[i].name));
    }
  }
  return Ok();
}

Status CheckProcesses(const ProcessNode& node) {
  for (size_t i = 0; i < node.corners.size(); ++i) {
    const std::string& wanted = node.corners[i].process;
    const bool found = std::any_of(
        node.processes.begin(), node.processes.end(), [&](const Process& p) {
          return p.name == wanted;
        });
    if (!found) {
      return BadInput(
          fmt::format("{}: /corners/{}/process: no process is named '{}'",
                      node.file.string(),
                      i,
                      wanted));
    }
  }
  return Ok();
}

Status CheckDevices(const ProcessNode& node) {
  for (const auto& [polarity, letter] :
       {std::pair{Polarity::kN, 'n'}, std::pair{Polarity::kP, 'p'}}) {
    // A structured binding cannot be captured by name in C++20's Clang 14.
    const bool found = std::any_of(node.devices.begin(),
                                   node.devices.end(),
                                   [wanted = polarity](const NodeDevice& d) {
                                     return d.polarity == wanted;
                                   });
    if (!found) {
      return BadInput(fmt::format("{}: /devices: none has polarity \"{}\"",
                                  node.file.string(),
                                  letter));
    }
  }
  return Ok();
}

void FillRails(const json& rails, ProcessNode& node) {
  node.power_names = LowerNames(rails["power"]);
  node.ground_names = LowerNames(rails["ground"]);
  node.n_body_names = LowerNames(rails.value("n_body", json::array()));
  node.p_body_names = LowerNames(rails.value("p_body", json::array()));
}

void FillLists(const json& json_node, ProcessNode& node) {
  for (const json& device : json_node["devices"]) {
    node.devices.push_back(DeviceFromJson(device));
  }
  for (const json& process : json_node["processes"]) {
    node.processes.push_back(ProcessFromJson(process, node.file.parent_path()));
  }
  for (const json& corner : json_node["corners"]) {
    node.corners.push_back(CornerFromJson(corner));
  }
  const auto parameters =
      json_node.value("parameters", std::map<std::string, double>());
  for (const auto& [name, value] : parameters) {
    node.parameters[ToLower(name)] = value;
  }
}

}  // namespace

Result<ProcessNode> NodeFromJson(const json& json_node, const fs::path& file) {
  ProcessNode node;
  node.file = file;
  node.name = json_node["name"];
  node.title = json_node["title"];
  node.supply_v = json_node["supply_v"];
  node.temperature_c = json_node["temperature_c"];
  node.drawn_length_m = json_node["drawn_length_m"];
  node.minimum_width_m = json_node["width"]["minimum_m"];
  node.width_grid_m = json_node["width"]["grid_m"];
  node.mu = json_node["mu"];
  node.diffusion = {.contacted_m = json_node["diffusion"]["contacted_m"],
                    .shared_m = json_node["diffusion"]["shared_m"]};
  node.fin_width_m = Optional<double>(json_node, "fin_width_m");
  node.option_scale_m = Optional<double>(json_node, "option_scale_m");
  node.trusted_models = json_node.value("trusted_models", false);
  FillRails(json_node["rails"], node);
  FillLists(json_node, node);
  for (const Status& check : {CheckDevices(node),
                              CheckProcesses(node),
                              CheckDistinct(node.processes, "processes", node),
                              CheckDistinct(node.corners, "corners", node)}) {
    if (!check.ok()) {
      return Forward(check);
    }
  }
  return node;
}

}  // namespace gatedyno
