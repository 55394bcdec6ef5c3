#include "harness/report/release_json.h"

#include <gtest/gtest.h>
#include <nlohmann/json.hpp>

#include "tests/report/sample_release.h"

namespace gatedyno {
namespace {

using nlohmann::json;

TEST(ReleaseJsonTest, SaysAllThatWasWeighed) {
  const json read = json::parse(ReleaseJson(SampleRelease()));
  EXPECT_EQ(read["format"], "gatedyno-release/1");
  EXPECT_EQ(read["decision"], "no");
  EXPECT_EQ(read["date"], kToday);
  EXPECT_EQ(read["missing_jobs"], 2);
  EXPECT_EQ(read["reasons_of_the_run"],
            json({"2 jobs of the plan are not in the store"}));
  EXPECT_EQ(read["arcs"],
            json({{"all", 7},
                  {"within", 2},
                  {"beyond", 2},
                  {"not_measured", 3},
                  {"bent", 2}}));
  // UncertainRow, UnmeasuredRow, LongNamesRow, and the cold corner.
  ASSERT_EQ(read["reasons"].size(), 4U);
  const json& doubt = read["reasons"][0];
  EXPECT_EQ(doubt["arc"]["cell"], "nand2");
  EXPECT_EQ(doubt["corner"], "typical");
  EXPECT_EQ(doubt["kind"], "too uncertain");
  EXPECT_EQ(doubt["quantity"], "effort");
  EXPECT_EQ(doubt["expired_exemption"], 1);
  EXPECT_EQ(read["reasons"][1]["kind"], "not measured");
  EXPECT_EQ(read["reasons"][1]["quantity"], nullptr);
  EXPECT_EQ(read["reasons"][2]["kind"], "beyond");
  EXPECT_EQ(read["reasons"][2]["expired_exemption"], nullptr);
  ASSERT_EQ(read["excused"].size(), 1U);
  EXPECT_EQ(read["excused"][0]["exemption"], 0);
  EXPECT_EQ(read["excused"][0]["text"],
            "g 1.90 against 1.33 by hand: +42.5 % (allowed 25 %)");
  ASSERT_EQ(read["exemptions"].size(), 4U);
  EXPECT_EQ(read["exemptions"][1],
            json({{"cells", "nand2"},
                  {"edge", "rise"},
                  {"reason", "waits for new models"},
                  {"author", "library lead"},
                  {"expires", "2026-01-31"},
                  {"state", "expired"},
                  {"arcs", 3},
                  {"arcs_in_need", 3}}));
  EXPECT_EQ(read["tolerances"]["rules"].size(), 2U);
}

TEST(ReleaseJsonTest, NamesWhatMoved) {
  const json baseline = json::parse(ReleaseJson(SampleRelease()))["baseline"];
  EXPECT_EQ(baseline["store"], "b.db");
  EXPECT_EQ(baseline["run"], 3);
  EXPECT_EQ(baseline["arcs"], 7);
  EXPECT_EQ(baseline["only_before"], 1);
  EXPECT_EQ(baseline["only_now"], 0);
  ASSERT_EQ(baseline["moved"].size(), 2U);
  const json& moved = baseline["moved"][0];
  EXPECT_EQ(moved["arc"]["cell"], "inv");
  EXPECT_EQ(moved["finding"], "changed");
  EXPECT_EQ(moved["effort"]["before"]["value"], 1.2);
  EXPECT_EQ(moved["effort"]["after"]["value"], 1.296);
  EXPECT_NEAR(moved["effort"]["relative"].get<double>(), 0.08, 1e-12);
  EXPECT_GT(moved["effort"]["expanded"].get<double>(), 0.0);
  EXPECT_EQ(baseline["moved"][1]["verdict_before"], "beyond");
  EXPECT_EQ(baseline["moved"][1]["verdict"], "within");
}

TEST(ReleaseJsonTest, YesWithoutABaseline) {
  RunResult result = SampleRun();
  result.comparisons = {SampleRow("inv", "a", Edge::kRise)};
  const json read = json::parse(ReleaseJson(ReleaseOf(std::move(result))));
  EXPECT_EQ(read["decision"], "yes");
  EXPECT_EQ(read["baseline"], nullptr);
  EXPECT_EQ(read["reasons"], json::array());
}

TEST(ReleaseJsonTest, NamesThatAreNoTextDoNotLoseIt) {
  RunResult result = ExemptRun();
  result.facts.exemptions[0].author = "\xff";
  const std::string text = ReleaseJson(ReleaseOf(std::move(result)));
  EXPECT_EQ(json::parse(text)["exemptions"][0]["author"], "\xef\xbf\xbd");
}

}  // namespace
}  // namespace gatedyno
