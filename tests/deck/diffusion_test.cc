#include "harness/deck/diffusion.h"

#include <string>

#include <gtest/gtest.h>

#include "tests/support/cell_builder.h"

namespace gatedyno {
namespace {

constexpr DiffusionRules kRules = {.contacted_m = 100e-9, .shared_m = 70e-9};
// Widths of CellBuilder count in 100 nm.
constexpr double kUnit_m = 100e-9;
constexpr double kRounding = 1e-12;  // Relative; of a handful of operations.

enum Strip { kContacted, kShared };

double Area(Strip strip, double w) {
  return strip == kShared ? w * kRules.shared_m / 2 : w * kRules.contacted_m;
}
double Perimeter(Strip strip, double w) {
  return strip == kShared ? w + kRules.shared_m : 2 * (w + kRules.contacted_m);
}

Diffusion Of(const Cell& cell, const std::string& name) {
  for (const Mosfet& mosfet : cell.mosfets) {
    if (mosfet.name == name) {
      return DiffusionOf(cell, mosfet, kRules);
    }
  }
  ADD_FAILURE() << "no device " << name;
  return {};
}

void ExpectNear(double value, double expected, const std::string& what) {
  EXPECT_NEAR(value, expected, kRounding * expected) << what;
}

void ExpectStrips(const Cell& cell,
                  const std::string& name,
                  Strip drain,
                  Strip source,
                  double width) {
  const Diffusion found = Of(cell, name);
  const double w = width * kUnit_m;
  ExpectNear(found.drain_area_m2, Area(drain, w), name);
  ExpectNear(found.source_area_m2, Area(source, w), name);
  ExpectNear(found.drain_perimeter_m, Perimeter(drain, w), name);
  ExpectNear(found.source_perimeter_m, Perimeter(source, w), name);
  EXPECT_FALSE(found.from_netlist) << name;
}

CellBuilder Start() {
  CellBuilder builder("cell");
  builder.Pins({"a", "b", "c", "y", "vdd", "vss"});
  return builder;
}

TEST(DiffusionTest, AlwaysContactedAtPinsAndSupplies) {
  const Cell cell = Start().N("n", "y", "a", "vss", 2).Build();
  ExpectStrips(cell, "n", kContacted, kContacted, 2);
}

TEST(DiffusionTest, TwoInSeriesShareAStrip) {
  const Cell cell = Start()
                        .N("n1", "y", "a", "x", 2)
                        .N("n2", "x", "b", "vss", 2)
                        .P("p1", "y", "a", "vdd", 2)
                        .Build();
  ExpectStrips(cell, "n1", kContacted, kShared, 2);
  ExpectStrips(cell, "n2", kShared, kContacted, 2);
  ExpectStrips(cell, "p1", kContacted, kContacted, 2);
}

struct NoStrip {
  const char* why;
  Cell cell;
};

TEST(DiffusionTest, WhatIsNoSharedStrip) {
  Cell fingers =
      Start().N("n1", "y", "a", "x", 2).N("n2", "x", "b", "vss", 2).Build();
  Cell copies = fingers;
  fingers.mosfets[1].fingers = 2;
  copies.mosfets[1].multiplicity = 2;
  const NoStrip cases[] = {
      {"widths differ",
       Start().N("n1", "y", "a", "x", 2).N("n2", "x", "b", "vss", 3).Build()},
      {"a third device",
       Start()
           .N("n1", "y", "a", "x", 2)
           .N("n2", "x", "b", "vss", 2)
           .N("n3", "x", "c", "vss", 2)
           .Build()},
      {"the other kind",
       Start().N("n1", "y", "a", "x", 2).P("n2", "x", "b", "vdd", 2).Build()},
      {"the net is a gate's",
       Start()
           .N("n1", "y", "a", "x", 2)
           .N("n2", "x", "b", "vss", 2)
           .N("n3", "y", "x", "vss", 2)
           .Build()},
      {"the net ends there", Start().N("n1", "y", "a", "x", 2).Build()},
      {"fingers differ", fingers},
      {"copies differ", copies},
  };
  for (const NoStrip& none : cases) {
    SCOPED_TRACE(none.why);
    ExpectStrips(none.cell, "n1", kContacted, kContacted, 2);
  }
}

struct Fingers {
  double fingers;
  double drain_strips;
  double source_strips;
};
// f / 2 and f / 2 + 1, or (f + 1) / 2 of each: the sources are outside.
constexpr Fingers kFingers[] = {
    {1, 1, 1}, {2, 1, 2}, {3, 2, 2}, {4, 2, 3}, {5, 3, 3}};

TEST(DiffusionTest, FingersShareTheirStrips) {
  constexpr double kWidth_m = 600e-9;
  for (const Fingers& tried : kFingers) {
    Cell cell = Start().N("n", "y", "a", "vss", 6).Build();
    cell.mosfets[0].fingers = tried.fingers;
    cell.mosfets[0].multiplicity = 3;  // Areas are of one copy.
    const Diffusion found = Of(cell, "n");
    const double finger_m = kWidth_m / tried.fingers;
    const std::string what = std::to_string(tried.fingers);
    ExpectNear(found.drain_area_m2,
               tried.drain_strips * Area(kContacted, finger_m),
               what);
    ExpectNear(found.source_area_m2,
               tried.source_strips * Area(kContacted, finger_m),
               what);
    ExpectNear(found.drain_perimeter_m,
               tried.drain_strips * Perimeter(kContacted, finger_m),
               what);
    ExpectNear(found.source_perimeter_m,
               tried.source_strips * Perimeter(kContacted, finger_m),
               what);
  }
}

TEST(DiffusionTest, NetlistWinsWhereItGivesAllFour) {
  Cell cell = Start().N("n", "y", "a", "vss", 2).Build();
  cell.mosfets[0].diffusion = {.drain_area_m2 = 1e-15,
                               .source_area_m2 = 2e-15,
                               .drain_perimeter_m = 3e-7,
                               .source_perimeter_m = 4e-7};
  const Diffusion given = Of(cell, "n");
  EXPECT_TRUE(given.from_netlist);
  EXPECT_EQ(given.drain_area_m2, 1e-15);
  EXPECT_EQ(given.source_area_m2, 2e-15);
  EXPECT_EQ(given.drain_perimeter_m, 3e-7);
  EXPECT_EQ(given.source_perimeter_m, 4e-7);
  cell.mosfets[0].diffusion.source_area_m2.reset();
  ExpectStrips(cell, "n", kContacted, kContacted, 2);
}

}  // namespace
}  // namespace gatedyno
