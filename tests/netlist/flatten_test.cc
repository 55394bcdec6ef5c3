#include "harness/netlist/flatten.h"

#include <string>
#include <vector>

#include <fmt/format.h>
#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "tests/netlist/read_text.h"

namespace gatedyno {
namespace {

using testing::ElementsAre;

constexpr const char* kInv =
    ".subckt inv in out vdd vss wn=1u\n"
    "mp out in vdd vdd pfet w={2*wn} l=45n\n"
    "mn out in vss vss nfet w=wn l=45n\n"
    "r1 out in 100\n"
    "c1 out in 8f m=2\n"
    ".ends\n";

std::string Top(const std::string& lines) {
  return ".subckt top a y vdd vss\n" + lines + ".ends\n";
}

TEST(Flatten, NamesDevicesAndNetsByTheirPath) {
  const Cell cell = ReadOne(std::string(kInv) +
                            ".subckt two a y vdd vss\n"
                            "X1 a Mid vdd vss inv\n"
                            "X2 mid y vdd vss INV\n"
                            ".ends\n" +
                            Top("xa a n vdd vss two\nxb n y vdd vss two\n"));
  EXPECT_EQ(cell.name, "top");
  EXPECT_THAT(cell.nets,
              ElementsAre("a", "y", "vdd", "vss", "n", "xa.Mid", "xb.Mid"));
  ASSERT_EQ(cell.mosfets.size(), 8U);
  EXPECT_EQ(cell.mosfets[0].name, "xa.X1.mp");
  EXPECT_EQ(cell.mosfets[7].name, "xb.X2.mn");
  EXPECT_EQ(cell.net_name(cell.mosfets[7].gate), "xb.Mid");
  EXPECT_EQ(cell.net_name(cell.mosfets[7].drain), "y");
  EXPECT_EQ(cell.mosfets[7].place.line, 3);
  EXPECT_EQ(cell.resistors[3].name, "xb.X2.r1");
  EXPECT_EQ(cell.capacitors[3].name, "xb.X2.c1");
}

TEST(Flatten, PassesParameters) {
  const Cell cell =
      ReadOne(std::string(kInv) +
              ".subckt pair a y vdd vss w=3u\n.param half={w/2}\n"
              "x1 a n vdd vss inv wn={half}\n"
              "x2 n y vdd vss inv params: WN=w\n.ends\n" +
              Top("x1 a n vdd vss pair w=10u\nx2 n m vdd vss pair\n"
                  "x3 m y vdd vss inv\n"));
  std::vector<double> widths_um;
  for (const Mosfet& mosfet : cell.mosfets) {
    if (mosfet.polarity == Polarity::kN) {
      widths_um.push_back(mosfet.width_m * 1e6);
    }
  }
  EXPECT_THAT(widths_um,
              ElementsAre(testing::DoubleEq(5),
                          testing::DoubleEq(10),
                          testing::DoubleEq(1.5),
                          testing::DoubleEq(3),
                          testing::DoubleEq(1)));
}

// The check that ngspice's own m= on X lines fails in some forms.
TEST(Flatten, MultipliesEverythingInside) {
  const Cell cell =
      ReadOne(std::string(kInv) +
              ".subckt pair a y vdd vss\nx1 a y vdd vss inv m=2\n.ends\n" +
              Top("x1 a y vdd vss pair m={1.5*2}\n"));
  ASSERT_EQ(cell.mosfets.size(), 2U);
  EXPECT_DOUBLE_EQ(cell.mosfets[0].multiplicity, 6.0);
  EXPECT_DOUBLE_EQ(cell.mosfets[0].width_m, 2e-6);
  EXPECT_DOUBLE_EQ(cell.mosfets[0].total_width_m(), 12e-6);
  EXPECT_DOUBLE_EQ(cell.resistors[0].resistance_ohm, 100.0 / 6.0);
  EXPECT_DOUBLE_EQ(cell.capacitors[0].capacitance_f, 6.0 * 2.0 * 8e-15);
}

std::string Wrapper(const std::string& device_parameters) {
  return fmt::format(
      ".subckt wrap d g s b w=1u m=1\nm1 d g s b nfet w=w l=45n {}\n.ends\n",
      device_parameters);
}

TEST(Flatten, ADeclaredMultiplicityIsAParameter) {
  const Cell cell =
      ReadOne(Wrapper("m={2*m}") + Top("x1 y a vss vss wrap m=4\n"));
  EXPECT_DOUBLE_EQ(cell.mosfets[0].multiplicity, 8.0);
}

TEST(Flatten, ADeclaredMultiplicityMayNotGetLost) {
  const std::string call = "x1 y a vss vss wrap m=4";
  EXPECT_EQ(ComplaintAbout(Top(call + "\n") + Wrapper("")),
            Worded(2,
                   21,
                   "subcircuit 'wrap' declares m and does not use it: the "
                   "copies would be lost",
                   call));
}

TEST(Flatten, SaysInWhichInstance) {
  const std::string bad = "mn out in vss vss nfet w=wn l=45n";
  const std::string text =
      std::string(kInv) +
      ".subckt pair a y vdd vss\nx1 a y vdd vss inv wn=-1u\n.ends\n" +
      Top("xp a y vdd vss pair\n");
  // The PMOS comes first: 2*wn.
  EXPECT_EQ(ComplaintAbout(text),
            Worded(2,
                   24,
                   "expected a width in metres, above zero, got 'w={2*wn}' = "
                   "-2e-06 (in xp.x1)",
                   "mp out in vdd vdd pfet w={2*wn} l=45n"));
  const std::string call = "x1 a y vdd vss inv wn={wx}";
  EXPECT_EQ(
      ComplaintAbout(std::string(kInv) + Top(call + "\n")),
      Worded(
          8, 24, "unknown parameter 'wx': known here are lgate, wunit", call));
  EXPECT_EQ(ComplaintAbout(std::string(kInv) + Top("x1 a y vdd vss inv m=0\n")),
            Worded(8,
                   20,
                   "expected a multiplicity, above zero, got 'm=0'",
                   "x1 a y vdd vss inv m=0"));
}

TEST(Flatten, RefusesNamesThatMeet) {
  const std::string text = std::string(kInv) +
                           ".subckt pair a y vdd vss\nx1 a n vdd vss inv\n"
                           "x2 n y vdd vss inv\n.ends\n";
  EXPECT_EQ(ComplaintAbout(text + Top("r1 x1.n y 1\nx1 a y vdd vss pair\n")),
            Worded(8,
                   1,
                   "two nets come to the name 'x1.n' (in x1)",
                   "x1 a n vdd vss inv"));
  EXPECT_EQ(ComplaintAbout(text +
                           Top("x1.x1 a y vdd vss inv\nx1 a y vdd vss pair\n")),
            Worded(2,
                   1,
                   "two devices come to the name 'x1.x1.mp' (in x1.x1)",
                   "mp out in vdd vdd pfet w={2*wn} l=45n"));
}

TEST(Flatten, NetZeroIsOneNetEverywhere) {
  const Cell cell = ReadOne(
      ".subckt pull a y\nmn y a 0 0 nfet w=1u l=45n\n.ends\n"
      ".subckt top a y vdd\nx1 a y pull\nx2 a y pull\n.ends\n");
  EXPECT_THAT(cell.nets, ElementsAre("a", "y", "vdd", "0"));
}

TEST(Flatten, RefusesACellWithoutTransistors) {
  EXPECT_EQ(
      ComplaintAbout(Around("r1 a y 1")),
      Worded(1, 9, "cell 'c' has no transistor", ".subckt c a y vdd vss"));
}

// 4^20 devices from 60 lines.
TEST(Flatten, LimitsWhatATextExpandsTo) {
  std::string text;
  for (int i = 0; i < 20; ++i) {
    text += fmt::format(
        ".subckt s{0} a y vdd vss\nx1 a y vdd vss s{1}\nx2 a y vdd vss s{1}\n"
        "x3 a y vdd vss s{1}\nx4 a y vdd vss s{1}\n.ends\n",
        i,
        i + 1);
  }
  text += ".subckt s20 a y vdd vss\n.ends\n";
  const std::string complaint = ComplaintAbout(text);
  EXPECT_NE(complaint.find(
                "the instances of this file come to more than 500000 lines"),
            std::string::npos)
      << complaint;
}

}  // namespace
}  // namespace gatedyno
