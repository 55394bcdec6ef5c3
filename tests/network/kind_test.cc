#include "harness/network/kind.h"

#include <gtest/gtest.h>

#include "tests/network/bad_cell.h"

namespace gatedyno {
namespace {

std::vector<BadCell> OtherKinds() {
  return {
      {"pseudo-NMOS NOR2",
       TwoInputs()
           .N("m1", "y", "a", "vss", 1)
           .N("m2", "y", "b", "vss", 1)
           .P("m3", "y", "vss", "vdd", 1)
           .Build(),
       "bad.sp:1:1: cell 'bad': output y is shorted at a=1 b=0: both pull-up "
       "and pull-down conduct; networks are not complementary (the shape of a "
       "ratioed gate, a kind not estimated)"},
      {"footed dynamic NOR2",
       Start({"clk", "a", "b", "y", "vdd", "vss"})
           .P("m1", "y", "clk", "vdd", 1)
           .N("m2", "y", "a", "n1", 2)
           .N("m3", "y", "b", "n1", 2)
           .N("m4", "n1", "clk", "vss", 2)
           .Build(),
       "bad.sp:1:1: cell 'bad': output y floats at clk=1 a=0 b=0: neither "
       "pull-up nor pull-down conducts; networks are not complementary (the "
       "shape of a dynamic gate, a kind not estimated)"},
      {"unfooted dynamic inverter",
       Start({"clk", "a", "y", "vdd", "vss"})
           .P("m1", "y", "clk", "vdd", 1)
           .N("m2", "y", "a", "vss", 1)
           .Build(),
       "bad.sp:1:1: cell 'bad': output y floats at clk=1 a=0: neither pull-up "
       "nor pull-down conducts; networks are not complementary (the shape of "
       "a dynamic gate, a kind not estimated)"},
      {"tristate inverter with its enable inverter",
       Start({"a", "en", "y", "vdd", "vss"})
           .Inverter("en", "enn", 1, 2)
           .N("m1", "y", "en", "n1", 2)
           .N("m2", "n1", "a", "vss", 2)
           .P("m3", "y", "enn", "p1", 4)
           .P("m4", "p1", "a", "vdd", 4)
           .Build(),
       "bad.sp:1:1: cell 'bad': output y floats at a=0 en=0: neither pull-up "
       "nor pull-down conducts; networks are not complementary (the shape of "
       "a tristate gate, a kind not estimated)"},
      {"tristate inverter with both enables as pins",
       Start({"a", "en", "enn", "y", "vdd", "vss"})
           .N("m1", "y", "en", "n1", 2)
           .N("m2", "n1", "a", "vss", 2)
           .P("m3", "y", "enn", "p1", 4)
           .P("m4", "p1", "a", "vdd", 4)
           .Build(),
       "bad.sp:1:1: cell 'bad': output y floats at a=1 en=0 enn=0: neither "
       "pull-up nor pull-down conducts; networks are not complementary (the "
       "shape of a tristate gate, a kind not estimated)"},
      {"transmission-gate multiplexer",
       Start({"d0", "d1", "s", "y", "vdd", "vss"})
           .Inverter("s", "sn", 1, 2)
           .N("m1", "d0", "sn", "x", 1)
           .P("m2", "d0", "s", "x", 1)
           .N("m3", "d1", "s", "x", 1)
           .P("m4", "d1", "sn", "x", 1)
           .Inverter("x", "y", 1, 2)
           .Build(),
       "bad.sp:1:1: cell 'bad': pin d0 enters by a source or drain and no "
       "supply drives it: the shape of a pass gate, a kind not estimated"},
  };
}

TEST(KindTest, OtherKindsAreNamedInTheRefusal) {
  ExpectMessages(OtherKinds());
}

TEST(KindTest, OnlyComplementaryStaticIsCarriedOn) {
  for (const GateKind kind : {GateKind::kPassGate,
                              GateKind::kRatioed,
                              GateKind::kDynamic,
                              GateKind::kTristate,
                              GateKind::kNotComplementary}) {
    EXPECT_FALSE(IsCarriedOn(kind)) << KindName(kind);
  }
  EXPECT_TRUE(IsCarriedOn(GateKind::kComplementaryStatic));
  EXPECT_EQ(KindName(GateKind::kComplementaryStatic), "complementary static");
}

}  // namespace
}  // namespace gatedyno
