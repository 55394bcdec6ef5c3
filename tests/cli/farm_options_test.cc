#include "harness/cli/farm_options.h"

#include <algorithm>
#include <string>
#include <vector>

#include <gmock/gmock.h>
#include <gtest/gtest.h>

namespace gatedyno {
namespace {

using testing::ElementsAre;

constexpr int kWorkers = 3;

FarmCliOptions Parse(std::vector<std::string> arguments) {
  CLI::App app;
  FarmCliOptions options;
  AddFarmOptions(app, options);
  std::reverse(arguments.begin(), arguments.end());  // As CLI11 wants them.
  app.parse(arguments);
  return options;
}

TEST(FarmOptionsTest, BecomeTheFarms) {
  const FarmCliOptions given = Parse({"--farm",
                                      "slurm",
                                      "--farm-folder",
                                      "shared/farm",
                                      "--farm-jobs",
                                      "40",
                                      "--farm-sbatch=--time=60",
                                      "--farm-sbatch",
                                      "-pfast"});
  ASSERT_EQ(given.farm, "slurm");
  const auto farm = FarmOptionsOf(given, kWorkers);
  ASSERT_TRUE(farm.ok()) << farm.error().message;
  EXPECT_EQ(farm->folder, "shared/farm");
  EXPECT_EQ(farm->jobs_per_task, 40);
  EXPECT_EQ(farm->workers_per_task, kWorkers);
  EXPECT_THAT(farm->sbatch_arguments, ElementsAre("--time=60", "-pfast"));
}

TEST(FarmOptionsTest, NoneMeansThisMachine) {
  const FarmCliOptions none = Parse({});
  EXPECT_FALSE(none.farm.has_value());
  EXPECT_TRUE(CheckNoFarmOptions(none).ok());
}

struct Row {
  std::vector<std::string> arguments;
  std::string message;
};

TEST(FarmOptionsTest, SayWhatIsMissingOrWrong) {
  const Row rows[] = {
      {{"--farm", "slurm"},
       "--farm: also needs --farm-folder, a folder that all nodes share"},
      {{"--farm", "slurm", "--farm-folder", "f", "--farm-sbatch", "time=60"},
       "--farm-sbatch: time=60: must begin with -, as in --time=60"},
      {{"--farm-folder", "f"}, "--farm-folder: only with --farm slurm"},
      {{"--farm-jobs", "9"}, "--farm-jobs: only with --farm slurm"},
      {{"--farm-sbatch=--time=9"}, "--farm-sbatch: only with --farm slurm"},
  };
  for (const Row& row : rows) {
    const FarmCliOptions options = Parse(row.arguments);
    const auto farm = FarmOptionsOf(options, kWorkers);
    const Status none = CheckNoFarmOptions(options);
    const std::string message =
        !options.farm.has_value() ? none.error().message : farm.error().message;
    EXPECT_EQ(message, row.message);
  }
}

TEST(FarmOptionsTest, RefusesAnEngineItDoesNotKnow) {
  EXPECT_THROW(Parse({"--farm", "other"}), CLI::ParseError);
  EXPECT_THROW(Parse({"--farm-jobs", "0"}), CLI::ParseError);
}

}  // namespace
}  // namespace gatedyno
