#include "harness/report/verdict_text.h"

#include <vector>

#include <gtest/gtest.h>

#include "tests/report/sample_run.h"

namespace gatedyno {
namespace {

Comparison Within(const std::string& cell) {
  return SampleRow(cell, "a", Edge::kRise);
}

Comparison Unmeasured(const std::string& cell) {
  Comparison row = UnmeasuredRow();
  row.arc.cell = cell;
  return row;
}

TEST(VerdictTextTest, SaysItInASentence) {
  struct Case {
    std::vector<Comparison> rows;
    const char* sentence;
  };
  const Case cases[] = {
      {{Within("inv"), Within("inv"), Within("nand2")},
       "All 3 arcs of 2 cells lie within what is allowed (g 25 %, p 35 % of "
       "the hand number)."},
      {{Within("inv")},
       "The only arc lies within what is allowed (g 25 %, p 35 % of the hand "
       "number)."},
      {{Within("inv"), BeyondRow()},
       "1 of 2 arcs, in 1 of 2 cells, lies beyond what is allowed (g 25 %, p "
       "35 % of the hand number)."},
      {{BeyondRow(), BeyondRow(), Unmeasured("inv")},
       "2 of 3 arcs, in 1 of 2 cells, lie beyond what is allowed (g 25 %, p "
       "35 % of the hand number); 1 arc was not measured."},
      {{Within("inv"), Unmeasured("inv"), Unmeasured("nand2")},
       "Every arc measured lies within what is allowed (g 25 %, p 35 % of the "
       "hand number); 2 arcs were not measured."},
      {{Unmeasured("inv")},
       "Nothing was measured, so nothing can be said of the hand numbers."},
      {{}, "Nothing was measured, so nothing can be said of the hand numbers."},
  };
  for (const Case& test : cases) {
    RunResult result;
    result.comparisons = test.rows;
    EXPECT_EQ(VerdictSentence(result), test.sentence);
  }
}

TEST(VerdictTextTest, ACellIsAsItsWorstArc) {
  RunResult result;
  result.comparisons = {Within("inv"),
                        Unmeasured("inv"),
                        Within("nand2"),
                        Unmeasured("nand2"),
                        BeyondRow(),
                        Within("nor2")};
  const CellCounts counts = CountCells(result);
  EXPECT_EQ(counts.within, 1);
  EXPECT_EQ(counts.not_measured, 1);
  EXPECT_EQ(counts.beyond, 1);
  EXPECT_EQ(VerdictsOfCells(result).at("nand2"), Verdict::kBeyond);
}

TEST(VerdictTextTest, RulesAreNotPassedOverInSilence) {
  RunFacts facts;
  EXPECT_EQ(AllowedText(facts), "g 25 %, p 35 % of the hand number");
  facts.tolerance_rules.resize(1);
  EXPECT_EQ(AllowedText(facts),
            "g 25 %, p 35 % of the hand number, but for 1 rule of the plan");
}

}  // namespace
}  // namespace gatedyno
