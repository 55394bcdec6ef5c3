#include "harness/node/process_node.h"

#include <algorithm>
#include <set>
#include <string>

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "harness/node/model_check.h"
#include "tests/node/node_folder.h"

namespace gatedyno {
namespace {

using ::testing::ElementsAre;

TEST(ProcessNodeTest, EveryBuiltInNodeLoads) {
  const std::vector<std::string> names = BuiltInNodes();
  EXPECT_THAT(names, ElementsAre("p130", "p180", "p45", "p65"));
  for (const std::string& name : names) {
    const Result<ProcessNode> node = LoadNode(name);
    ASSERT_TRUE(node.ok()) << node.error().message;
    EXPECT_EQ(node->name, name);
    EXPECT_FALSE(node->trusted_models) << name;
    // Nominal first: it is the default.
    EXPECT_EQ(node->corners.front().supply_v, node->supply_v) << name;
    EXPECT_EQ(node->corners.front().temperature_c, node->temperature_c);
    EXPECT_TRUE(ModelsFingerprint(node->processes.front()).ok());
  }
}

TEST(ProcessNodeTest, UnknownNodeNamesTheBuiltInOnes) {
  EXPECT_EQ(MessageOf(LoadNode("p40")),
            "node 'p40': neither a built-in node (p130, p180, p45, p65) nor a "
            "file");
}

TEST(ProcessNodeTest, UnknownCornerNamesTheOnesThereAre) {
  NodeFolder folder;
  nlohmann::json json = SmallNode();
  json["corners"][1] = json["corners"][0];
  json["corners"][1]["name"] = "hot";
  const Result<ProcessNode> node = folder.Load(json);
  ASSERT_TRUE(node.ok()) << node.error().message;
  EXPECT_EQ(FindCorner(*node, "hot")->name, "hot");
  EXPECT_EQ(MessageOf(FindCorner(*node, "cold")),
            "unknown corner 'cold': node small has nominal, hot");
}

TEST(ProcessNodeTest, NodeFileMayBeRelativeAndHaveBlanksInItsPath) {
  NodeFolder folder;
  folder.Write("a b/node c.json", SmallNode().dump());
  folder.Write("a b/cards.sp", kCards);
  const auto before = std::filesystem::current_path();
  std::filesystem::current_path(folder.path());
  const Result<ProcessNode> node = LoadNode("a b/node c.json");
  std::filesystem::current_path(before);
  ASSERT_TRUE(node.ok()) << node.error().message;
  EXPECT_EQ(node->processes[0].models[0].path, folder.path() / "a b/cards.sp");
}

TEST(ProcessNodeTest, MissingModelFileIsNamed) {
  NodeFolder folder;
  nlohmann::json json = SmallNode();
  json["processes"][0]["models"][0]["file"] = "none.sp";
  EXPECT_EQ(MessageOf(folder.Load(json)),
            (folder.path() / "none.sp").string() +
                ": cannot be read: No such file or directory");
}

TEST(ProcessNodeTest, ReaderGetsEveryNameOfEveryDevice) {
  NodeFolder folder;
  nlohmann::json json = SmallNode();
  json["devices"][0]["names"] = {"NFET", "nfet_lvt"};
  json["rails"]["n_body"] = {"vnb"};
  json["rails"]["p_body"] = {"VPB"};
  const Result<ProcessNode> node = folder.Load(json);
  ASSERT_TRUE(node.ok()) << node.error().message;
  const ReaderOptions options = ReaderOptionsOf(*node);
  std::vector<std::string> names;
  for (const DeviceName& device : options.devices) {
    names.push_back(device.name);
  }
  EXPECT_THAT(names, ElementsAre("nfet", "nfet_lvt", "pfet"));
  EXPECT_THAT(options.body_names, ElementsAre("vnb", "vpb"));
  EXPECT_THAT(options.power_names, ElementsAre("vdd"));
  EXPECT_EQ(options.default_length_m, 100e-9);
}

}  // namespace
}  // namespace gatedyno
