#include "harness/report/versus_text.h"

#include <functional>
#include <optional>
#include <string>
#include <vector>

#include <gtest/gtest.h>

#include "tests/report/sample_versus.h"

namespace gatedyno {
namespace {

TEST(VersusTextTest, Sentence) {
  struct Case {
    const char* what;
    std::function<void(SampleVersus*)> edit;
    const char* sentence;
  };
  const Case cases[] = {
      {"all kinds",
       [](SampleVersus*) {},
       "g of 2 of 3 arcs agrees within 10 %: it changes by +6.7 % on average, "
       "standard deviation 12 %; 2 arcs changed by more than their "
       "uncertainty, and 2 verdicts differ."},
      {"one arc",
       [](SampleVersus* s) {
         s->a.comparisons.resize(1);
         s->b.comparisons.resize(1);
       },
       "g of 1 of 1 arc agrees within 10 %: it changes by +0.0 % on average; 1 "
       "arc changed by more than its uncertainty, and no verdict differs."},
      {"the same jobs",
       [](SampleVersus* s) {
         s->a.comparisons.resize(2);
         s->b.comparisons = s->a.comparisons;
       },
       "All 2 arcs measured in both rest on the same jobs, so nothing can have "
       "changed."},
      {"nothing measured",
       [](SampleVersus* s) {
         for (Comparison& row : s->b.comparisons) {
           row.line.reset();
         }
       },
       "No arc was measured in both runs."},
      {"nothing in both",
       [](SampleVersus* s) { s->b.comparisons.clear(); },
       "No arc is in both runs."},
  };
  for (const Case& c : cases) {
    SampleVersus sample;
    c.edit(&sample);
    sample.PairUp();
    EXPECT_EQ(VersusSentence(sample.view()), c.sentence) << c.what;
  }
}

TEST(VersusTextTest, Findings) {
  const SampleVersus sample;
  std::vector<std::string> texts;
  for (const ArcPair& pair : sample.versus.arcs) {
    texts.push_back(FindingText(pair));
  }
  EXPECT_EQ(texts,
            (std::vector<std::string>{
                "changed: p",
                "alike",
                "changed: g; by hand g 1.000 in A, 1.250 in B; within in A, "
                "beyond in B",
                "not measured; within in A, not measured in B"}));
}

TEST(VersusTextTest, BothFiguresChanged) {
  SampleVersus sample;
  sample.b.comparisons[0].effort.value = 1.1;
  sample.PairUp();
  EXPECT_EQ(FindingHead(sample.versus.arcs[0]), "changed: g and p");
}

TEST(VersusTextTest, ChangesWithTheirUncertaintyRoundedUp) {
  struct Case {
    std::optional<double> expanded;
    const char* text;
  };
  const Case cases[] = {{std::nullopt, "+2.8 %"},
                        {0.0, "+2.8 % ±0.0 %"},
                        {0.00001, "+2.8 % ±0.1 %"},
                        {0.009, "+2.8 % ±0.9 %"},
                        {0.0091, "+2.8 % ±1.0 %"},
                        {0.123, "+2.8 % ±13 %"}};
  for (const Case& c : cases) {
    Change change;
    change.relative = 0.0283;
    change.expanded = c.expanded;
    EXPECT_EQ(ChangeText(change), c.text);
  }
}

TEST(VersusTextTest, Deviation) {
  Spread spread;
  EXPECT_EQ(DeviationText(spread), "-");
  spread.deviation = 0.0534;
  EXPECT_EQ(DeviationText(spread), "5.3 %");
  spread.deviation = 0.144;
  EXPECT_EQ(DeviationText(spread), "14 %");
}

TEST(VersusTextTest, Corners) {
  EXPECT_EQ(CornerPairName({"typical", "typical"}), "typical");
  EXPECT_EQ(CornerPairName({"slow", "fast"}), "slow to fast");
  const SampleVersus sample;
  EXPECT_EQ(CornersLeftOut(sample.view()),
            std::vector<std::string>{"Of A, not compared: corner slow_hot."});
}

TEST(VersusTextTest, OfOneRunTheOtherCornerIsCompared) {
  SampleVersus sample;
  for (const bool third : {false, true}) {
    if (third) {
      sample.a.comparisons.push_back(RowOf("a", "inv", Edge::kFall, 1, 1));
      sample.a.comparisons.back().corner = "fast";
    }
    const Versus versus =
        PutSideBySide(sample.a, sample.a, {{"typical", "slow_hot"}});
    const VersusSide side = {sample.a, sample.source_a};
    EXPECT_EQ(CornersLeftOut({.a = side, .b = side, .versus = versus}),
              third ? std::vector<std::string>(
                          {"Of the run, not compared: corner fast."})
                    : std::vector<std::string>());
  }
}

TEST(VersusTextTest, CautionNamesWhatTwoNodesCompare) {
  SampleVersus sample;
  const std::string nodes = VersusCaution(sample.view());
  EXPECT_NE(nodes.find("compares two predictive cards, not two factories."),
            std::string::npos);
  sample.b.facts.node = sample.a.facts.node;
  EXPECT_EQ(VersusCaution(sample.view()).find("two factories"),
            std::string::npos);
}

}  // namespace
}  // namespace gatedyno
