#include "harness/node/process_node.h"

#include <algorithm>
#include <cassert>
#include <system_error>

#include <fmt/format.h>
#include <fmt/ranges.h>

#include "harness/base/install.h"
#include "harness/node/json_file.h"
#include "harness/node/model_check.h"
#include "harness/node/node_json.h"

namespace gatedyno {
namespace {

namespace fs = std::filesystem;

constexpr const char* kSchemaName = "node.schema.json";

Result<fs::path> NodeFile(const std::string& name_or_path) {
  const fs::path built_in = ModelsFolder() / (name_or_path + ".json");
  std::error_code ignored;
  if (name_or_path.find('/') == std::string::npos &&
      fs::exists(built_in, ignored)) {
    return built_in;
  }
  if (fs::exists(name_or_path, ignored)) {
    return fs::path(name_or_path);
  }
  return BadInput(
      fmt::format("node '{}': neither a built-in node ({}) nor a file",
                  name_or_path,
                  fmt::join(BuiltInNodes(), ", ")));
}

}  // namespace

double ProcessNode::reference_width_m() const {
  const auto unit = parameters.find("wunit");
  return unit == parameters.end() ? minimum_width_m : unit->second;
}

const NodeDevice& ProcessNode::device(Polarity polarity) const {
  const auto found = std::find_if(
      devices.begin(), devices.end(), [&](const NodeDevice& candidate) {
        return candidate.polarity == polarity;
      });
  assert(found != devices.end());
  return *found;
}

Result<ProcessNode> LoadNode(const std::string& name_or_path) {
  const Result<fs::path> file = NodeFile(name_or_path);
  if (!file.ok()) {
    return Forward(file);
  }
  const Result<nlohmann::json> json =
      ReadJsonFile(*file, ModelsFolder() / kSchemaName);
  if (!json.ok()) {
    return Forward(json);
  }
  Result<ProcessNode> node = NodeFromJson(*json, *file);
  if (!node.ok()) {
    return node;
  }
  const Status safe = CheckModels(*node);
  if (!safe.ok()) {
    return Forward(safe);
  }
  return node;
}

std::vector<std::string> BuiltInNodes() {
  std::vector<std::string> names;
  std::error_code ignored;
  for (const auto& entry : fs::directory_iterator(ModelsFolder(), ignored)) {
    if (entry.path().extension() == ".json" &&
        entry.path().filename() != kSchemaName) {
      names.push_back(entry.path().stem().string());
    }
  }
  std::sort(names.begin(), names.end());
  return names;
}

Result<Corner> FindCorner(const ProcessNode& node, const std::string& name) {
  std::vector<std::string> known;
  for (const Corner& corner : node.corners) {
    if (corner.name == name) {
      return corner;
    }
    known.push_back(corner.name);
  }
  return BadInput(fmt::format("unknown corner '{}': node {} has {}",
                              name,
                              node.name,
                              fmt::join(known, ", ")));
}

const Process& ProcessOf(const ProcessNode& node, const Corner& corner) {
  const auto found = std::find_if(
      node.processes.begin(), node.processes.end(), [&](const Process& p) {
        return p.name == corner.process;
      });
  assert(found != node.processes.end());
  return *found;
}

ReaderOptions ReaderOptionsOf(const ProcessNode& node) {
  ReaderOptions options;
  for (const NodeDevice& device : node.devices) {
    for (const std::string& name : device.names) {
      options.devices.push_back({.name = name,
                                 .polarity = device.polarity,
                                 .is_subcircuit = device.is_subcircuit,
                                 .parameters = device.parameters,
                                 .unit_m = device.unit_m});
    }
  }
  options.power_names = node.power_names;
  options.ground_names = node.ground_names;
  options.body_names = node.n_body_names;
  options.body_names.insert(options.body_names.end(),
                            node.p_body_names.begin(),
                            node.p_body_names.end());
  options.parameters = node.parameters;
  options.default_length_m = node.drawn_length_m;
  options.fin_width_m = node.fin_width_m;
  return options;
}

}  // namespace gatedyno
