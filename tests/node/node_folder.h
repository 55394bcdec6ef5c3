// A folder with a node file and its model file, to change one thing of.

#ifndef GATEDYNO_TESTS_NODE_NODE_FOLDER_H_
#define GATEDYNO_TESTS_NODE_NODE_FOLDER_H_

#include <filesystem>
#include <string>
#include <string_view>

#include <nlohmann/json.hpp>

#include "harness/node/process_node.h"
#include "tests/support/temporary_folder.h"

namespace gatedyno {

inline constexpr std::string_view kCards =
    "* two cards\n"
    ".model card_n nmos level=1\n"
    ".model card_p pmos level=1\n";

// The smallest node there can be.
inline nlohmann::json SmallNode() {
  return nlohmann::json::parse(R"({
    "format": "gatedyno-node/1",
    "name": "small",
    "title": "two level 1 cards",
    "supply_v": 1.2,
    "temperature_c": 27,
    "drawn_length_m": 100e-9,
    "width": {"minimum_m": 200e-9, "grid_m": 10e-9},
    "mu": 2.5,
    "diffusion": {"contacted_m": 250e-9, "shared_m": 150e-9},
    "rails": {"power": ["VDD"], "ground": ["vss"]},
    "devices": [
      {"polarity": "n", "model": "card_n", "names": ["NFET"]},
      {"polarity": "p", "model": "card_p", "names": ["pfet"]}],
    "processes": [{"name": "typical", "models": [{"file": "cards.sp"}]}],
    "corners": [{"name": "nominal", "process": "typical", "supply_v": 1.2,
                 "temperature_c": 27}]})");
}

class NodeFolder {
 public:
  NodeFolder() { WriteCards(kCards); }

  std::filesystem::path path() const { return folder_.path(); }
  std::string NodeFile() const { return (path() / "node.json").string(); }
  std::string CardsFile() const { return (path() / "cards.sp").string(); }

  void WriteCards(std::string_view text) { folder_.Write("cards.sp", text); }
  void Write(std::string_view name, std::string_view text) {
    std::filesystem::create_directories((path() / name).parent_path());
    folder_.Write(name, text);
  }

  Result<ProcessNode> Load(const nlohmann::json& node) {
    return LoadText(node.dump());
  }
  Result<ProcessNode> LoadText(std::string_view text) {
    folder_.Write("node.json", text);
    return LoadNode(NodeFile());
  }

 private:
  TemporaryFolder folder_;
};

// The message of a failure, or "ok".
template <class T>
std::string MessageOf(const Result<T>& result) {
  return result.ok() ? "ok" : result.error().message;
}

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_NODE_NODE_FOLDER_H_
