#include "harness/record/agreement_json.h"

#include <stdexcept>
#include <vector>

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

using nlohmann::json;

TEST(AgreementJsonTest, RulesReadBack) {
  const json written = json::parse(R"([
    {"effort": 0.3},
    {"cells": "nor*", "pins": "a", "outputs": "y", "corners": "slow_*",
     "edge": "rise", "effort": 0.3, "parasitic": 0.4}])");
  const std::vector<ToleranceRule> rules = {
      {.where = {}, .effort = 0.3, .parasitic = std::nullopt},
      {.where = {.cells = "nor*",
                 .pins = "a",
                 .outputs = "y",
                 .corners = "slow_*",
                 .edge = Edge::kRise},
       .effort = 0.3,
       .parasitic = 0.4}};
  EXPECT_EQ(ReadToleranceRules(written), rules);
  EXPECT_EQ(ToleranceRulesToJson(rules), written);
}

TEST(AgreementJsonTest, ExemptionsReadBack) {
  const json written = json::parse(R"([
    {"reason": "r", "author": "a", "expires": "2027-03-31"},
    {"cells": "maj3_rep", "pins": "c", "edge": "fall",
     "quantity": "parasitic", "reason": "shared \"diffusion\"",
     "author": "M. Ober", "expires": "2027-03-31"},
    {"quantity": "effort", "reason": "r", "author": "a",
     "expires": "2020-01-01"}])");
  const std::vector<Exemption> exemptions = {
      {.where = {},
       .quantity = std::nullopt,
       .reason = "r",
       .author = "a",
       .expires = "2027-03-31"},
      {.where = {.cells = "maj3_rep", .pins = "c", .edge = Edge::kFall},
       .quantity = Quantity::kParasitic,
       .reason = "shared \"diffusion\"",
       .author = "M. Ober",
       .expires = "2027-03-31"},
      {.where = {},
       .quantity = Quantity::kEffort,
       .reason = "r",
       .author = "a",
       .expires = "2020-01-01"}};
  EXPECT_EQ(ReadExemptions(written), exemptions);
  EXPECT_EQ(ExemptionsToJson(exemptions), written);
}

TEST(AgreementJsonTest, UnknownNamesAreRefused) {
  try {
    ReadToleranceRules(json::parse(R"([{"edge": "up", "effort": 1}])"));
    ADD_FAILURE() << "read";
  } catch (const std::runtime_error& thrown) {
    EXPECT_STREQ(thrown.what(), "unknown edge 'up'");
  }
  EXPECT_THROW(ReadExemptions(json::parse(R"([{"reason": "r"}])")),
               json::exception);
}

// The last day counts as one on which it holds.
TEST(AgreementJsonTest, AnExemptionHoldsThroughItsLastDay) {
  const Exemption exemption{.where = {},
                            .quantity = std::nullopt,
                            .reason = "r",
                            .author = "a",
                            .expires = "2026-12-02"};
  EXPECT_FALSE(IsExpired(exemption, "2026-12-01"));
  EXPECT_FALSE(IsExpired(exemption, "2026-12-02"));
  EXPECT_TRUE(IsExpired(exemption, "2026-12-03"));
  EXPECT_TRUE(IsExpired(exemption, "2027-01-01"));
}

}  // namespace
}  // namespace gatedyno
