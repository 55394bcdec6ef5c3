#include "harness/node/node_json.h"

#include <string>
#include <vector>

#include <gtest/gtest.h>

#include "tests/node/node_folder.h"

namespace gatedyno {
namespace {

using nlohmann::json;

struct Refused {
  const char* pointer;  // What is set in the small node; removed for null.
  json value;
  std::string message;  // After the file's name.
};

// One line for each kind of complaint, and for each part of the node that has
// rules of its own.
std::vector<Refused> RefusedNodes() {
  return {
      // The wrong type.
      {"/width/minimum_m",
       "90n",
       R"(/width/minimum_m: expected number, more than 0, at most 0.001; )"
       R"(got "90n")"},
      {"/supply_v",
       "1.0",
       R"(/supply_v: expected number, more than 0; got "1.0")"},
      {"/mu", true, "/mu: expected number, more than 0; got true"},
      {"/title", 45, "/title: expected string, at least 1 long; got 45"},
      {"/devices/0/subcircuit",
       "yes",
       R"(/devices/0/subcircuit: expected boolean; got "yes")"},
      {"/corners",
       json::object(),
       "/corners: expected array, at least 1 of them; got {}"},
      {"/rails", json::array(), "/rails: expected object; got []"},
      {"/processes/0/parameters",
       {{"vt", "0.1"}},
       R"(/processes/0/parameters/vt: expected number; got "0.1")"},
      // The right type, the wrong value.
      {"/supply_v", 0, "/supply_v: expected number, more than 0; got 0"},
      {"/drawn_length_m",
       45,
       "/drawn_length_m: expected number, more than 0, at most 0.001; got 45"},
      {"/temperature_c",
       -300,
       "/temperature_c: expected number, at least -273.15, at most 1000; got "
       "-300"},
      {"/format",
       "gatedyno-node/2",
       R"(/format: expected the value "gatedyno-node/1"; got )"
       R"("gatedyno-node/2")"},
      {"/devices/1/polarity",
       "q",
       R"(/devices/1/polarity: expected one of ["n","p"]; got "q")"},
      {"/devices/1/model",
       "card p",
       R"(/devices/1/model: expected string, matching )"
       R"("^[A-Za-z_][A-Za-z0-9_.]*$"; got "card p")"},
      {"/corners",
       json::array(),
       "/corners: expected array, at least 1 of them; got []"},
      {"/rails/power",
       {"vdd", "vdd"},
       R"(/rails/power: expected array, at least 1 of them, no two alike; got )"
       R"(["vdd","vdd"])"},
      // Keys.
      {"/mu", nullptr, "/: key 'mu' is missing"},
      {"/width/grid_m", nullptr, "/width: key 'grid_m' is missing"},
      {"/devices/0/names", nullptr, "/devices/0: key 'names' is missing"},
      {"/corners/0/process", nullptr, "/corners/0: key 'process' is missing"},
      {"/width/max_m",
       1e-6,
       "/width: unknown key 'max_m'; known are: grid_m, minimum_m"},
      {"/processes/0/model",
       "x",
       "/processes/0: unknown key 'model'; known are: models, name, "
       "parameters"},
      {"/parameters",
       {{"w unit", 1e-6}},
       "/parameters: unknown key 'w unit'; known are those matching "
       "^[A-Za-z_][A-Za-z0-9_]*$"},
      // What a schema cannot say.
      {"/corners/0/process",
       "slow",
       "/corners/0/process: no process is named 'slow'"},
      {"/devices/1/polarity", "n", R"(/devices: none has polarity "p")"},
      {"/devices/0/polarity", "p", R"(/devices: none has polarity "n")"},
      {"/corners/1",
       SmallNode()["corners"][0],
       "/corners/1/name: 'nominal' is there already"},
      {"/processes/1",
       SmallNode()["processes"][0],
       "/processes/1/name: 'typical' is there already"},
  };
}

TEST(NodeJsonTest, SaysWhatIsWrongAndWhere) {
  NodeFolder folder;
  for (const Refused& refused : RefusedNodes()) {
    json node = SmallNode();
    const json::json_pointer pointer(refused.pointer);
    if (refused.value.is_null()) {
      node[pointer.parent_pointer()].erase(pointer.back());
    } else {
      node[pointer] = refused.value;
    }
    const Result<ProcessNode> loaded = folder.Load(node);
    ASSERT_FALSE(loaded.ok()) << refused.message;
    EXPECT_EQ(loaded.error().kind, ErrorKind::kBadInput);
    EXPECT_EQ(loaded.error().message,
              folder.NodeFile() + ": " + refused.message);
  }
}

TEST(NodeJsonTest, ShortensWhatIsLong) {
  NodeFolder folder;
  json node = SmallNode();
  node["mu"] = std::string(200, 'x');
  EXPECT_EQ(MessageOf(folder.Load(node)),
            folder.NodeFile() + ": /mu: expected number, more than 0; got \"" +
                std::string(59, 'x') + "...");
}

TEST(NodeJsonTest, UnknownKeyOfTheNodeNamesTheKnownOnes) {
  NodeFolder folder;
  json node = SmallNode();
  node["suply_v"] = 1.0;
  EXPECT_EQ(
      MessageOf(folder.Load(node)),
      folder.NodeFile() +
          ": /: unknown key 'suply_v'; known are: $schema, corners, devices, "
          "diffusion, drawn_length_m, fin_width_m, format, mu, name, "
          "option_scale_m, parameters, processes, rails, supply_v, "
          "temperature_c, title, trusted_models, width");
}

TEST(NodeJsonTest, FillsInWhatIsLeftOut) {
  NodeFolder folder;
  const Result<ProcessNode> node = folder.Load(SmallNode());
  ASSERT_TRUE(node.ok()) << node.error().message;
  EXPECT_FALSE(node->trusted_models);
  EXPECT_FALSE(node->fin_width_m.has_value());
  EXPECT_FALSE(node->option_scale_m.has_value());
  EXPECT_TRUE(node->n_body_names.empty());
  EXPECT_DOUBLE_EQ(node->reference_width_m(), node->minimum_width_m);
  const NodeDevice& device = node->device(Polarity::kN);
  EXPECT_FALSE(device.is_subcircuit);
  EXPECT_EQ(device.unit_m, 1.0);
  EXPECT_EQ(device.parameters.width, "w");
  EXPECT_EQ(device.parameters.source_perimeter, "ps");
}

TEST(NodeJsonTest, TakesEverythingGiven) {
  NodeFolder folder;
  json given = SmallNode();
  given["parameters"] = {{"WUNIT", 300e-9}};
  given["fin_width_m"] = 50e-9;
  given["option_scale_m"] = 1e-6;
  given["rails"]["n_body"] = {"VNB"};
  given["devices"][0]["subcircuit"] = true;
  given["devices"][0]["unit_m"] = 1e-6;
  given["devices"][0]["parameters"] = {{"fingers", "ng"}};
  given["processes"][0]["parameters"] = {{"dvt", -0.02}};
  given["processes"][0]["models"][0]["section"] = "tt";
  const Result<ProcessNode> node = folder.Load(given);
  ASSERT_TRUE(node.ok()) << node.error().message;
  EXPECT_DOUBLE_EQ(node->reference_width_m(), 300e-9);
  EXPECT_EQ(node->fin_width_m, 50e-9);
  EXPECT_EQ(node->option_scale_m, 1e-6);
  EXPECT_EQ(node->n_body_names, std::vector<std::string>{"vnb"});
  const NodeDevice& device = node->device(Polarity::kN);
  EXPECT_EQ(device.names, std::vector<std::string>{"nfet"});
  EXPECT_TRUE(device.is_subcircuit);
  EXPECT_EQ(device.unit_m, 1e-6);
  EXPECT_EQ(device.parameters.fingers, "ng");
  EXPECT_EQ(device.parameters.width, "w");
  const Process& process = ProcessOf(*node, node->corners.front());
  EXPECT_EQ(process.parameters.at("dvt"), -0.02);
  EXPECT_EQ(process.models.front().section, "tt");
}

}  // namespace
}  // namespace gatedyno
