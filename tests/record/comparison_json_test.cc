#include "harness/record/comparison_json.h"

#include <cmath>
#include <limits>
#include <string>

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

using nlohmann::json;

Comparison Example() {
  Comparison comparison;
  comparison.arc = {.cell = "aoi21",
                    .pin = "a",
                    .output = "y",
                    .input_edge = Edge::kRise,
                    .edge = Edge::kFall,
                    .side = {{"b", true}, {"c", false}}};
  comparison.corner = "typical";
  comparison.estimate = {2.0, 2.75, 3.0, 1.5, 0.75};
  comparison.tolerance = {0.1, 0.3};
  comparison.points = {{1, 5.1e-12, 3e-12, 4e-12, "00ff"},
                       {4, 9.9e-12, 3e-12, 6e-12, "01ff"}};
  comparison.line = Line{1.6e-12, 3.5e-12, 1e-15, 4e-15, -3e-30, 2e-15, 6};
  comparison.effort = {1.0 / 3.0, 0.01};
  comparison.effort_mean = {1.25, 0.012};
  comparison.parasitic = {2.5, 0.1};
  comparison.hand_parasitic = 3.9;
  comparison.effort_difference = -0.17;
  comparison.parasitic_difference = 0.07;
  comparison.effort_difference_expanded = 0.015;
  comparison.parasitic_difference_expanded = 0.06;
  comparison.bent = true;
  comparison.verdict = Verdict::kBeyond;
  comparison.reason = "g 1.11 against 1.33 by hand: -17 % (allowed 10 %)";
  return comparison;
}

const char* const kExampleText = R"json({
  "arc": {"cell": "aoi21", "pin": "a", "output": "y", "input_edge": "rise",
          "edge": "fall",
          "side": [{"pin": "b", "high": true}, {"pin": "c", "high": false}]},
  "corner": "typical",
  "estimate": {"effort": 2.0, "parasitic_by_nodes": 2.75,
               "parasitic_by_elmore": 3.0, "fixed_first_effort": 1.5,
               "inner_effort": 0.75},
  "tolerance": {"effort": 0.1, "parasitic": 0.3},
  "points": [{"fanout": 1.0, "delay_s": 5.1e-12, "input_transition_s": 3e-12,
              "output_transition_s": 4e-12, "job_key": "00ff"},
             {"fanout": 4.0, "delay_s": 9.9e-12, "input_transition_s": 3e-12,
              "output_transition_s": 6e-12, "job_key": "01ff"}],
  "line": {"slope_s": 1.6e-12, "intercept_s": 3.5e-12, "slope_u_s": 1e-15,
           "intercept_u_s": 4e-15, "covariance_s2": -3e-30,
           "largest_residual_s": 2e-15, "points": 6},
  "effort": {"value": 0.3333333333333333, "u": 0.01},
  "effort_mean": {"value": 1.25, "u": 0.012},
  "parasitic": {"value": 2.5, "u": 0.1},
  "hand_parasitic": 3.9,
  "effort_difference": -0.17,
  "parasitic_difference": 0.07,
  "effort_difference_expanded": 0.015,
  "parasitic_difference_expanded": 0.06,
  "bent": true,
  "verdict": "beyond",
  "reason": "g 1.11 against 1.33 by hand: -17 % (allowed 10 %)"
})json";

TEST(ComparisonJsonTest, FieldsCarryTheirUnits) {
  EXPECT_EQ(ComparisonToJson(Example()), json::parse(kExampleText));
}

TEST(ComparisonJsonTest, EveryFieldComesBack) {
  // Through text, as in a store; all digits of a double survive.
  const std::string text = ComparisonToJson(Example()).dump();
  const Result<Comparison> back = ComparisonFromJson(json::parse(text));
  ASSERT_TRUE(back.ok());
  EXPECT_EQ(ComparisonToJson(*back).dump(), text);
  EXPECT_EQ(back->arc, Example().arc);
  EXPECT_EQ(back->effort.value, 1.0 / 3.0);
  EXPECT_EQ(back->line->covariance_s2, -3e-30);
  EXPECT_EQ(back->estimate.fixed_first_effort, 1.5);
  EXPECT_EQ(back->estimate.inner_effort, 0.75);
  EXPECT_EQ(back->points.size(), 2U);
  EXPECT_EQ(back->verdict, Verdict::kBeyond);
}

