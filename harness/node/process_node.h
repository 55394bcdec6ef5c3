// A process node: device models, supply, corners, width grid, mu and diffusion
// rules, as a JSON file declares them (models/node.schema.json).

#ifndef GATEDYNO_NODE_PROCESS_NODE_H_
#define GATEDYNO_NODE_PROCESS_NODE_H_

#include <filesystem>
#include <map>
#include <optional>
#include <string>
#include <vector>

#include "harness/base/result.h"
#include "harness/netlist/reader.h"
#include "harness/record/corner.h"

namespace gatedyno {

// One device of the process: how cells spell it and what decks call it.
struct NodeDevice {
  Polarity polarity = Polarity::kN;
  std::string model;               // In decks.
  std::vector<std::string> names;  // In cell netlists, lower case.
  bool is_subcircuit = false;      // An X line instead of an M line.
  DeviceParameterNames parameters;
  double unit_m = 1.0;  // Lengths on its line are in this unit.
};

// A file of device models, whole or one section of a library.
struct ModelFile {
  std::filesystem::path path;  // Absolute, without links.
  std::string section;         // Empty: the whole file.
};

// One state of the process, "typical" or "slow".
struct Process {
  std::string name;
  std::map<std::string, double> parameters;  // Set before the models are read.
  std::vector<ModelFile> models;
};

// Extents of source and drain diffusion along the channel.
struct DiffusionRules {
  double contacted_m = 0.0;  // Of a region with contacts, gate to its far end.
  double shared_m = 0.0;     // Between two gates, without contacts.
};

struct ProcessNode {
  std::string name;
  std::string title;
  std::filesystem::path file;
  double supply_v = 0.0;
  double temperature_c = 25.0;
  double drawn_length_m = 0.0;
  double minimum_width_m = 0.0;
  double width_grid_m = 0.0;
  double mu = 2.0;  // Declared PMOS to NMOS resistance per width.
  DiffusionRules diffusion;
  std::vector<std::string> power_names;
  std::vector<std::string> ground_names;
  std::vector<std::string> n_body_names;  // Substrate: joined to ground.
  std::vector<std::string> p_body_names;  // Well: joined to the power supply.
  std::map<std::string, double> parameters;  // For cell netlists.
  std::vector<NodeDevice> devices;
  std::vector<Process> processes;
  std::vector<Corner> corners;
  std::optional<double> fin_width_m;
  std::optional<double> option_scale_m;  // `.option scale` of its models.
  bool trusted_models = false;  // Skip the safety check of model files.

  // NMOS width of the node's reference inverter: the parameter `wunit` where
  // there is one, else the minimum width.
  double reference_width_m() const;
  const NodeDevice& device(Polarity polarity) const;  // The first of its kind.
};

// `name_or_path`: a built-in node's name ("p45") or a JSON file's path.
// Checks the file against the schema, and its model files with CheckModels.
Result<ProcessNode> LoadNode(const std::string& name_or_path);

// Names of the built-in nodes, sorted.
std::vector<std::string> BuiltInNodes();

// Fails naming the corners there are.
Result<Corner> FindCorner(const ProcessNode& node, const std::string& name);

const Process& ProcessOf(const ProcessNode& node, const Corner& corner);

ReaderOptions ReaderOptionsOf(const ProcessNode& node);

}  // namespace gatedyno

#endif  // GATEDYNO_NODE_PROCESS_NODE_H_
