#include "harness/network/series_parallel.h"

#include <gtest/gtest.h>

#include "harness/network/stack.h"
#include "tests/network/rail_networks.h"
#include "tests/support/gates.h"

namespace gatedyno {
namespace {

TEST(SeriesParallelTest, DualOfTheDualIsTheSame) {
  for (const Cell& cell :
       {NandCell(4, 4, 2), CompoundCell(2), Aoi221Cell(2), MirrorSumCell(2)}) {
    const Networks found = NetworksOf(cell);
    const SwitchNetwork& network = found.analysis.network;
    const auto down = ReduceSeriesParallel(network, found.down);
    ASSERT_TRUE(down.has_value());
    EXPECT_EQ(CanonicalText(network, DualOf(DualOf(*down))),
              CanonicalText(network, *down));
  }
}

TEST(SeriesParallelTest, PullUpOfAnAndOrGateIsTheDualOfItsPullDown) {
  for (const Cell& cell : {Aoi21Cell(2),
                           Aoi22Cell(2),
                           Oai22Cell(2),
                           Aoi221Cell(2),
                           CompoundCell(2),
                           MajorityDualCell(2)}) {
    const Networks found = NetworksOf(cell);
    const SwitchNetwork& network = found.analysis.network;
    const auto down = ReduceSeriesParallel(network, found.down);
    const auto up = ReduceSeriesParallel(network, found.up);
    ASSERT_TRUE(down && up);
    EXPECT_EQ(CanonicalText(network, DualOf(*down)),
              CanonicalText(network, *up))
        << cell.name;
    EXPECT_EQ(Height(*down), TallestStack(found.analysis, found.down));
    EXPECT_EQ(Height(*up), TallestStack(found.analysis, found.up));
  }
}

TEST(SeriesParallelTest, PartsInSeriesRunFromTheOutputToTheRail) {
  // NAND3 with devices written in mixed order and direction.
  CellBuilder builder("nand3m");
  PinsOf(builder, 3);
  PStack(builder, "y", {"a"}, 2);
  PStack(builder, "y", {"b"}, 2);
  PStack(builder, "y", {"c"}, 2);
  const Cell cell = builder.N("m1", "vss", "c", "n2", 3)
                        .N("m2", "n2", "b", "n1", 3)
                        .N("m3", "y", "a", "n1", 3)
                        .Build();
  const Networks found = NetworksOf(cell);
  const SwitchNetwork& network = found.analysis.network;
  const auto down = ReduceSeriesParallel(network, found.down);
  ASSERT_TRUE(down.has_value());
  std::vector<std::string> gates;
  for (const SeriesParallel& part : down->parts) {
    gates.push_back(
        cell.net_name(network.switches[static_cast<size_t>(part.index)].gate));
  }
  EXPECT_EQ(gates, (std::vector<std::string>{"a", "b", "c"}));
}

}  // namespace
}  // namespace gatedyno
