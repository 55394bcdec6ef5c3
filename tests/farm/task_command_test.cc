#include "harness/farm/task_command.h"

#include <cstdlib>

#include <gtest/gtest.h>

#include "harness/base/file.h"
#include "harness/farm/command.h"
#include "tests/support/temporary_folder.h"

namespace gatedyno {
namespace {

// A shell hands the program exactly these, whatever the folder is called.
TEST(TaskCommandTest, SurvivesTheShell) {
  TemporaryFolder folder;
  FarmOptions options;
  options.program =
      folder.WriteScript("it's a program", "printf '%s\\n' \"$@\"");
  options.worker_program = "/opt/a worker";
  options.workers_per_task = 8;
  options.memory_limit_bytes = 1'000'000;
  options.simulator = "spice (of 'today')";
  options.publish_every = std::chrono::milliseconds(1500);
  const std::string command =
      TaskShellText(options, RoundFolder("/f $x `y` \"z\"", "round-1"));
  ::setenv("SLURM_ARRAY_TASK_ID", "12", 1);
  const auto end = RunCommand("sh", {"-c", command}, std::chrono::seconds(20));
  ::unsetenv("SLURM_ARRAY_TASK_ID");
  ASSERT_TRUE(end.ok());
  EXPECT_EQ(
      end->output,
      "task\n/f $x `y` \"z\"\nround-1\n12\n--publish-every\n1.5\n"
      "--workers\n8\n--worker-program\n/opt/a worker\n"
      "--worker-memory-bytes\n1000000\n--simulator\nspice (of 'today')\n");
}

}  // namespace
}  // namespace gatedyno
