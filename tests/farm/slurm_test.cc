#include "harness/farm/slurm.h"

#include <chrono>

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "tests/farm/fake_slurm.h"
#include "tests/support/temporary_folder.h"

namespace gatedyno {
namespace {

using testing::ElementsAre;

constexpr std::chrono::seconds kLong(20);
constexpr const char* kNeeded =
    "; the farm needs Slurm's commands, and a cluster that answers, on the "
    "machine that runs gatedyno";

// One command of the four that says what a test wants it to say.
class SayingSlurm {
 public:
  explicit SayingSlurm(const char* command, const std::string& script)
      : path_before_(std::getenv("PATH")) {
    folder_.WriteScript(command, script);
    ::setenv("PATH", (folder_.path().string() + ":" + path_before_).c_str(), 1);
  }
  ~SayingSlurm() { ::setenv("PATH", path_before_.c_str(), 1); }
  SayingSlurm(const SayingSlurm&) = delete;
  SayingSlurm& operator=(const SayingSlurm&) = delete;

 private:
  TemporaryFolder folder_;
  std::string path_before_;
};

struct SizeRow {
  std::string script;
  int size;  // 0: it fails.
  std::string message;
};

TEST(SlurmTest, ReadsHowLargeAnArrayMayBe) {
  const SizeRow rows[] = {
      {"echo 'MaxArrayTasks = 5'; echo 'MaxArraySize            = 1001'",
       1001,
       ""},
      {"echo 'MaxArraySize = 0'",
       0,
       "this Slurm takes no task arrays (MaxArraySize = 0)"},
      {"echo 'MaxJobCount = 7'",
       0,
       "scontrol show config names no MaxArraySize"},
      {"echo 'slurm_load_ctl_conf error: no contact' >&2; exit 1",
       0,
       "scontrol failed with exit code 1: slurm_load_ctl_conf error: no "
       "contact"},
      {"exit 2", 0, "scontrol failed with exit code 2: it gave no reason"},
  };
  for (const SizeRow& row : rows) {
    const SayingSlurm saying("scontrol", row.script);
    const auto size = Slurm(kLong).MaxArraySize();
    ASSERT_EQ(size.ok(), row.size > 0) << row.script;
    if (size.ok()) {
      EXPECT_EQ(*size, row.size);
    } else {
      EXPECT_EQ(size.error().message, row.message);
    }
  }
}

TEST(SlurmTest, SubmitsWithTheUsersArgumentsBetweenOurs) {
  const FakeSlurm fake;
  const auto array = Slurm(kLong).Submit({.queue_name = "gatedyno-x",
                                          .indices = {0, 1, 5},
                                          .command = "true",
                                          .log_pattern = "/dev/null",
                                          .arguments = {"--time=9"}});
  ASSERT_TRUE(array.ok()) << array.error().message;
  EXPECT_EQ(*array, "1");  // Said as "1;farm".
  EXPECT_THAT(fake.Arguments(1),
              ElementsAre("--signal=B:TERM@30",
                          "--nodes=1",
                          "--ntasks=1",
                          "--requeue",
                          "--time=9",
                          "--parsable",
                          "--job-name=gatedyno-x",
                          "--array=0-1,5",
                          "--output=/dev/null",
                          "--error=/dev/null",
                          "--open-mode=append",
                          "--chdir=/",
                          "--wrap=true"));
}

TEST(SlurmTest, TellsWhySubmittingFailed) {
  FakeSlurm fake;
  const ArrayRequest request = {"gatedyno-x", {0}, "true", "/dev/null", {}};
  fake.Lie("sbatch-refuses", 1);
  auto array = Slurm(kLong).Submit(request);
  ASSERT_FALSE(array.ok());
  EXPECT_EQ(array.error().message,
            "sbatch failed with exit code 1: sbatch: error: invalid partition "
            "specified: fast");
  fake.Lie("sbatch-hangs", 1);
  array = Slurm(std::chrono::milliseconds(200)).Submit(request);
  ASSERT_FALSE(array.ok());
  EXPECT_EQ(array.error().message,
            std::string("sbatch: gave no answer in 0.2 s") + kNeeded);
  fake.Lie("other-words", 1);
  array = Slurm(kLong).Submit(request);
  ASSERT_FALSE(array.ok());
  EXPECT_EQ(array.error().message,
            "sbatch named no job: it said 'all is well'");
}

TEST(SlurmTest, ListsTheTasksOfTheArraysNamed) {
  const FakeSlurm fake;
  const Slurm slurm(kLong);
  for (const char* name : {"gatedyno-x", "gatedyno-y", "gatedyno-z"}) {
    ASSERT_TRUE(
        slurm.Submit({name, {2, 3}, "exec -a round- sleep 30", "/dev/null", {}})
            .ok());
  }
  const std::vector<std::string> names = {"gatedyno-x", "gatedyno-z"};
  auto queue = slurm.Queue(names);
  ASSERT_TRUE(queue.ok());
  ASSERT_EQ(queue->size(), 4U);
  EXPECT_EQ((*queue)[1].queue_name, "gatedyno-x");
  EXPECT_EQ((*queue)[1].index, 3);
  EXPECT_EQ((*queue)[1].array, "1");
  EXPECT_FALSE((*queue)[1].failed_to_launch);
  EXPECT_EQ((*queue)[2].array, "3");
  ASSERT_TRUE(slurm.CancelTask((*queue)[1]).ok());
  ASSERT_TRUE(slurm.Cancel(std::vector<std::string>{"gatedyno-z"}).ok());
  ::usleep(100'000);
  queue = slurm.Queue(names);
  ASSERT_TRUE(queue.ok());
  ASSERT_EQ(queue->size(), 1U);
  EXPECT_EQ(queue->front().index, 2);
}

struct QueueRow {
  std::string script;
  std::string message;  // Empty: one task, 4 of array 17, that cannot start.
};

TEST(SlurmTest, ReadsTheQueueOrSaysWhyNot) {
  const QueueRow rows[] = {
      {"echo 'gatedyno-x|4|17|launch failed requeued held'", ""},
      {"echo 'gatedyno-x|N/A|17|None'",
       "squeue: 'gatedyno-x|N/A|17|None' is no task of an array"},
      {"echo hello", "squeue: 'hello' is no task of an array"},
      {"echo 'slurm_load_jobs error: Unable to contact slurm controller' >&2; "
       "exit 1",
       "squeue failed with exit code 1: slurm_load_jobs error: Unable to "
       "contact slurm controller"},
  };
  for (const QueueRow& row : rows) {
    const SayingSlurm saying("squeue", row.script);
    const auto queue =
        Slurm(kLong).Queue(std::vector<std::string>{"gatedyno-x"});
    ASSERT_EQ(queue.ok(), row.message.empty()) << row.script;
    if (queue.ok()) {
      ASSERT_EQ(queue->size(), 1U);
      EXPECT_EQ(queue->front().index, 4);
      EXPECT_EQ(queue->front().array, "17");
      EXPECT_TRUE(queue->front().failed_to_launch);
    } else {
      EXPECT_EQ(queue.error().message, row.message);
    }
  }
}

TEST(SlurmTest, SaysThatThereIsNoSlurm) {
  const std::string path = std::getenv("PATH");
  ::setenv("PATH", "/nowhere", 1);
  const auto size = Slurm(kLong).MaxArraySize();
  ::setenv("PATH", path.c_str(), 1);
  ASSERT_FALSE(size.ok());
  EXPECT_EQ(size.error().message,
            std::string("scontrol: not found on PATH") + kNeeded);
}

}  // namespace
}  // namespace gatedyno
