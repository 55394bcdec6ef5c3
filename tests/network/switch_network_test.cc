#include "harness/network/switch_network.h"

#include <gtest/gtest.h>

#include "harness/network/analysis.h"
#include "tests/support/cell_builder.h"

namespace gatedyno {
namespace {

TEST(SwitchNetworkTest, ResistorsAreWires) {
  // An extracted NAND2: resistance on a pin, on the output, in the supply and
  // inside the stack.
  CellBuilder builder("nand2x");
  const Cell cell = builder.Pins({"a", "b", "y", "vdd", "vss"})
                        .R("r1", "a", "a:1", 50)
                        .R("r2", "y:1", "y", 20)
                        .R("r3", "y:1", "y:2", 20)
                        .R("r4", "vdd", "vdd:1", 5)
                        .R("r5", "n1", "n1:1", 10)
                        .P("m1", "y:1", "a:1", "vdd:1", 2)
                        .P("m2", "y:2", "b", "vdd", 2)
                        .N("m3", "y", "a:1", "n1", 2)
                        .N("m4", "n1:1", "b", "vss", 2)
                        .Build();
  const auto analysis = AnalyseNetwork(cell);
  ASSERT_TRUE(analysis.ok()) << analysis.error().message;
  EXPECT_EQ(analysis->groups.size(), 1U);
  const TruthTable nand = analysis->function_of(analysis->outputs.front());
  for (InputVector v = 0; v < nand.rows(); ++v) {
    EXPECT_EQ(nand.at(v), v != 0b11);
  }
}

}  // namespace
}  // namespace gatedyno
