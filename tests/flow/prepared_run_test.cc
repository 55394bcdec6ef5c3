#include "harness/flow/prepared_run.h"

#include <filesystem>
#include <string>
#include <vector>

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "tests/node/node_folder.h"

namespace gatedyno {
namespace {

using ::testing::ElementsAre;

Plan PlanFor(const std::string& cell) {
  Plan plan;
  plan.node = "p45";
  plan.cells = {cell};
  return plan;
}

std::vector<std::string> CornersOf(const std::vector<std::string>& patterns) {
  Plan plan = PlanFor("inv");
  plan.corners = patterns;
  const Result<PreparedRun> run = PrepareRun(plan);
  if (!run.ok()) {
    return {run.error().message};
  }
  std::vector<std::string> names;
  for (const Corner& corner : run->corners) {
    names.push_back(corner.name);
  }
  return names;
}

TEST(PreparedRunTest, CornersComeInTheNodesOrderEachOnce) {
  EXPECT_THAT(CornersOf({}), ElementsAre("typical"));
  EXPECT_THAT(
      CornersOf({"slow_nom_*", "typical", "slow_nom_25"}),
      ElementsAre("typical", "slow_nom_m40", "slow_nom_25", "slow_nom_125"));
  EXPECT_EQ(CornersOf({"*"}).size(), LoadNode("p45")->corners.size());
}

TEST(PreparedRunTest, NodeMayLieBesideThePlan) {
  NodeFolder folder;
  folder.Write("node.json", SmallNode().dump());
  Plan plan = PlanFor("own.sp");
  plan.node = "node.json";
  plan.folder = folder.path();
  folder.Write("own.sp",
               ".subckt own a y vdd vss\n"
               "mp y a vdd vdd pfet w=500n\n"
               "mn y a vss vss nfet w=200n\n"
               ".ends\n");
  const Result<PreparedRun> run = PrepareRun(plan);
  ASSERT_TRUE(run.ok()) << run.error().message;
  EXPECT_EQ(run->node.name, "small");
  ASSERT_EQ(run->estimates.size(), 1U);
  EXPECT_EQ(run->estimates[0].cell, "own");
  // mu is the node's, and so is the length.
  EXPECT_NEAR(run->estimates[0].arcs[0].estimate.effort, 1.0, 1e-12);
  EXPECT_EQ(run->cells[0].mosfets[0].length_m, 100e-9);
  EXPECT_THAT(run->warnings, ElementsAre());
}

struct Widths {
  const char* n;
  const char* p;
  std::vector<std::string> warnings;
};

// The 5 nm grid and 90 nm minimum of p45, mu = 2.
TEST(PreparedRunTest, WarnsOfWidthsTheNodeCannotMake) {
  const std::vector<Widths> cases = {
      {"90n", "180n", {}},
      {"95n", "190n", {}},
      {"93n",
       "186n",
       // g of a fall is (Wp + Wn) / 3 / Wn: 278 / 279 with Wp rounded, 281 /
       // 285 with Wn.
       {"own: mp w=186n is off the 5 nm grid: rounded to 185n, g(a, fall) "
        "1.000 -> 0.996",
        "own: mn w=93n is off the 5 nm grid: rounded to 95n, g(a, fall) 1.000 "
        "-> 0.986"}},
      {"60n", "120n", {"own: mn w=60n is below the node's minimum, 90n"}},
  };
  for (const Widths& tried : cases) {
    NodeFolder folder;
    folder.Write(
        "own.sp",
        std::string(".subckt own a y vdd vss\nmp y a vdd vdd pfet w=") +
            tried.p + "\nmn y a vss vss nfet w=" + tried.n + "\n.ends\n");
    Plan plan = PlanFor("own.sp");
    plan.folder = folder.path();
    const Result<PreparedRun> run = PrepareRun(plan);
    ASSERT_TRUE(run.ok()) << run.error().message;
    EXPECT_EQ(run->warnings, tried.warnings) << tried.n;
  }
}

TEST(PreparedRunTest, UnknownCornerNamesTheNodes) {
  NodeFolder folder;
  folder.Write("node.json", SmallNode().dump());
  Plan plan = PlanFor("inv");
  plan.node = folder.NodeFile();
  plan.corners = {"nominal", "slow*"};
  const Result<PreparedRun> run = PrepareRun(plan);
  ASSERT_FALSE(run.ok());
  EXPECT_EQ(run.error().message,
            "unknown corner 'slow*': node small has nominal");
}

}  // namespace
}  // namespace gatedyno
