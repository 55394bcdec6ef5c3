#include "harness/report/versus_json.h"

#include <gtest/gtest.h>
#include <nlohmann/json.hpp>

#include "tests/report/sample_versus.h"

namespace gatedyno {
namespace {

using nlohmann::json;

constexpr double kRounding = 1e-12;

TEST(VersusJsonTest, HasBothSides) {
  const SampleVersus sample;
  const json all = json::parse(VersusJson(sample.view()));
  EXPECT_EQ(all.at("format"), "gatedyno-versus/1");
  EXPECT_EQ(all.at("a"),
            (json{{"store", "first.db"},
                  {"run", 1},
                  {"title", "gates of an interrupt arbiter"},
                  {"node", "p45"},
                  {"started", "2026-12-01T08:00:00Z"},
                  {"simulator", "simulator 1"},
                  {"program", ""},
                  {"accuracy", 0.002}}));
  EXPECT_EQ(all.at("b").at("run"), 3);
  ASSERT_EQ(all.at("corners").size(), 1U);
  EXPECT_EQ(all.at("corners")[0].at("b").at("tau_s").at("value"), 5e-12);
}

TEST(VersusJsonTest, HasEveryArc) {
  const SampleVersus sample;
  const json all = json::parse(VersusJson(sample.view()));
  const json& arcs = all.at("arcs");
  ASSERT_EQ(arcs.size(), 4U);
  const json& changed = arcs[2];
  EXPECT_EQ(changed.at("arc").at("cell"), "nand2");
  EXPECT_EQ(changed.at("corner_a"), "typical");
  EXPECT_EQ(changed.at("finding"), "changed");
  EXPECT_EQ(changed.at("a").at("effort"), (json{{"value", 1.5}, {"u", 0.0}}));
  EXPECT_EQ(changed.at("b").at("effort_by_hand"), 1.25);
  EXPECT_EQ(changed.at("b").at("verdict"), "beyond");
  EXPECT_NEAR(changed.at("effort_change").at("relative"), 0.2, kRounding);
  EXPECT_NEAR(changed.at("effort_change").at("expanded"),
              sample.versus.arcs[2].effort->expanded.value(),
              kRounding);
  EXPECT_EQ(arcs[3].at("effort_change"), nullptr);
  EXPECT_EQ(arcs[3].at("b").at("reason"), "h=4: timed out after 60 s");
  EXPECT_EQ(all.at("only_a")[0].at("arc").at("cell"), "nor2");
  EXPECT_EQ(all.at("only_b")[0].at("arc").at("cell"), "nor3");
}

TEST(VersusJsonTest, HasTheSpread) {
  const SampleVersus sample;
  const json spread = json::parse(VersusJson(sample.view())).at("spread");
  EXPECT_EQ(spread.at("g").at("count"), 3);
  EXPECT_NEAR(spread.at("g").at("mean"), 0.2 / 3, kRounding);
  EXPECT_EQ(spread.at("g").at("within_10_percent"), 2);
  EXPECT_NEAR(spread.at("p").at("mean"), 0.25 / 3, kRounding);
  // p over p_inv: 0, 1/1.25 - 1 and the same again.
  EXPECT_NEAR(spread.at("p_in_p_inv").at("mean"), -0.4 / 3, kRounding);
}

TEST(VersusJsonTest, ASideWithoutTauIsNull) {
  SampleVersus sample;
  sample.b.calibrations.clear();
  sample.PairUp();
  const json all = json::parse(VersusJson(sample.view()));
  EXPECT_EQ(all.at("corners")[0].at("b"), nullptr);
  EXPECT_EQ(all.at("spread").at("p_in_p_inv").at("mean"), nullptr);
}

}  // namespace
}  // namespace gatedyno
