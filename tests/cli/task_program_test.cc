// The command that Slurm calls, of the built program.

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "tests/cli/program.h"

namespace gatedyno {
namespace {

using ::testing::HasSubstr;
using ::testing::Not;

TEST(TaskProgramTest, IsForProgramsAndNotInTheList) {
  EXPECT_THAT(Program().Run({"--help"}).out, Not(HasSubstr("task")));
  const Ended help = Program().Run({"task", "--help"});
  EXPECT_EQ(help.exit_code, 0);
  EXPECT_THAT(help.out, HasSubstr("Usage: gatedyno task"));
}

TEST(TaskProgramTest, SaysThatTheFolderIsNotShared) {
  const Ended ended = Program().Run({"task", "/nowhere", "round-1", "4"});
  EXPECT_EQ(ended.exit_code, 4);
  EXPECT_EQ(ended.err,
            "gatedyno: /nowhere/round-1/share-4.jobs: cannot be read: No such "
            "file or directory; do this node and the one that runs gatedyno "
            "share the folder /nowhere?\n");
}

}  // namespace
}  // namespace gatedyno
