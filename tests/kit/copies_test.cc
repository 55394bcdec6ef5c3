// Copies of cells whose devices are subcircuits, however these treat `m`.

#include <string>

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "tests/kit/kit_folder.h"
#include "tests/measured/lab.h"
#include "tests/measured/written_copies.h"
#include "tests/support/temporary_folder.h"

namespace gatedyno {
namespace {

// The kinds of wrapper that devices.lib explains.
class WrapperTest : public testing::TestWithParam<const char*> {
 protected:
  // The node with its devices, the reference inverter's too, of one kind.
  static PreparedRun PrepareKind(const std::string& cells) {
    PreparedRun run = Prepare(KitFile("kit.json"), {cells});
    for (NodeDevice& device : run.node.devices) {
      const bool is_n = device.polarity == Polarity::kN;
      device.model = std::string(GetParam()) + (is_n ? "_n" : "_p");
    }
    return run;
  }
};
INSTANTIATE_TEST_SUITE_P(Kinds,
                         WrapperTest,
                         testing::Values("kit", "bare", "stat", "deep"),
                         ParamName);

TEST_P(WrapperTest, CountedCopiesEqualWrittenCopies) {
  PreparedRun all = PrepareKind(KitFile("gates.sp"));
  ASSERT_EQ(all.cells.size(), 3u);
  for (size_t i = 0; i < all.cells.size(); ++i) {
    PreparedRun one = all;
    one.cells = {all.cells[i]};
    one.estimates = {all.estimates[i]};
    for (const ArcEstimate& arc : one.estimates.front().arcs) {
      ExpectSameWithWrittenCopies(one, arc.arc);
    }
  }
}

// The check would find a lost multiplicity: a fanout of 4 that became 1.
TEST_P(WrapperTest, AFanoutOf4IsFarFrom1) {
  const PreparedRun run = PrepareKind(KitFile("gates.sp"));
  const Arc& arc = run.estimates.front().arcs.front().arc;
  Job lost = WrittenCopies(run, arc);
  for (const char* line : {"xla1", "xla2", "xla3", "xlb1", "xlb2", "xlb3"}) {
    size_t at = 0;
    while ((at = lost.deck.find(line, at)) != std::string::npos) {
      lost.deck[at] = '*';
    }
  }
  lost.key += " lost";
  const std::vector<Outcome> outcomes =
      Lab::Shared().Simulate({CountedCopies(run, arc), lost});
  EXPECT_LT(outcomes[1].values_s.at("delay_rise"),
            0.6 * outcomes[0].values_s.at("delay_rise"));
}

// m= in a cell: two devices in parallel, and so half of one and one and a half.
constexpr const char* kParallelCells = R"(
.subckt once a y vdd vss
xn1 y a vss vss kit_n w=0.42 l=0.13 ad=0.13 as=0.13 pd=1.5 ps=1.5
xn2 y a vss vss kit_n w=0.42 l=0.13 ad=0.13 as=0.13 pd=1.5 ps=1.5
xp1 y a vdd vdd kit_p w=0.84 l=0.13 ad=0.26 as=0.26 pd=2.3 ps=2.3
xp2 y a vdd vdd kit_p w=0.84 l=0.13 ad=0.26 as=0.26 pd=2.3 ps=2.3
.ends once
.subckt twice a y vdd vss
xn1 y a vss vss kit_n w=0.42 l=0.13 ad=0.13 as=0.13 pd=1.5 ps=1.5 m=2
xp1 y a vdd vdd kit_p w=0.84 l=0.13 ad=0.26 as=0.26 pd=2.3 ps=2.3 m=2
.ends twice
.subckt broken a y vdd vss
xn1 y a vss vss kit_n w=0.42 l=0.13 ad=0.13 as=0.13 pd=1.5 ps=1.5 m=0.5
xn2 y a vss vss kit_n w=0.42 l=0.13 ad=0.13 as=0.13 pd=1.5 ps=1.5 m=1.5
xp1 y a vdd vdd kit_p w=0.84 l=0.13 ad=0.26 as=0.26 pd=2.3 ps=2.3 m=1.5
xp2 y a vdd vdd kit_p w=0.84 l=0.13 ad=0.26 as=0.26 pd=2.3 ps=2.3 m=0.5
.ends broken
)";

TEST_P(WrapperTest, MultiplicityInACellEqualsDevicesInParallel) {
  constexpr double kTolerance = 2e-4;  // Two runs' own, of the delay.
  TemporaryFolder folder;
  PreparedRun run = PrepareKind(folder.Write("parallel.sp", kParallelCells));
  run.plan.accuracy = kFinestAccuracy;
  const RunResult result = Lab::Shared().Measure(run);
  for (const Edge edge : {Edge::kRise, Edge::kFall}) {
    const Comparison once = FindRow(result, "once", "a", edge);
    for (const char* cell : {"twice", "broken"}) {
      const Comparison counted = FindRow(result, cell, "a", edge);
      ASSERT_EQ(counted.points.size(), once.points.size());
      for (size_t i = 0; i < once.points.size(); ++i) {
        EXPECT_NEAR(counted.points[i].delay_s,
                    once.points[i].delay_s,
                    kTolerance * once.points[i].delay_s)
            << cell << " " << EdgeName(edge);
      }
    }
  }
}

// The deck writer's promise: no multiplicity on a subcircuit's line.
TEST_P(WrapperTest, DecksGiveNoMultiplicityToSubcircuits) {
  const PreparedRun run = PrepareKind(KitFile("gates.sp"));
  const Job job = CountedCopies(run, run.estimates.front().arcs.front().arc);
  EXPECT_THAT(job.deck, testing::HasSubstr("\nxl1_"));
  EXPECT_THAT(job.deck, testing::Not(testing::HasSubstr(" m=")));
}

}  // namespace
}  // namespace gatedyno
