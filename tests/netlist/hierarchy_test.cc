#include "harness/netlist/hierarchy.h"

#include <string>

#include <fmt/format.h>
#include <gtest/gtest.h>

#include "tests/netlist/read_text.h"

namespace gatedyno {
namespace {

TEST(Hierarchy, RefusesASubcircuitThatContainsItself) {
  const std::string call = "x1 a y vdd vss c";
  EXPECT_EQ(ComplaintAbout(Around(call)),
            Worded(2, 16, "subcircuit 'c' contains itself", call));
  EXPECT_EQ(ComplaintAbout(".subckt p a\nx1 a q\n.ends\n"
                           ".subckt q a\nx1 a P\n.ends\n" +
                           InverterAround("")),
            Worded(5, 6, "subcircuit 'P' contains itself", "x1 a P"));
}

std::string Inner(const std::string& header = "") {
  return fmt::format(
      ".subckt inner a y vdd vss {}\nm1 y a vss vss nfet w=1u l=1u\n.ends\n",
      header);
}

TEST(Hierarchy, CountsNets) {
  const std::string few = "x1 a y vdd inner";
  EXPECT_EQ(ComplaintAbout(Around(few) + Inner()),
            Worded(2,
                   12,
                   "subcircuit 'inner' has 4 pins (a y vdd vss), got 3 nets",
                   few));
  const std::string many = "x1 a y vdd vss vss inner";
  EXPECT_EQ(ComplaintAbout(Around(many) + Inner()),
            Worded(2,
                   20,
                   "subcircuit 'inner' has 4 pins (a y vdd vss), got 5 nets",
                   many));
}

TEST(Hierarchy, RefusesUnknownOverrides) {
  const std::string call = "x1 a y vdd vss inner wp=1u";
  EXPECT_EQ(
      ComplaintAbout(Around(call) + Inner("wn=1u")),
      Worded(2, 22, "unknown parameter 'wp' of subcircuit 'inner'", call));
}

std::string Chain(int levels) {
  std::string text;
  for (int i = 0; i < levels; ++i) {
    text += fmt::format(
        ".subckt s{} a y vdd vss\nx1 a y vdd vss s{}\n.ends\n", i, i + 1);
  }
  return text + fmt::format(
                    ".subckt s{} a y vdd vss\nm1 y a vss vss nfet w=1u l=1u\n"
                    ".ends\n",
                    levels);
}

TEST(Hierarchy, LimitsNesting) {
  EXPECT_EQ(ReadOne(Chain(32)).mosfets.size(), 1U);
  for (const int levels : {33, 5'000}) {
    const std::string complaint = ComplaintAbout(Chain(levels));
    EXPECT_NE(complaint.find("instances nested more than 32 deep"),
              std::string::npos)
        << complaint;
  }
}

// The order of definitions must not decide: heights already known count.
TEST(Hierarchy, LimitsNestingOfKnownSubcircuits) {
  const std::string complaint = ComplaintAbout(
      Chain(32) + ".subckt top a y vdd vss\nx1 a y vdd vss s0\n.ends\n");
  EXPECT_EQ(
      complaint,
      Worded(
          101, 16, "instances nested more than 32 deep", "x1 a y vdd vss s0"));
}

}  // namespace
}  // namespace gatedyno
