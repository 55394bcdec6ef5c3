#include "harness/sim/attempt_queue.h"

#include <string>
#include <vector>

#include <gtest/gtest.h>

#include "harness/sim/job_list.h"

namespace gatedyno {
namespace {

std::vector<Job> JobsNamed(const std::vector<std::string>& labels) {
  std::vector<Job> jobs;
  for (const std::string& label : labels) {
    jobs.emplace_back().label = label;
  }
  return jobs;
}

std::string TakeLabel(AttemptQueue& queue) {
  const std::optional<Attempt> attempt = queue.Take();
  return attempt ? attempt->job.label : "none";
}

Attempt AttemptAt(const std::string& label) {
  Attempt attempt;
  attempt.job.label = label;
  return attempt;
}

TEST(AttemptQueueTest, GivenBackFirstAndSecondTriesLast) {
  JobList jobs(JobsNamed({"a", "b", "c"}));
  AttemptQueue queue(&jobs);
  EXPECT_EQ(TakeLabel(queue), "a");
  queue.Retry(AttemptAt("again"));
  queue.GiveBack({AttemptAt("x"), AttemptAt("y")});
  for (const char* expected : {"x", "y", "b", "c", "again", "none"}) {
    EXPECT_EQ(TakeLabel(queue), expected);
  }
}

TEST(AttemptQueueTest, DrawsNoMoreThanItIsAskedFor) {
  JobList jobs(JobsNamed({"a", "b", "c"}));
  AttemptQueue queue(&jobs);
  EXPECT_EQ(queue.Waiting(2), 2U);
  EXPECT_EQ(jobs.Next()->label, "c");
  EXPECT_EQ(queue.Waiting(9), 2U);
  EXPECT_EQ(TakeLabel(queue), "a");
  EXPECT_EQ(queue.Waiting(9), 1U);
}

}  // namespace
}  // namespace gatedyno
