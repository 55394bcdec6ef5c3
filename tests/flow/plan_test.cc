#include "harness/flow/plan.h"

#include <string>
#include <vector>

#include <gtest/gtest.h>

#include "tests/support/temporary_folder.h"

namespace gatedyno {
namespace {

using nlohmann::json;

json SmallPlan() {
  return {{"format", "gatedyno-plan/1"}, {"node", "p45"}, {"cells", {"inv"}}};
}

class PlanTest : public ::testing::Test {
 protected:
  Result<Plan> Load(const json& plan) {
    return LoadPlan(folder_.Write("night.json", plan.dump()));
  }
  std::string File() const { return (folder_.path() / "night.json").string(); }

  TemporaryFolder folder_;
};

TEST_F(PlanTest, FillsInWhatIsLeftOut) {
  const Result<Plan> plan = Load(SmallPlan());
  ASSERT_TRUE(plan.ok()) << plan.error().message;
  EXPECT_EQ(plan->title, "night");
  EXPECT_EQ(plan->node, "p45");
  EXPECT_EQ(plan->cells, std::vector<std::string>{"inv"});
  EXPECT_TRUE(plan->corners.empty());
  EXPECT_TRUE(plan->fanouts.empty());
  EXPECT_EQ(plan->accuracy, kDefaultAccuracy);
  EXPECT_EQ(plan->drive, Drive::kMatched);
  EXPECT_FALSE(plan->all_side_vectors);
  EXPECT_EQ(plan->tolerance.effort, Tolerance().effort);
  EXPECT_EQ(plan->tolerance.parasitic, Tolerance().parasitic);
  EXPECT_EQ(plan->folder, folder_.path());
}

json FullPlan() {
  return {{"format", "gatedyno-plan/1"},
          {"title", "gates of an interrupt arbiter"},
          {"node", "nodes/my.json"},
          {"cells", {"nand*", "cells/own.sp"}},
          {"corners", {"typical", "slow_*"}},
          {"fanouts", {0.5, 2, 4.5}},
          {"accuracy", 0.0005},
          {"drive", "self"},
          {"side_vectors", "all"},
          {"tolerances",
           {{"effort", 0.1},
            {"parasitic", 0.2},
            {"rules",
             json::array({{{"cells", "nor*"},
                           {"edge", "rise"},
                           {"corners", "slow_*"},
                           {"parasitic", 0.4}}})}}},
          {"exemptions",
           json::array({{{"cells", "maj3_rep"},
                         {"pins", "c"},
                         {"quantity", "parasitic"},
                         {"reason", "drain shared with the carry gate"},
                         {"author", "M. Ober"},
                         {"expires", "2028-02-29"}}})}};
}

TEST_F(PlanTest, TakesEverythingGivenAndSaysItAgain) {
  const Result<Plan> plan = Load(FullPlan());
  ASSERT_TRUE(plan.ok()) << plan.error().message;
  EXPECT_EQ(plan->title, "gates of an interrupt arbiter");
  EXPECT_EQ(plan->corners, (std::vector<std::string>{"typical", "slow_*"}));
  EXPECT_EQ(plan->fanouts, (std::vector<double>{0.5, 2, 4.5}));
  EXPECT_EQ(plan->accuracy, 0.0005);
  EXPECT_EQ(plan->drive, Drive::kSelf);
  EXPECT_TRUE(plan->all_side_vectors);
  EXPECT_EQ(plan->tolerance.effort, 0.1);
  EXPECT_EQ(plan->tolerance.parasitic, 0.2);
  EXPECT_EQ(
      plan->tolerance_rules,
      (std::vector<ToleranceRule>{
          {.where = {.cells = "nor*", .corners = "slow_*", .edge = Edge::kRise},
           .effort = std::nullopt,
           .parasitic = 0.4}}));
  EXPECT_EQ(plan->exemptions,
            (std::vector<Exemption>{
                {.where = {.cells = "maj3_rep", .pins = "c", .edge = {}},
                 .quantity = Quantity::kParasitic,
                 .reason = "drain shared with the carry gate",
                 .author = "M. Ober",
                 .expires = "2028-02-29"}}));
  EXPECT_EQ(PlanToJson(*plan), FullPlan());
}

// A store compares the texts of plans to find the run that goes on.
TEST_F(PlanTest, NothingAgreedIsNotWritten) {
  const json written = PlanToJson(*Load(SmallPlan()));
  EXPECT_FALSE(written.contains("exemptions"));
  EXPECT_FALSE(written["tolerances"].contains("rules"));
}

struct Refused {
  const char* key;
  json value;  // Null: the key is removed.
  std::string message;
};

std::vector<Refused> RefusedPlans() {
  return {
      {"format", nullptr, "/: key 'format' is missing"},
      {"node", nullptr, "/: key 'node' is missing"},
      {"cells", nullptr, "/: key 'cells' is missing"},
      {"fanout",
       {1, 2},
       "/: unknown key 'fanout'; known are: accuracy, cells, corners, drive, "
       "exemptions, fanouts, format, node, side_vectors, title, tolerances"},
      {"format",
       "gatedyno-plan/9",
       R"(/format: expected the value "gatedyno-plan/1"; got )"
       R"("gatedyno-plan/9")"},
      {"title", 7, "/title: expected string; got 7"},
      {"node", 45, "/node: expected string, at least 1 long; got 45"},
      {"node", "", R"(/node: expected string, at least 1 long; got "")"},
      {"cells",
       "inv",
       R"(/cells: expected array, at least 1 of them; got "inv")"},
      {"cells",
       json::array(),
       "/cells: expected array, at least 1 of them; got []"},
      {"cells",
       {"inv", 3},
       "/cells/1: expected string, at least 1 long; got 3"},
      {"corners",
       json::array(),
       "/corners: expected array, at least 1 of them; got []"},
      {"corners",
       {true},
       "/corners/0: expected string, at least 1 long; got true"},
      {"fanouts",
       json::array(),
       "/fanouts: expected array, at least 2 of them, no two alike; got []"},
      {"fanouts",
       {0},
       "/fanouts/0: expected number, more than 0, at most 1000; got 0"},
      {"fanouts",
       {4},
       "/fanouts: expected array, at least 2 of them, no two alike; got [4]"},
      {"fanouts",
       {4, 4},
       "/fanouts: expected array, at least 2 of them, no two alike; got [4,4]"},
      {"accuracy",
       1e-6,
       "/accuracy: expected number, at least 0.0001, at most 0.05; got 1e-06"},
      {"fanouts",
       {1, -2},
       "/fanouts/1: expected number, more than 0, at most 1000; got -2"},
      {"fanouts",
       {1, 1001},
       "/fanouts/1: expected number, more than 0, at most 1000; got 1001"},
      {"fanouts",
       {1, "4"},
       R"(/fanouts/1: expected number, more than 0, at most 1000; got "4")"},
      {"fanouts",
       "1,2,3",
       R"(/fanouts: expected array, at least 2 of them, no two alike; got )"
       R"("1,2,3")"},
      {"drive",
       "step",
       R"(/drive: expected one of ["matched","self"]; got "step")"},
      {"side_vectors",
       true,
       R"(/side_vectors: expected one of ["worst","all"]; got true)"},
      {"tolerances", 0.1, "/tolerances: expected object; got 0.1"},
      {"tolerances",
       {{"effort", 0}},
       "/tolerances/effort: expected number, more than 0, at most 10; got 0"},
      {"tolerances",
       {{"parasitic", "35 %"}},
       R"(/tolerances/parasitic: expected number, more than 0, at most 10; )"
       R"(got "35 %")"},
      {"tolerances",
       {{"g", 0.1}},
       "/tolerances: unknown key 'g'; known are: effort, parasitic, rules"},
  };
}

TEST_F(PlanTest, SaysWhatIsWrongAndWhere) {
  for (const Refused& refused : RefusedPlans()) {
    json plan = SmallPlan();
    if (refused.value.is_null()) {
      plan.erase(refused.key);
    } else {
      plan[refused.key] = refused.value;
    }
    const Result<Plan> loaded = Load(plan);
    ASSERT_FALSE(loaded.ok()) << refused.message;
    EXPECT_EQ(loaded.error().kind, ErrorKind::kBadInput);
    EXPECT_EQ(loaded.error().message, File() + ": " + refused.message);
  }
}

struct RefusedAgreement {
  const char* json_text;
  std::string message;
};

constexpr const char* kSigned =
    R"("reason": "r", "author": "a", "expires": "2027-03-31")";

TEST_F(PlanTest, SaysWhatIsWrongWithARule) {
  const RefusedAgreement cases[] = {
      {R"({"effort": 0.3})",
       R"(/tolerances/rules: expected array; got {"effort":0.3})"},
      {R"([{"cells": "nor*"}])",
       "/tolerances/rules/0: key 'effort' or 'parasitic' is missing: a rule "
       "says what it allows"},
      {R"([{"effort": 0.3}, {"effort": -1}])",
       "/tolerances/rules/1/effort: expected number, more than 0, at most 10; "
       "got -1"},
      {R"([{"edge": "up", "effort": 0.3}])",
       R"(/tolerances/rules/0/edge: expected one of ["rise","fall"]; got "up")"},
      {R"([{"cells": "", "effort": 0.3}])",
       R"(/tolerances/rules/0/cells: expected string, at least 1 long; got "")"},
      {R"([{"cell": "inv", "effort": 0.3}])",
       "/tolerances/rules/0: unknown key 'cell'; known are: cells, corners, "
       "edge, effort, outputs, parasitic, pins"},
  };
  for (const RefusedAgreement& test : cases) {
    json plan = SmallPlan();
    plan["tolerances"]["rules"] = json::parse(test.json_text);
    const Result<Plan> loaded = Load(plan);
    ASSERT_FALSE(loaded.ok()) << test.json_text;
    EXPECT_EQ(loaded.error().kind, ErrorKind::kBadInput);
    EXPECT_EQ(loaded.error().message, File() + ": " + test.message);
  }
}

TEST_F(PlanTest, SaysWhatIsWrongWithAnExemption) {
  const std::string with = kSigned;
  const RefusedAgreement cases[] = {
      {R"({"reason": "r", "author": "a"})",
       "/exemptions/1: key 'expires' is missing"},
      {R"({"reason": "r", "expires": "2027-03-31"})",
       "/exemptions/1: key 'author' is missing"},
      {R"({"author": "a", "expires": "2027-03-31"})",
       "/exemptions/1: key 'reason' is missing"},
      {R"({"reason": "", "author": "a", "expires": "2027-03-31"})",
       R"(/exemptions/1/reason: expected string, at least 1 long; got "")"},
      {R"({"reason": " \n", "author": "a", "expires": "2027-03-31"})",
       "/exemptions/1/reason: must not be blank"},
      {R"({"reason": "r", "author": "\t", "expires": "2027-03-31"})",
       "/exemptions/1/author: must not be blank"},
      {R"({"reason": "r", "author": "a", "expires": "31.3.2027"})",
       R"(/exemptions/1/expires: expected a day of the calendar, as )"
       R"("2026-12-31"; got "31.3.2027")"},
      {R"({"reason": "r", "author": "a", "expires": "2027-02-29"})",
       R"(/exemptions/1/expires: expected a day of the calendar, as )"
       R"("2026-12-31"; got "2027-02-29")"},
      {R"({"reason": "r", "author": "a", "expires": 2027})",
       "/exemptions/1/expires: expected string, at least 1 long; got 2027"},
      {R"({"quantity": "g", "reason": "r", "author": "a",
           "expires": "2027-03-31"})",
       R"(/exemptions/1/quantity: expected one of ["effort","parasitic"]; )"
       R"(got "g")"},
      {R"({"corner": "*", "reason": "r", "author": "a",
           "expires": "2027-03-31"})",
       "/exemptions/1: unknown key 'corner'; known are: author, cells, "
       "corners, "
       "edge, expires, outputs, pins, quantity, reason"},
  };
  for (const RefusedAgreement& test : cases) {
    json plan = SmallPlan();
    plan["exemptions"] = {json::parse("{" + with + "}"),
                          json::parse(test.json_text)};
    const Result<Plan> loaded = Load(plan);
    ASSERT_FALSE(loaded.ok()) << test.json_text;
    EXPECT_EQ(loaded.error().kind, ErrorKind::kBadInput);
    EXPECT_EQ(loaded.error().message, File() + ": " + test.message);
  }
}