TEST(ComparisonJsonTest, WhatWasNotMeasuredIsNull) {
  Comparison comparison = Example();
  comparison.line.reset();
  comparison.verdict = Verdict::kNotMeasured;
  comparison.estimate.fixed_first_effort.reset();
  const json written = ComparisonToJson(comparison);
  for (const char* field : {"line",
                            "effort",
                            "effort_mean",
                            "parasitic",
                            "effort_difference",
                            "parasitic_difference"}) {
    EXPECT_TRUE(written.at(field).is_null()) << field;
  }
  EXPECT_EQ(written.at("verdict"), "not measured");
  const Result<Comparison> back = ComparisonFromJson(written);
  ASSERT_TRUE(back.ok());
  EXPECT_FALSE(back->line.has_value());
  EXPECT_FALSE(back->effort.u.has_value());
  EXPECT_EQ(ComparisonToJson(*back), written);
}

TEST(ComparisonJsonTest, NumbersThatAreNotFiniteAreNull) {
  Comparison comparison = Example();
  comparison.points[0].delay_s = std::numeric_limits<double>::quiet_NaN();
  comparison.estimate.parasitic_by_elmore =
      std::numeric_limits<double>::infinity();
  comparison.effort.u.reset();
  const json written = ComparisonToJson(comparison);
  EXPECT_TRUE(written.at("points").at(0).at("delay_s").is_null());
  EXPECT_TRUE(written.at("estimate").at("parasitic_by_elmore").is_null());
  EXPECT_TRUE(written.at("effort").at("u").is_null());
  const Result<Comparison> back = ComparisonFromJson(written);
  ASSERT_TRUE(back.ok());
  EXPECT_TRUE(std::isnan(back->points[0].delay_s));
  EXPECT_FALSE(back->effort.u.has_value());
}

TEST(ComparisonJsonTest, SaysWhatIsWrong) {
  struct Case {
    const char* pointer;
    json value;
    const char* message;
  };
  const Case cases[] = {
      {"/verdict", "fine", "not a comparison: unknown verdict 'fine'"},
      {"/arc/edge", "up", "not a comparison: unknown edge 'up'"},
      {"/bent",
       3,
       "not a comparison: [json.exception.type_error.302] type must be "
       "boolean, "
       "but is number"},
  };
  for (const Case& test : cases) {
    json written = ComparisonToJson(Example());
    written[json::json_pointer(test.pointer)] = test.value;
    const Result<Comparison> back = ComparisonFromJson(written);
    ASSERT_FALSE(back.ok()) << test.pointer;
    EXPECT_EQ(back.error().message, test.message);
    EXPECT_EQ(back.error().kind, ErrorKind::kInternal);
  }
}

// But for what gatedyno 0.1 did not write.
TEST(ComparisonJsonTest, AMissingFieldIsNoComparison) {
  const json whole = ComparisonToJson(Example());
  for (const auto& field : whole.items()) {
    json written = whole;
    written.erase(field.key());
    EXPECT_EQ(ComparisonFromJson(written).ok(),
              field.key().ends_with("_expanded"))
        << field.key();
  }
}

TEST(CalibrationJsonTest, RoundTrip) {
  Calibration calibration;
  calibration.corner = {"slow hot", "ss", 0.9, 125.0};
  calibration.tau_rise_s = {1.6e-12, 2e-15};
  calibration.tau_fall_s = {1.4e-12, std::nullopt};
  calibration.tau_s = {1.5e-12, 1e-15};
  calibration.p_inv = {1.57, 0.01};
  calibration.fo4_s = 8.3e-12;
  const json written = CalibrationToJson(calibration);
  EXPECT_EQ(written, json::parse(R"({
    "corner": {"name": "slow hot", "process": "ss", "supply_v": 0.9,
               "temperature_c": 125.0},
    "tau_rise_s": {"value": 1.6e-12, "u": 2e-15},
    "tau_fall_s": {"value": 1.4e-12, "u": null},
    "tau_s": {"value": 1.5e-12, "u": 1e-15},
    "p_inv": {"value": 1.57, "u": 0.01},
    "fo4_s": 8.3e-12})"));
  const Result<Calibration> back = CalibrationFromJson(written);
  ASSERT_TRUE(back.ok());
  EXPECT_EQ(CalibrationToJson(*back), written);
  EXPECT_EQ(CalibrationFromJson(json::array()).error().kind,
            ErrorKind::kInternal);
}

}  // namespace
}  // namespace gatedyno
