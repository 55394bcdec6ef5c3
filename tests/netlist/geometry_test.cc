#include "harness/netlist/geometry.h"

#include <string>

#include <gtest/gtest.h>

#include "tests/netlist/read_text.h"

namespace gatedyno {
namespace {

struct BadGeometry {
  const char* line;
  int column;
  const char* message;
};

constexpr BadGeometry kBadGeometries[] = {
    {"m1 y a vss vss nfet l=1u", 1, "no width: expected w= on 'm1'"},
    {"m1 y a vss vss nfet w=1u", 1, "no length: expected l= on 'm1'"},
    {"m1 y a vss vss nfet w=0 l=1u",
     21,
     "expected a width in metres, above zero, got 'w=0'"},
    {"m1 y a vss vss nfet w=-1u l=1u",
     21,
     "expected a width in metres, above zero, got 'w=-1u'"},
    {"m1 y a vss vss nfet w={1u-3u} l=1u",
     21,
     "expected a width in metres, above zero, got 'w={1u-3u}' = -2e-06"},
    {"m1 y a vss vss nfet w=1u l={lgate-lgate}",
     26,
     "expected a length in metres, above zero, got 'l={lgate-lgate}' = 0"},
    {"m1 y a vss vss nfet w=1u l=1u nf=1.5",
     31,
     "expected a number of fingers, a whole one, got 'nf=1.5'"},
    {"m1 y a vss vss nfet w=1u l=1u nf=0",
     31,
     "expected a number of fingers, above zero, got 'nf=0'"},
    {"m1 y a vss vss nfet w=1u l=1u m=0",
     31,
     "expected a multiplicity, above zero, got 'm=0'"},
    {"m1 y a vss vss nfet w=1u l=1u ad=-1p",
     31,
     "expected a drain area in square metres, not negative, got 'ad=-1p'"},
    {"m1 y a vss vss nfet w=1u l=1u nfin=2",
     31,
     "both a width and fins are given"},
    {"m1 y a vss vss nfet l=1u nfin=2", 26, "this node has no fin width"},
    {"m1 y a vss vss nfet w={2*wx} l=1u",
     26,
     "unknown parameter 'wx': known here are lgate, wunit"},
    {"m1 y a vss vss nfet w={1u/(lgate-lgate)} l=1u", 26, "division by zero"},
    {"m1 y a vss vss nfet w=1u l=1u sa={sx}",
     35,
     "unknown parameter 'sx': known here are lgate, wunit"},
    {"m1 y a vss vss nfet w=1e300 l=1u m=1e300",
     1,
     "the width of 'm1', all copies together, is out of range"},
    {"r1 a y 0", 8, "expected a resistance in ohms, above zero, got '0'"},
    {"r1 a y {1-2}",
     8,
     "expected a resistance in ohms, above zero, got '{1-2}' = -1"},
    {"r1 a y 1 m=-1", 10, "expected a multiplicity, above zero, got 'm=-1'"},
    {"c1 a y -1f",
     8,
     "expected a capacitance in farads, not negative, got '-1f'"},
};

TEST(Geometry, Complains) {
  for (const BadGeometry& bad : kBadGeometries) {
    EXPECT_EQ(ComplaintAbout(Around(bad.line)),
              Worded(2, bad.column, bad.message, bad.line));
  }
}

TEST(Geometry, TakesTheDefaultLength) {
  ReaderOptions options = TestOptions();
  options.default_length_m = 45e-9;
  const Cell cell = ReadOne(Around("m1 y a vss vss nfet w=1u"), options);
  EXPECT_DOUBLE_EQ(cell.mosfets[0].length_m, 45e-9);
}

// BSIM-CMG: nfin counts the fins of one finger (from memory).
TEST(Geometry, CountsFins) {
  ReaderOptions options = TestOptions();
  options.fin_width_m = 50e-9;
  const Cell cell =
      ReadOne(Around("m1 y a vss vss nfet NFIN=3 nf=2 l=20n m=4"), options);
  EXPECT_DOUBLE_EQ(cell.mosfets[0].width_m, 3 * 2 * 50e-9);
  EXPECT_DOUBLE_EQ(cell.mosfets[0].total_width_m(), 4 * 3 * 2 * 50e-9);
}

TEST(Geometry, ZeroDiffusionIsADiffusion) {
  const Cell cell = ReadOne(Around("m1 y a vss vss nfet w=1u l=1u ad=0 ps=0"));
  EXPECT_EQ(cell.mosfets[0].diffusion.drain_area_m2, 0.0);
  EXPECT_EQ(cell.mosfets[0].diffusion.source_perimeter_m, 0.0);
}

ReaderOptions KitOptions() {
  ReaderOptions options = TestOptions();
  options.devices.push_back(KitDevice());
  return options;
}

TEST(Geometry, ReadsDevicesThatAreSubcircuits) {
  const Cell cell =
      ReadOne(Around("x1 y a vss vss KIT_N wr=2 lr=0.15 ad=0.3 mult=2 m=3"),
              KitOptions());
  ASSERT_EQ(cell.mosfets.size(), 1U);
  const Mosfet& mosfet = cell.mosfets[0];
  EXPECT_EQ(mosfet.name, "x1");
  EXPECT_EQ(mosfet.model, "kit_n");
  EXPECT_DOUBLE_EQ(mosfet.width_m, 2e-6);
  EXPECT_DOUBLE_EQ(mosfet.length_m, 0.15e-6);
  EXPECT_DOUBLE_EQ(*mosfet.diffusion.drain_area_m2, 0.3e-12);
  // Its own multiplicity and that of the X line.
  EXPECT_DOUBLE_EQ(mosfet.multiplicity, 6.0);
}

TEST(Geometry, TheFilesScaleReplacesTheDevicesUnit) {
  const Cell cell =
      ReadOne(".option scale=1e-6\n" +
                  Around("x1 y a vss vss kit_n params: wr=2 lr=0.15"),
              KitOptions());
  EXPECT_DOUBLE_EQ(cell.mosfets[0].width_m, 2e-6);
}

TEST(Geometry, NamesTheKitsParameters) {
  const std::string line = "x1 y a vss vss kit_n w=2 lr=1";
  EXPECT_EQ(ComplaintAbout(Around(line), KitOptions()),
            Worded(2,
                   22,
                   "unknown parameter 'w' of device 'kit_n': known are wr, lr, "
                   "nf, mult, ad, as, pd, ps, nfin, m",
                   line));
  const std::string no_width = "x1 y a vss vss kit_n lr=1";
  EXPECT_EQ(ComplaintAbout(Around(no_width), KitOptions()),
            Worded(2, 1, "no width: expected wr= on 'x1'", no_width));
}

TEST(Geometry, RefusesAScaleThatIsNone) {
  EXPECT_EQ(ComplaintAbout(".option scale=0\n" + InverterAround("")),
            Worded(1,
                   9,
                   "expected a number of metres, above zero, got 'scale=0'",
                   ".option scale=0"));
}

}  // namespace
}  // namespace gatedyno
