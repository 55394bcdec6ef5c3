#include "harness/page/waves_data.h"

#include <cmath>
#include <vector>

#include <gtest/gtest.h>
#include <nlohmann/json.hpp>

#include "tests/page/sample_waves.h"
#include "tests/report/sample_run.h"

namespace gatedyno {
namespace {

using nlohmann::json;

TEST(WavesDataTest, IsWrittenLikeThis) {
  const std::vector<ArcWaves> waves = {SampleWaves()};
  // By hand: 4/3 tau fall h + 2.51 tau = 4/3 2.278 4 + 2.51 2.2295 ps.
  // The view: from 1.004 to 1.030 ns, and half of that more on either side.
  EXPECT_EQ(json::parse(WavesData(waves, SampleRun())), json::parse(R"([{
    "place": 4,
    "view": [-19, 33],
    "supply": 1,
    "hand": [17.745, "17.75 ps"],
    "nets": [
      {"name": "b", "line": [[-1010, 0], [-10, 0], [10, 1], [990, 1]]},
      {"name": "y", "line": [[-1010, 1], [-4, 1], [26, 0], [990, 0]]}],
    "marks": [
      {"name": "delay", "text": "11.00 ps",
       "from": [0, 0, 0.5, "rise"], "to": [1, 11, 0.5, "fall"]},
      {"name": "transition of b", "text": "12.00 ps",
       "from": [0, -6, 0.2, "rise"], "to": [0, 6, 0.8, "rise"]},
      {"name": "transition of y", "text": "18.00 ps",
       "from": [1, 2, 0.8, "fall"], "to": [1, 20, 0.2, "fall"]}]}])"));
}

TEST(WavesDataTest, ACornerThatIsNotKnownHasNoSupply) {
  RunResult result = SampleRun();
  result.calibrations.clear();
  const std::vector<ArcWaves> waves = {SampleWaves()};
  const json data = json::parse(WavesData(waves, result));
  EXPECT_EQ(data[0]["supply"], nullptr);
  EXPECT_EQ(data[0]["hand"], nullptr);
}

TEST(WavesDataTest, TheViewHasRoomForTheHandDelay) {
  RunResult result = SampleRun();
  result.comparisons[4].estimate.effort = 12.0;
  const std::vector<ArcWaves> waves = {SampleWaves()};
  const json one = json::parse(WavesData(waves, result))[0];
  EXPECT_GT(one["hand"][0], 33.0);
  EXPECT_GT(one["view"][1], one["hand"][0]);
  EXPECT_EQ(one["view"][0], -19.0);
}

TEST(WavesDataTest, TheViewEndsWhereTheSimulationDoes) {
  ArcWaves waves = SampleWaves();
  for (Waveform& waveform : waves.waveforms) {
    waveform.time_s.front() = 1.000e-9 - 1e-12;
    waveform.time_s.back() = 1.040e-9;
  }
  const json data =
      json::parse(WavesData(std::vector<ArcWaves>{waves}, SampleRun()));
  EXPECT_EQ(data[0]["view"], (json{-11, 30}));
}

TEST(WavesDataTest, ArcsInTroubleHaveNoData) {
  ArcWaves trouble;
  trouble.trouble = "the store has no job 00ff";
  const std::vector<ArcWaves> waves = {trouble, SampleWaves()};
  const json data = json::parse(WavesData(waves, SampleRun()));
  ASSERT_EQ(data.size(), 1U);
  EXPECT_EQ(data[0]["place"], 4);
}

// 20 arcs of real waveforms, of some thousand points each, stay below 100 KB.
TEST(WavesDataTest, IsSmall) {
  ArcWaves waves = SampleWaves();
  for (Waveform& waveform : waves.waveforms) {
    const double sign = waveform.net == "d_in" ? 1.0 : -1.0;
    waveform = {waveform.net, {}, {}};
    for (int i = 0; i < 2000; ++i) {
      waveform.time_s.push_back(1e-12 * i);
      waveform.voltage_v.push_back(0.5 +
                                   sign * 0.5 * std::tanh((i - 1010) / 8.0));
    }
  }
  EXPECT_LT(WavesData(std::vector<ArcWaves>(20, waves), SampleRun()).size(),
            100'000U);
}

}  // namespace
}  // namespace gatedyno
