// What AnalyseNetwork finds, and every complaint in full.

#include "harness/network/analysis.h"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "tests/network/bad_cell.h"
#include "tests/support/gates.h"

namespace gatedyno {
namespace {

std::vector<BadCell> NotComplementary() {
  return {
      {"pull-up in parallel, pull-down in parallel",
       TwoInputs()
           .N("m1", "y", "a", "vss", 1)
           .N("m2", "y", "b", "vss", 1)
           .P("m3", "y", "a", "vdd", 2)
           .P("m4", "y", "b", "vdd", 2)
           .Build(),
       "bad.sp:1:1: cell 'bad': output y is shorted at a=1 b=0: both pull-up "
       "and pull-down conduct; networks are not complementary"},
      {"both in series",
       TwoInputs()
           .N("m1", "y", "a", "n1", 2)
           .N("m2", "n1", "b", "vss", 2)
           .P("m3", "y", "a", "n2", 4)
           .P("m4", "n2", "b", "vdd", 4)
           .Build(),
       "bad.sp:1:1: cell 'bad': output y floats at a=1 b=0: neither pull-up "
       "nor pull-down conducts; networks are not complementary"},
      {"an inner net of a cell with two stages",
       Start({"a", "b", "y", "vdd", "vss"})
           .N("m1", "x", "a", "n1", 2)
           .N("m2", "n1", "b", "vss", 2)
           .P("m3", "x", "a", "n2", 4)
           .P("m4", "n2", "b", "vdd", 4)
           .Inverter("x", "y", 1, 2)
           .Build(),
       "bad.sp:1:1: cell 'bad': net x floats at a=1 b=0: neither pull-up nor "
       "pull-down conducts; networks are not complementary"},
      {"a NAND2 without one PMOS",
       TwoInputs()
           .N("m1", "y", "a", "n1", 2)
           .N("m2", "n1", "b", "vss", 2)
           .P("m3", "y", "a", "vdd", 2)
           .Build(),
       "bad.sp:1:1: cell 'bad': output y floats at a=1 b=0: neither pull-up "
       "nor pull-down conducts; networks are not complementary (the shape of "
       "a dynamic gate, a kind not estimated)"},
      {"an output pulled one way only",
       Start({"a", "y", "vdd", "vss"}).N("m1", "y", "a", "vss", 1).Build(),
       "bad.sp:1:1: cell 'bad': output y floats at a=0: neither pull-up nor "
       "pull-down conducts; networks are not complementary"},
  };
}

std::vector<BadCell> BadPins() {
  return {
      {"a pin on nothing",
       TwoInputs().Inverter("a", "y", 1, 2).Build(),
       "bad.sp:1:1: cell 'bad': pin b is never used"},
      {"no output",
       Start({"a", "vdd", "vss"})
           .N("m1", "x", "a", "vss", 1)
           .P("m2", "x", "a", "vdd", 2)
           .Build(),
       "bad.sp:1:1: cell 'bad': has no output: its devices drive no pin"},
      {"no ground",
       Start({"a", "y", "vdd"}).P("m1", "y", "a", "vdd", 1).Build(),
       "bad.sp:1:1: cell 'bad': has no ground pin"},
      {"no power supply",
       Start({"a", "y", "vss"}).N("m1", "y", "a", "vss", 1).Build(),
       "bad.sp:1:1: cell 'bad': has no power supply pin"},
      {"a gate on nothing",
       Start({"a", "y", "vdd", "vss"})
           .Inverter("a", "y", 1, 2)
           .N("m3", "y", "q", "vss", 1)
           .Build(),
       "bad.sp:4:1: cell 'bad': nothing drives q, the gate of m3"},
      {"thirteen inputs",
       NandCell(13, 13, 2),
       "nand13.sp:1:1: cell 'nand13': has 13 inputs: at most 12 can be "
       "analysed"},
  };
}

std::vector<BadCell> BadWiring() {
  return {
      {"a ring of two inverters",
       Start({"s", "y", "vdd", "vss"})
           .Inverter("y", "q", 1, 2)
           .Inverter("q", "y", 1, 2)
           .N("m5", "q", "s", "vss", 1)
           .Build(),
       "bad.sp:1:1: cell 'bad': feedback through nets y, q: cells with "
       "feedback are not estimated"},
      {"an output that gates its own group",
       Start({"a", "y", "vdd", "vss"})
           .Inverter("a", "y", 1, 2)
           .P("m3", "y", "y", "vdd", 1)
           .Build(),
       "bad.sp:1:1: cell 'bad': feedback through net y: cells with feedback "
       "are not estimated"},
      {"groups before and behind a ring are not named",
       Start({"a", "y", "vdd", "vss"})
           .Inverter("a", "an", 1, 2)
           .N("m1", "q", "an", "vss", 1)
           .Inverter("r", "q", 1, 2)
           .Inverter("q", "r", 1, 2)
           .Inverter("q", "y", 1, 2)
           .Build(),
       "bad.sp:1:1: cell 'bad': feedback through nets q, r: cells with "
       "feedback are not estimated"},
      {"a device across the supplies",
       Start({"a", "y", "vdd", "vss"})
           .Inverter("a", "y", 1, 2)
           .N("m3", "vdd", "a", "vss", 1)
           .Build(),
       "bad.sp:4:1: cell 'bad': m3 joins the supplies when it conducts"},
      {"a resistive load",
       Start({"a", "y", "vdd", "vss"})
           .N("m1", "y", "a", "vss", 1)
           .R("r1", "y", "x", 1e3)
           .R("r2", "x", "vdd", 1e3)
           .Build(),
       "bad.sp:4:1: cell 'bad': resistor r2 joins the pins y and vdd: "
       "resistive loads are not estimated"},
  };
}

TEST(AnalyseNetworkTest, NetworksThatAreNotComplementary) {
  ExpectMessages(NotComplementary());
}
TEST(AnalyseNetworkTest, Pins) {
  ExpectMessages(BadPins());
}
TEST(AnalyseNetworkTest, Wiring) {
  ExpectMessages(BadWiring());
}

std::vector<std::string> NamesOf(const Cell& cell,
                                 const std::vector<NetId>& nets) {
  std::vector<std::string> names;
  names.reserve(nets.size());
  for (const NetId net : nets) {
    names.push_back(cell.net_name(net));
  }
  return names;
}

TEST(AnalyseNetworkTest, SortsOutPins) {
  // An output that gates another stage is an output still; wells are neither.
  CellBuilder builder("buf");
  const Cell cell = builder.Pins({"y", "x", "a", "vdd", "vss"})
                        .Body("vnw")
                        .Inverter("a", "x", 1, 2)
                        .Inverter("x", "y", 1, 2)
                        .Build();
  const auto analysis = AnalyseNetwork(cell);
  ASSERT_TRUE(analysis.ok()) << analysis.error().message;
  EXPECT_THAT(NamesOf(cell, analysis->inputs), testing::ElementsAre("a"));
  EXPECT_THAT(NamesOf(cell, analysis->outputs), testing::ElementsAre("y", "x"));
  // The group of x comes first: it gates the group of y.
  ASSERT_EQ(analysis->groups.size(), 2U);
  EXPECT_THAT(NamesOf(cell, analysis->groups[0].outputs),
              testing::ElementsAre("x"));
  EXPECT_THAT(NamesOf(cell, analysis->groups[1].gates),
              testing::ElementsAre("x"));
  EXPECT_EQ(LongestWay(analysis->groups), 2);
}

TEST(AnalyseNetworkTest, TwelveInputsAreAnalysed) {
  EXPECT_TRUE(AnalyseNetwork(NandCell(12, 12, 2)).ok());
}

}  // namespace
}  // namespace gatedyno