TEST_F(PlanTest, APlanIsAnObject) {
  const Result<Plan> loaded = Load(json::array());
  ASSERT_FALSE(loaded.ok());
  EXPECT_EQ(loaded.error().message, File() + ": /: expected object; got []");
}

struct Fanouts {
  std::vector<double> given;
  std::string message;  // Empty: accepted.
};

TEST(CheckFanoutsTest, RefusesWhatTheSchemaRefuses) {
  const std::vector<Fanouts> cases = {
      {{1, 2}, ""},
      {{0.5, 1000}, ""},
      {{}, "--fanouts: a line needs two different ones, got 0"},
      {{0}, "--fanouts: 0: must be above 0 and at most 1000"},
      {{4}, "--fanouts: a line needs two different ones, got 1"},
      {{4, 4}, "--fanouts: 4 is there twice"},
      {{1, 2, 2}, "--fanouts: 2 is there twice"},
      {{1, -2}, "--fanouts: -2: must be above 0 and at most 1000"},
      {{1, 1001}, "--fanouts: 1001: must be above 0 and at most 1000"},
      {{1, std::stod("nan")},
       "--fanouts: nan: must be above 0 and at most 1000"},
  };
  for (const Fanouts& tried : cases) {
    const Status status = CheckFanouts(tried.given);
    EXPECT_EQ(status.ok() ? "" : status.error().message, tried.message);
  }
}

}  // namespace
}  // namespace gatedyno
