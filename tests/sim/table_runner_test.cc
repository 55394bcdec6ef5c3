#include "harness/sim/table_runner.h"

#include <string>
#include <vector>

#include <gtest/gtest.h>

#include "harness/sim/job_list.h"

namespace gatedyno {
namespace {

Job Labelled(std::string label) {
  Job job;
  job.label = std::move(label);
  return job;
}

TEST(TableRunnerTest, AnswersByLabelInOrder) {
  TableRunner runner({{"a", MeasuredOutcome({{"delay", 1e-12}})}});
  JobList jobs({Labelled("a"), Labelled("b")});
  std::vector<Outcome> outcomes;
  ASSERT_TRUE(runner
                  .Run(jobs,
                       [&](const Job&, const Outcome& outcome) {
                         outcomes.push_back(outcome);
                         return Ok();
                       })
                  .ok());
  ASSERT_EQ(outcomes.size(), 2U);
  EXPECT_TRUE(outcomes[0].measured());
  EXPECT_EQ(outcomes[0].values_s.at("delay"), 1e-12);
  EXPECT_EQ(outcomes[1].ending, Ending::kFailed);
  EXPECT_EQ(outcomes[1].message, "b: not in the table");
  EXPECT_EQ(runner.asked().size(), 2U);
}

TEST(TableRunnerTest, AnswersFromAFunction) {
  TableRunner runner([](const Job& job) {
    return MeasuredOutcome({{job.label, 1.0}});
  });
  JobList jobs({Labelled("x")});
  ASSERT_TRUE(runner
                  .Run(jobs,
                       [](const Job& job, const Outcome& outcome) {
                         EXPECT_TRUE(outcome.values_s.contains(job.label));
                         return Ok();
                       })
                  .ok());
}

}  // namespace
}  // namespace gatedyno
