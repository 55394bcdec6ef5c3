#include "harness/page/page_data.h"

#include <limits>

#include <gtest/gtest.h>
#include <nlohmann/json.hpp>

#include "tests/report/sample_run.h"

namespace gatedyno {
namespace {

using nlohmann::json;

TEST(PageDataTest, HoldsEveryArc) {
  const RunResult result = SampleRun();
  const json data = json::parse(PageData(result));
  EXPECT_EQ(data["format"], "gatedyno-page/1");
  EXPECT_EQ(data["cells"],
            json({"inv", "nand2", "arbiter_grant_priority_stage_complex_gat"}));
  EXPECT_EQ(data["corners"], json({"typical", "slow_lo_m40"}));
  EXPECT_EQ(data["u"], 0.00034);
  ASSERT_EQ(data["arcs"].size(), result.comparisons.size());
  const json& beyond = data["arcs"][4];
  EXPECT_EQ(beyond["c"], 1);
  EXPECT_EQ(beyond["k"], 0);
  EXPECT_EQ(beyond["n"], "b->y fall");
  EXPECT_EQ(beyond["e"], "fall");
  EXPECT_EQ(beyond["s"], "a=1");
  EXPECT_EQ(beyond["v"], "beyond");
  EXPECT_EQ(beyond["b"], true);
  EXPECT_EQ(beyond["g"][0], 1.33333333);
  EXPECT_EQ(beyond["g"][1], 1.9);
  EXPECT_EQ(beyond["g"][3], 0.425);
  EXPECT_EQ(beyond["g"][5], 0.25);
  EXPECT_EQ(beyond["l"], json({2.5, 4.25}));
  EXPECT_EQ(beyond["h"][0], 3.03733333);  // 4/3 of 2.278 ps.
}

TEST(PageDataTest, WhatIsNotKnownIsNull) {
  RunResult result = SampleRun();
  result.accuracy.delays = 0;
  result.comparisons[0].effort.u = std::numeric_limits<double>::quiet_NaN();
  const json data = json::parse(PageData(result));
  EXPECT_TRUE(data["u"].is_null());
  EXPECT_TRUE(data["arcs"][0]["g"][2].is_null());
  const json& failed = data["arcs"][3];
  EXPECT_EQ(failed["g"],
            json({1.33333333, nullptr, nullptr, nullptr, nullptr, 0.25}));
  EXPECT_TRUE(failed["l"].is_null());
  EXPECT_FALSE(failed["h"].is_null());
  // At a corner without a calibration there is no hand line either.
  EXPECT_TRUE(data["arcs"].back()["h"].is_null());
}

}  // namespace
}  // namespace gatedyno
