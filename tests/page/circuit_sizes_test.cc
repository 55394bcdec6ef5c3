#include "harness/page/circuit_sizes.h"

#include <string>
#include <vector>

#include <gtest/gtest.h>

#include "tests/support/test_circuit.h"

namespace gatedyno {
namespace {

struct SizesCase {
  double width_m;   // Of the second device of an inverter, and its length; the
  double length_m;  // first has 360 nm and 45 nm.
  const char* unit;
  const char* common_length;
  const char* first;
  const char* second;
};

const std::vector<SizesCase> kCases = {
    {180e-9, 45e-9, "nm", "45", "360 nm", "180 nm"},
    {92.5e-9, 45e-9, "nm", "45", "360 nm", "92.5 nm"},
    {180e-9, 60e-9, "nm", "", "360/45 nm", "180/60 nm"},
    {9.99e-6, 45e-9, "nm", "45", "360 nm", "9990 nm"},
    {10e-6, 45e-9, "µm", "0.045", "0.36 µm", "10 µm"},
};

TEST(CircuitSizesTest, OneUnitForACell) {
  for (const SizesCase& tried : kCases) {
    Circuit circuit = CircuitBuilder()
                          .P("mp", "y", "a", "vdd")
                          .N("mn", "y", "a", "vss")
                          .Stage({"y"});
    circuit.devices[1].width_m = tried.width_m;
    circuit.devices[1].length_m = tried.length_m;
    const CircuitSizes sizes(circuit);
    EXPECT_EQ(sizes.unit(), tried.unit) << tried.second;
    EXPECT_EQ(sizes.common_length(), tried.common_length) << tried.second;
    EXPECT_EQ(sizes.Beside(circuit.devices[0]), tried.first);
    EXPECT_EQ(sizes.Beside(circuit.devices[1]), tried.second);
  }
}

// Three lengths of which the third is the first's: they differ.
TEST(CircuitSizesTest, LengthsDifferWhereOneDoes) {
  Circuit circuit = Nand2Circuit();
  circuit.devices[1].length_m = 60e-9;
  EXPECT_EQ(CircuitSizes(circuit).common_length(), "");
}

}  // namespace
}  // namespace gatedyno
