#include "harness/flow/agreement_warnings.h"

#include <string>
#include <vector>

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

Exemption For(const ArcPattern& where) {
  return {.where = where,
          .quantity = Quantity::kParasitic,
          .reason = "known",
          .author = "M. Ober",
          .expires = "2027-03-31"};
}

PreparedRun Prepared(std::vector<ToleranceRule> rules,
                     std::vector<Exemption> exemptions) {
  Plan plan;
  plan.node = "p45";
  plan.cells = {"inv", "nand2"};
  plan.corners = {"typical", "slow_nom_25"};
  plan.tolerance_rules = std::move(rules);
  plan.exemptions = std::move(exemptions);
  Result<PreparedRun> run = PrepareRun(plan);
  EXPECT_TRUE(run.ok()) << run.error().message;
  return *std::move(run);
}

TEST(AgreementWarningsTest, NamesWhatCoversNoArc) {
  const ArcPattern misspelt{.cells = "nadn2", .edge = {}};
  const ArcPattern no_such_pin{.cells = "inv", .pins = "b", .edge = {}};
  const ArcPattern other_corner{.corners = "fast_*", .edge = Edge::kRise};
  const PreparedRun run =
      Prepared({{.where = {.cells = "nand*", .edge = Edge::kRise},
                 .effort = 0.3,
                 .parasitic = {}},
                {.where = other_corner, .effort = 0.3, .parasitic = {}}},
               {For(misspelt),
                For({.cells = "nand2", .pins = "b", .edge = {}}),
                For(no_such_pin)});
  const std::vector<std::string> expected = {
      "/tolerances/rules/1 of the plan (rise, corner fast_*) covers no arc of "
      "this run",
      "/exemptions/0 of the plan (nadn2) covers no arc of this run",
      "/exemptions/2 of the plan (inv, pin b) covers no arc of this run"};
  EXPECT_EQ(AgreementWarnings(run), expected);
  EXPECT_EQ(run.warnings, expected);
}

TEST(AgreementWarningsTest, NothingAgreedNothingToWarnOf) {
  EXPECT_TRUE(AgreementWarnings(Prepared({}, {})).empty());
}

}  // namespace
}  // namespace gatedyno
