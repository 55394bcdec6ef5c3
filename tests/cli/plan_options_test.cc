#include "harness/cli/plan_options.h"

#include <string>
#include <vector>

#include <gtest/gtest.h>

#include "tests/support/temporary_folder.h"

namespace gatedyno {
namespace {

Plan MustPlan(const PlanOptions& options) {
  const Result<Plan> plan = PlanOf(options);
  EXPECT_TRUE(plan.ok()) << plan.error().message;
  return plan.ok() ? *plan : Plan();
}

TEST(PlanOptionsTest, CellsAloneMakeAPlan) {
  PlanOptions options;
  options.what = {"inv", "nand*"};
  const Plan plan = MustPlan(options);
  EXPECT_EQ(plan.cells, options.what);
  EXPECT_EQ(plan.node, "p45");
  EXPECT_EQ(plan.title, "cells on p45");
  EXPECT_TRUE(plan.corners.empty());
  EXPECT_EQ(plan.fanouts, Plan().fanouts);
  EXPECT_EQ(plan.drive, Drive::kMatched);
}

TEST(PlanOptionsTest, OptionsOverrideThePlan) {
  TemporaryFolder folder;
  PlanOptions options;
  options.what = {folder
                      .Write("p.json",
                             R"({"format": "gatedyno-plan/1", "node": "p45",
                                 "cells": ["inv"], "corners": ["typical"],
                                 "fanouts": [1, 2],
                                 "tolerances": {"effort": 0.1}})")
                      .string()};
  const Plan as_written = MustPlan(options);
  EXPECT_EQ(as_written.fanouts, (std::vector<double>{1, 2}));
  EXPECT_EQ(as_written.tolerance.effort, 0.1);

  options.node = "p65";
  options.corners = {"slow*"};
  options.fanouts = {3, 5, 7};
  options.drive = "self";
  options.all_side_vectors = true;
  options.effort_tolerance = 0.2;
  options.parasitic_tolerance = 0.3;
  const Plan plan = MustPlan(options);
  EXPECT_EQ(plan.node, "p65");
  EXPECT_EQ(plan.cells, std::vector<std::string>{"inv"});
  EXPECT_EQ(plan.corners, std::vector<std::string>{"slow*"});
  EXPECT_EQ(plan.fanouts, (std::vector<double>{3, 5, 7}));
  EXPECT_EQ(plan.drive, Drive::kSelf);
  EXPECT_TRUE(plan.all_side_vectors);
  EXPECT_EQ(plan.tolerance.effort, 0.2);
  EXPECT_EQ(plan.tolerance.parasitic, 0.3);
}

}  // namespace
}  // namespace gatedyno
