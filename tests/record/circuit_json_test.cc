#include "harness/record/circuit_json.h"

#include <stdexcept>

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

using nlohmann::json;

const Circuit kInverter = {
    .power = "vdd",
    .ground = "vss",
    .devices = {{"mp", true, "a", "y", "vdd", 180e-9, 45e-9},
                {"mn", false, "a", "y", "vss", 90e-9, 45e-9}},
    .stages = {{.outputs = {"y"}, .devices = {0, 1}}}};

// Scripts rely on these names.
TEST(CircuitJsonTest, HasAllOfACircuit) {
  EXPECT_EQ(CircuitToJson(kInverter),
            json({{"power", "vdd"},
                  {"ground", "vss"},
                  {"devices",
                   {{{"name", "mp"},
                     {"p_type", true},
                     {"gate", "a"},
                     {"drain", "y"},
                     {"source", "vdd"},
                     {"width_m", 180e-9},
                     {"length_m", 45e-9}},
                    {{"name", "mn"},
                     {"p_type", false},
                     {"gate", "a"},
                     {"drain", "y"},
                     {"source", "vss"},
                     {"width_m", 90e-9},
                     {"length_m", 45e-9}}}},
                  {"stages", {{{"outputs", {"y"}}, {"devices", {0, 1}}}}}}));
}

TEST(CircuitJsonTest, ComesBack) {
  EXPECT_EQ(ReadCircuit(json::parse(CircuitToJson(kInverter).dump())),
            kInverter);
}

TEST(CircuitJsonTest, RefusesDevicesThatThereAreNot) {
  json broken = CircuitToJson(kInverter);
  broken["stages"][0]["devices"] = {0, 2};
  try {
    ReadCircuit(broken);
    ADD_FAILURE() << "read";
  } catch (const std::out_of_range& thrown) {
    EXPECT_STREQ(thrown.what(), "a stage has device 2 of 2");
  }
}

}  // namespace
}  // namespace gatedyno
