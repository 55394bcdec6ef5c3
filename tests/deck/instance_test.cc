#include "harness/deck/instance.h"

#include <string>

#include <gtest/gtest.h>

#include "tests/deck/test_bench.h"
#include "tests/support/cell_builder.h"

namespace gatedyno {
namespace {

// A pull-down with a well, a wire and an inner net.
Cell TestCell() {
  Cell cell = CellBuilder("cell")
                  .Pins({"a", "y", "vdd", "vss"})
                  .Body("vpb")
                  .Body("vnb")
                  .N("n1", "y", "a", "x", 2)
                  .N("n2", "x", "a", "vss", 2)
                  .P("p1", "y", "a", "vdd", 4)
                  .R("r1", "y", "x", 100)
                  .C("c1", "x", "vss", 2e-15)
                  .Build();
  for (Mosfet& mosfet : cell.mosfets) {
    mosfet.model = mosfet.polarity == Polarity::kN ? "nfet" : "pfet";
    mosfet.body = mosfet.polarity == Polarity::kN ? 5 : 4;
  }
  return cell;
}

ProcessNode TestNode() {
  ProcessNode node = NodeP45();
  node.p_body_names = {"vpb"};
  node.n_body_names = {"vnb"};
  return node;
}

std::string LinesOf(const Cell& cell,
                    const ProcessNode& node,
                    double copies = 1.0) {
  return CellWriter(cell, node)
      .Lines({.prefix = "d", .nets = {{0, "in"}}, .copies = copies});
}

TEST(InstanceTest, JoinsSuppliesAndWellsAndPrefixesTheRest) {
  EXPECT_EQ(
      LinesOf(TestCell(), TestNode()),
      "md_1 d_n1 in d_n6 0 p45_n w=2e-07 l=5e-08 ad=2e-14 as=7e-15 pd=6e-07 "
      "ps=2.7e-07 m=1\n"
      "md_2 d_n6 in 0 0 p45_n w=2e-07 l=5e-08 ad=7e-15 as=2e-14 pd=2.7e-07 "
      "ps=6e-07 m=1\n"
      "md_3 d_n1 in vpwr vpwr p45_p w=4e-07 l=5e-08 ad=4e-14 as=4e-14 pd=1e-06 "
      "ps=1e-06 m=1\n"
      "rd_4 d_n1 d_n6 100\n"
      "cd_5 d_n6 0 2e-15\n");
}

TEST(InstanceTest, CopiesMultiplyDevicesAndCapacitorsDivideResistors) {
  Cell cell = TestCell();
  cell.mosfets[0].multiplicity = 3;
  const std::string lines = LinesOf(cell, TestNode(), 2.5);
  EXPECT_NE(lines.find("md_1 d_n1 in d_n6 0 p45_n w=2e-07 l=5e-08 ad=2e-14 "
                       "as=2e-14 pd=6e-07 ps=6e-07 m=7.5\n"),
            std::string::npos)
      << lines;
  EXPECT_NE(lines.find(" m=2.5\nrd_4 d_n1 d_n6 40\n"), std::string::npos)
      << lines;
  EXPECT_NE(lines.find("cd_5 d_n6 0 5e-15\n"), std::string::npos) << lines;
}

// A node whose NMOS is a subcircuit, counted in micrometres.
ProcessNode KitNode() {
  ProcessNode node = TestNode();
  NodeDevice& device = node.devices.front();
  device.is_subcircuit = true;
  device.model = "kit_nfet";
  device.unit_m = 1e-6;
  device.parameters.fingers = "ng";
  return node;
}

TEST(InstanceTest, WritesDevicesAsTheNodeSpellsThem) {
  Cell cell = TestCell();
  cell.mosfets[1].fingers = 2;
  const std::string lines = LinesOf(cell, KitNode());
  EXPECT_NE(lines.find("xd_2 d_n6 in 0 0 kit_nfet w=0.2 l=0.05 ng=2 ad=0.01 "
                       "as=0.02 pd=0.4 ps=0.8\n"),
            std::string::npos)
      << lines;
}

// The line of a subcircuit takes no multiplicity: the current of one copy is
// drawn as often as there are more.
TEST(InstanceTest, CopiesOfSubcircuitsAreTapped) {
  Cell cell = CellBuilder("cell")
                  .Pins({"a", "y", "vdd", "vss"})
                  .N("n1", "y", "a", "vss", 2)
                  .Build();
  cell.mosfets[0].model = "nfet";
  EXPECT_EQ(LinesOf(cell, KitNode(), 3.5),
            "vd_1 in d_t1 0\n"
            "fd_1 in 0 vd_1 2.5\n"
            "xd_2 d_n1 d_t1 0 0 kit_nfet w=0.2 l=0.05 ad=0.02 as=0.02 pd=0.6 "
            "ps=0.6\n");
  cell.mosfets[0].multiplicity = 2;
  EXPECT_EQ(LinesOf(cell, KitNode()),
            "vd_1 d_n1 d_t1 0\n"
            "fd_1 d_n1 0 vd_1 1\n"
            "vd_2 in d_t2 0\n"
            "fd_2 in 0 vd_2 1\n"
            "xd_3 d_t1 d_t2 0 0 kit_nfet w=0.2 l=0.05 ad=0.02 as=0.02 pd=0.6 "
            "ps=0.6\n");
}

}  // namespace
}  // namespace gatedyno
