#include "harness/page/circuit_rows.h"

#include <map>
#include <string>
#include <vector>

#include <gtest/gtest.h>

#include "tests/support/test_circuit.h"

namespace gatedyno {
namespace {

struct RowCase {
  const char* what;
  Circuit circuit;
  std::map<std::string, int> rows;
};

const std::vector<RowCase> kCases = {
    {"a stack, next to the output on top",
     Nand2Circuit(),
     {{"vdd", 0}, {"y", 1}, {"n1", 2}, {"vss", 3}}},
    // n1 and n2 are joined by a device, so one of them is higher.
    {"a bridge",
     BridgeCircuit(),
     {{"vdd", 0},
      {"p1", 1},
      {"p2", 2},
      {"y", 3},
      {"n1", 4},
      {"n2", 5},
      {"vss", 6}}},
    // p3 has one device to y and one to vdd, beside a stack of three.
    {"the pull-up hangs at the output",
     CircuitBuilder()
         .P("m1", "p1", "a", "vdd")
         .P("m2", "p2", "b", "p1")
         .P("m3", "y", "c", "p2")
         .P("m4", "p3", "d", "vdd")
         .P("m5", "y", "e", "p3")
         .N("m6", "y", "a", "vss")
         .Stage({"y"}),
     {{"vdd", 0}, {"p1", 1}, {"p2", 2}, {"p3", 2}, {"y", 3}, {"vss", 4}}},
    // p2 has as many devices to vdd as p1; between them lies b.
    {"a device of the pull-up between nets next to the supply",
     CircuitBuilder()
         .P("mp_d", "y", "d", "p1")
         .P("mp_a", "p1", "a", "vdd")
         .P("mp_b", "p1", "b", "p2")
         .P("mp_c", "p2", "c", "vdd")
         .N("mn", "y", "a", "vss")
         .Stage({"y"}),
     {{"vdd", 0}, {"p2", 1}, {"p1", 2}, {"y", 3}, {"vss", 4}}},
    {"a dead end hangs down",
     CircuitBuilder()
         .P("m1", "y", "a", "vdd")
         .N("m2", "y", "a", "vss")
         .N("m3", "y", "b", "x1")
         .N("m4", "x1", "b", "x2")
         .Stage({"y"}),
     {{"vdd", 0}, {"y", 1}, {"x1", 2}, {"x2", 3}, {"vss", 4}}},
    // An inverter and a transmission gate in one group.
    {"pass devices lie between the nets they join",
     CircuitBuilder()
         .P("m1", "d", "a", "vdd")
         .N("m2", "d", "a", "vss")
         .P("m3", "y", "sn", "d")
         .N("m4", "y", "s", "d")
         .Stage({"y"}),
     {{"vdd", 0}, {"d", 1}, {"y", 2}, {"vss", 3}}},
    {"an output within the network of another",
     CircuitBuilder()
         .P("m1", "y1", "a", "vdd")
         .P("m2", "y2", "a", "vdd")
         .P("m3", "y2", "b", "vdd")
         .N("m4", "y1", "a", "vss")
         .N("m5", "y2", "b", "y1")
         .Stage({"y1", "y2"}),
     {{"vdd", 0}, {"y2", 1}, {"y1", 2}, {"vss", 3}}},
    {"no supply at all",
     CircuitBuilder().N("m1", "x", "a", "y").Stage({"y"}),
     {{"y", 1}, {"x", 2}}},
};

TEST(CircuitRowsTest, NetsFromThePowerSupplyToGround) {
  for (const RowCase& tried : kCases) {
    const StageRows found =
        FindRows(tried.circuit, tried.circuit.stages.front());
    std::map<std::string, int> rows;
    for (const StageNet& net : found.nets) {
      rows[net.name] = net.row;
    }
    EXPECT_EQ(rows, tried.rows) << tried.what;
    for (const StageDevice& device : found.devices) {
      EXPECT_LT(found.nets[device.upper].row, found.nets[device.lower].row)
          << tried.what;
    }
  }
}

TEST(CircuitRowsTest, RolesAreTheStages) {
  const Circuit circuit = Nand2Circuit();
  std::map<std::string, NetRole> roles;
  for (const StageNet& net : FindRows(circuit, circuit.stages[0]).nets) {
    roles[net.name] = net.role;
  }
  EXPECT_EQ(roles,
            (std::map<std::string, NetRole>{{"vdd", NetRole::kPower},
                                            {"vss", NetRole::kGround},
                                            {"y", NetRole::kOutput},
                                            {"n1", NetRole::kInner}}));
}

TEST(CircuitRowsTest, LeavesOutDevicesWithoutChannel) {
  const Circuit circuit = CircuitBuilder()
                              .N("m1", "y", "a", "vss")
                              .N("m2", "y", "a", "y")
                              .Stage({"y"});
  EXPECT_EQ(FindRows(circuit, circuit.stages[0]).devices.size(), 1U);
}

}  // namespace
}  // namespace gatedyno
