// gatedyno run on a farm gives what it gives on one machine.

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "tests/cli/program.h"
#include "tests/farm/fake_slurm.h"

namespace gatedyno {
namespace {

using ::testing::HasSubstr;

TEST(FarmProgramTest, TheSamePlanGivesTheSameNumbers) {
  const FakeSlurm slurm;
  const Program program;
  const Ended here = program.Run({"run", "inv", "nand2", "--csv", "here.csv"});
  ASSERT_EQ(here.exit_code, 0) << here.err;
  const Ended farm = program.Run({"run",
                                  "inv",
                                  "nand2",
                                  "--farm",
                                  "slurm",
                                  "--farm-folder",
                                  (program.path() / "shared").string(),
                                  "--farm-jobs",
                                  "4",
                                  "--workers",
                                  "2",
                                  "--store",
                                  "farm.db",
                                  "--csv",
                                  "farm.csv"});
  EXPECT_EQ(farm.exit_code, 0) << farm.err;
  EXPECT_GE(slurm.arrays_submitted(), 2);  // The reference first.
  EXPECT_EQ(program.Read("farm.csv"), program.Read("here.csv"));
}

TEST(FarmProgramTest, SaysWhichOptionItLacks) {
  const Ended ended = Program().Run({"run", "inv", "--farm", "slurm"});
  EXPECT_EQ(ended.exit_code, 2);
  EXPECT_THAT(ended.err, HasSubstr("--farm-folder"));
}

}  // namespace
}  // namespace gatedyno
