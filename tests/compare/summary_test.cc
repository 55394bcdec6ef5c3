#include "harness/compare/summary.h"

#include <vector>

#include <gmock/gmock.h>

namespace gatedyno {
namespace {

using testing::ElementsAre;
using testing::IsEmpty;

Comparison Arc(Verdict verdict, double effort_difference, bool bent = false) {
  Comparison comparison;
  comparison.verdict = verdict;
  comparison.effort_difference = effort_difference;
  comparison.bent = bent;
  return comparison;
}

TEST(SummariseTest, CountsAndFindsTheWorst) {
  const std::vector<Comparison> run = {
      Arc(Verdict::kWithin, 0.05),
      Arc(Verdict::kBeyond, -0.40, true),
      Arc(Verdict::kNotMeasured, 9.0),  // Of a line too uncertain to judge.
      Arc(Verdict::kWithin, -0.10),
      Arc(Verdict::kBeyond, 0.30),
      Arc(Verdict::kWithin, 0.10, true),
  };
  const Summary summary = Summarise(run);
  EXPECT_EQ(summary.within, 3);
  EXPECT_EQ(summary.beyond, 2);
  EXPECT_EQ(summary.not_measured, 1);
  EXPECT_EQ(summary.bent, 2);
  // Equal differences stay in the run's order.
  EXPECT_THAT(summary.worst_by_effort, ElementsAre(1, 4, 3));
  EXPECT_THAT(Summarise(run, 1).worst_by_effort, ElementsAre(1));
  EXPECT_THAT(Summarise(run, 99).worst_by_effort, ElementsAre(1, 4, 3, 5, 0));
}

TEST(SummariseTest, NothingAtAll) {
  const Summary summary = Summarise({});
  EXPECT_EQ(summary.within + summary.beyond + summary.not_measured, 0);
  EXPECT_THAT(summary.worst_by_effort, IsEmpty());
}

}  // namespace
}  // namespace gatedyno
