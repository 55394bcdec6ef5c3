#include "harness/deck/deck_head.h"

#include <string>

#include <gtest/gtest.h>

#include "tests/deck/test_bench.h"

namespace gatedyno {
namespace {

TEST(DeckHeadTest, SaysNodeAndCorner) {
  ProcessNode node = NodeP45();
  Bench bench = BenchOf(node);
  bench.corner = {.name = "slow_lo_m40",
                  .process = "slow",
                  .supply_v = 0.9,
                  .temperature_c = -40};
  node.processes[2].parameters = {{"dvth", 0.02}, {"ktox", 1.0 / 3.0}};
  node.option_scale_m = 1e-6;
  EXPECT_EQ(DeckHead(bench),
            "* node p45, corner slow_lo_m40: slow process, 0.9 V, -40 C\n"
            ".option scale=1e-06\n"
            ".temp -40\n"
            ".param dvth=0.02\n"
            ".param ktox=0.333333333\n"
            "vpwr vpwr 0 0.9\n");
}

TEST(DeckHeadTest, ModelsAreIncludedWholeOrBySection) {
  ProcessNode node = NodeP45();
  node.processes[0].models = {{"/kit/my cards.sp", ""}, {"/kit/all.lib", "tt"}};
  EXPECT_EQ(ModelLines(BenchOf(node)),
            ".include \"/kit/my cards.sp\"\n.lib \"/kit/all.lib\" tt\n");
}

}  // namespace
}  // namespace gatedyno
