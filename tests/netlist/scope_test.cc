#include "harness/netlist/scope.h"

#include <string>

#include <fmt/format.h>
#include <gtest/gtest.h>

#include "tests/netlist/read_text.h"

namespace gatedyno {
namespace {

// The width, in micrometres, of the one device of a cell with these globals.
double WidthUnder(const std::string& globals, const std::string& line) {
  const Cell cell = ReadOne(globals + Around(line));
  return cell.mosfets.empty() ? 0.0 : cell.mosfets[0].width_m * 1e6;
}

TEST(Scope, DefinitionsMayStandInAnyOrder) {
  EXPECT_DOUBLE_EQ(WidthUnder(".param a={2*b} b={c+1u}\n.param c=1u\n",
                              "m1 y a vss vss nfet w=a l=1u"),
                   4.0);
}

TEST(Scope, TheSubcktHidesTheFile) {
  EXPECT_DOUBLE_EQ(WidthUnder(".param wn=1u wp={2*wn}\n",
                              ".param wn=5u\n"
                              "m1 y a vss vss nfet w={wn+wp} l=1u"),
                   7.0);
}

// Nobody would see what a parameter of the caller does inside.
TEST(Scope, TheCallerIsNotVisible) {
  const std::string text =
      ".subckt top a y vdd vss wn=2u\n"
      "x1 a y vdd vss inner\n"
      ".ends\n"
      ".subckt inner a y vdd vss\n"
      "m1 y a vss vss nfet w=wn l=1u\n"
      ".ends\n";
  EXPECT_EQ(ComplaintAbout(text),
            Worded(5,
                   23,
                   "unknown parameter 'wn': known here are lgate, wunit (in "
                   "x1)",
                   "m1 y a vss vss nfet w=wn l=1u"));
}

TEST(Scope, RefusesADefinitionByItself) {
  EXPECT_EQ(
      ComplaintAbout(".param a={2*b}\n.param b={a}\n" + Around("")),
      Worded(2, 11, "parameter 'a' is defined by itself", ".param b={a}"));
  const std::string header = ".subckt c a y vdd vss wn=wn";
  EXPECT_EQ(ComplaintAbout(header + "\n.ends\n"),
            Worded(1, 26, "parameter 'wn' is defined by itself", header));
}

TEST(Scope, ChecksWhatNothingUses) {
  EXPECT_EQ(ComplaintAbout(".param a={1/0}\n" + InverterAround("")),
            Worded(1, 12, "division by zero", ".param a={1/0}"));
  EXPECT_EQ(ComplaintAbout(InverterAround(".param a={bb}")),
            Worded(2,
                   11,
                   "unknown parameter 'bb': known here are a, lgate, wunit",
                   ".param a={bb}"));
}

TEST(Scope, LimitsChains) {
  std::string text;
  for (int i = 0; i < 5'000; ++i) {
    text += fmt::format(".param p{}={{p{}}}\n", i, i + 1);
  }
  const std::string complaint =
      ComplaintAbout(text + ".param p5000=1\n" + Around(""));
  EXPECT_NE(complaint.find("a chain of more than 200 parameters defined by "
                           "parameters"),
            std::string::npos)
      << complaint;
}

TEST(Scope, DoesNotListADozenNames) {
  std::string text;
  for (int i = 0; i < 11; ++i) {
    text += fmt::format(".param p{}=1\n", i);
  }
  const std::string line = "m1 y a vss vss nfet w=q l=1u";
  EXPECT_EQ(ComplaintAbout(text + Around(line)),
            Worded(13, 23, "unknown parameter 'q'", line));
}

}  // namespace
}  // namespace gatedyno
