#include "harness/network/function_text.h"

#include <gtest/gtest.h>

#include "tests/support/bundle_gates.h"
#include "tests/support/gates.h"

namespace gatedyno {
namespace {

// Two stages: `first` computes x from the pins, an inverter y from x.
Cell WithInverter(CellBuilder builder) {
  return builder.Inverter("x", "y", 1, 2).Build();
}

CellBuilder NandInto(const std::string& output) {
  CellBuilder builder("and2");
  PinsOf(builder, 2);
  NStack(builder, output, {"a", "b"}, 2);
  PStack(builder, output, {"a"}, 2);
  PStack(builder, output, {"b"}, 2);
  return builder;
}

CellBuilder NorInto(const std::string& output) {
  CellBuilder builder("or2");
  PinsOf(builder, 2);
  PStack(builder, output, {"a", "b"}, 4);
  NStack(builder, output, {"a"}, 1);
  NStack(builder, output, {"b"}, 1);
  return builder;
}

Cell NandOfNands() {
  CellBuilder builder("ao22");
  PinsOf(builder, 4);
  const auto nand = [&](const std::string& output,
                        const std::string& a,
                        const std::string& b) {
    NStack(builder, output, {a, b}, 2);
    PStack(builder, output, {a}, 2);
    PStack(builder, output, {b}, 2);
  };
  nand("u", "a", "b");
  nand("v", "c", "d");
  nand("y", "u", "v");
  return builder.Build();
}

Cell Constant() {
  CellBuilder builder("tie");
  return builder.Pins({"a", "y", "vdd", "vss"})
      .Inverter("a", "an", 1, 2)
      .N("m1", "y", "a", "vss", 1)
      .N("m2", "y", "an", "vss", 1)
      .P("m3", "y", "a", "n1", 1)
      .P("m4", "n1", "an", "vdd", 1)
      .Build();
}

struct FunctionRow {
  Cell cell;
  std::string text;
};

TEST(FunctionTextTest, Readable) {
  const std::vector<FunctionRow> table = {
      {InverterCell(1, 2), "!a"},
      {NandCell(4, 4, 2), "!(a & b & c & d)"},
      {NorCell(2, 1, 4), "!(a | b)"},
      {Aoi21Cell(2), "!(a & b | c)"},
      {Aoi221Cell(2), "!(a & b | c & d | e)"},
      {Oai21Cell(2), "!((a | b) & c)"},
      {Oai22Cell(2), "!((a | b) & (c | d))"},
      {WithInverter(NandInto("x")), "a & b"},
      {WithInverter(NorInto("x")), "a | b"},
      {NandOfNands(), "a & b | c & d"},
      {XorSymmetricCell(2, 2), "a ^ b"},
      {Mux2Cell(2), "!(d0 & !s | d1 & s)"},
      // No series/parallel form: minimised from the truth table.
      {BridgeCell({1, 1, 1, 1, 1}, 2),
       "!(a & c | a & d & e | b & c & e | b & d)"},
      {NandCell(12, 12, 2), "!(a & b & c & d & e & f & g & h & i & j & k & l)"},
      {NorCell(12, 1, 24), "!(a | b | c | d | e | f | g | h | i | j | k | l)"},
      {Constant(), "0"},
  };
  for (const FunctionRow& row : table) {
    const auto analysis = AnalyseNetwork(row.cell);
    ASSERT_TRUE(analysis.ok()) << analysis.error().message;
    EXPECT_EQ(FunctionText(row.cell, *analysis, analysis->outputs.front()),
              row.text)
        << row.cell.name;
  }
}

}  // namespace
}  // namespace gatedyno
