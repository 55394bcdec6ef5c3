#include "harness/netlist/supplies.h"

#include <string>
#include <vector>

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "tests/netlist/read_text.h"

namespace gatedyno {
namespace {

using testing::ElementsAre;
using testing::IsEmpty;

std::vector<std::string> NamesOf(const Cell& cell,
                                 const std::vector<NetId>& nets) {
  std::vector<std::string> names;
  names.reserve(nets.size());
  for (const NetId net : nets) {
    names.push_back(cell.net_name(net));
  }
  return names;
}

std::string WithPins(const std::string& pins,
                     const std::string& device = "m1 y a q q nfet w=1u l=1u") {
  return ".subckt c " + pins + "\n" + device + "\n.ends\n";
}

TEST(Supplies, AreRecognisedByName) {
  const Cell cell = ReadOne(WithPins("vpb VDD a Gnd y VNB"));
  EXPECT_EQ(cell.net_name(cell.power), "VDD");
  EXPECT_EQ(cell.net_name(cell.ground), "Gnd");
  EXPECT_THAT(NamesOf(cell, cell.bodies), ElementsAre("vpb", "VNB"));
  EXPECT_THAT(NamesOf(cell, cell.pins),
              ElementsAre("vpb", "VDD", "a", "Gnd", "y", "VNB"));
}

TEST(Supplies, ARailThatIsAlsoABodyNameIsARail) {
  EXPECT_THAT(ReadOne(WithPins("a y vdd vss")).bodies, IsEmpty());
}

TEST(Supplies, MissingOnesAreErrors) {
  EXPECT_EQ(ComplaintAbout(WithPins("a y vss")),
            Worded(1,
                   9,
                   "cell 'c' has no power pin: recognised are vdd",
                   ".subckt c a y vss"));
  EXPECT_EQ(ComplaintAbout(WithPins("a y vdd")),
            Worded(1,
                   9,
                   "cell 'c' has no ground pin: recognised are vss, gnd, 0",
                   ".subckt c a y vdd"));
}

TEST(Supplies, TwoOfOneKindAreAnError) {
  EXPECT_EQ(ComplaintAbout(WithPins("a y vdd vss gnd")),
            Worded(1,
                   9,
                   "cell 'c' has two ground pins, 'vss' and 'gnd'",
                   ".subckt c a y vdd vss gnd"));
}

TEST(Supplies, NetZeroIsTheGroundWhereNoPinIs) {
  const Cell cell = ReadOne(WithPins("a y vdd", "m1 y a 0 0 nfet w=1u l=1u"));
  EXPECT_EQ(cell.net_name(cell.ground), "0");
  EXPECT_THAT(NamesOf(cell, cell.pins), ElementsAre("a", "y", "vdd", "0"));
  EXPECT_THAT(cell.warnings, IsEmpty());
}

TEST(Supplies, NetZeroJoinsTheGroundPin) {
  const Cell cell = ReadOne(WithPins(
      "a y vdd vss", "r1 0 n 1\nc1 n 0 1f\nm1 n a vss 0 nfet w=1u l=1u"));
  EXPECT_THAT(cell.nets, ElementsAre("a", "y", "vdd", "vss", "n"));
  EXPECT_EQ(cell.net_name(cell.mosfets[0].body), "vss");
  EXPECT_EQ(cell.net_name(cell.mosfets[0].drain), "n");
  EXPECT_EQ(cell.net_name(cell.resistors[0].a), "vss");
  EXPECT_EQ(cell.net_name(cell.resistors[0].b), "n");
  EXPECT_EQ(cell.net_name(cell.capacitors[0].a), "n");
  EXPECT_EQ(cell.net_name(cell.capacitors[0].b), "vss");
  EXPECT_THAT(cell.warnings,
              ElementsAre("net 0 is taken as the ground pin 'vss'"));
}

TEST(Supplies, NetZeroNeedsTheNodesConsent) {
  ReaderOptions options = TestOptions();
  options.ground_names = {"vss"};
  EXPECT_EQ(
      ComplaintAbout(WithPins("a y vdd vss", "m1 y a vss 0 nfet w=1u l=1u"),
                     options),
      Worded(1,
             9,
             "cell 'c' uses net 0, which is no ground of this node: "
             "recognised are vss",
             ".subckt c a y vdd vss"));
}

}  // namespace
}  // namespace gatedyno
