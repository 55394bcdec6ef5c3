#include "harness/compare/versus.h"

#include <functional>
#include <limits>
#include <optional>
#include <string>
#include <utility>
#include <vector>

#include <gtest/gtest.h>

#include "tests/compare/two_runs.h"

namespace gatedyno {
namespace {

RunResult AtCorners(const std::vector<std::string>& corners) {
  RunResult result;
  for (const std::string& corner : corners) {
    for (const Edge edge : {Edge::kRise, Edge::kFall}) {
      result.comparisons.push_back(RowOf("a", "inv", edge, 1.0, 1.0));
      result.comparisons.back().corner = corner;
    }
  }
  return result;
}

TEST(VersusTest, PairsCorners) {
  struct Case {
    std::vector<std::string> a;
    std::vector<std::string> b;
    std::string pairs;
  };
  const Case cases[] = {
      {{"typical"}, {"typical"}, "typical-typical "},
      {{"x", "typical"}, {"typical", "y"}, "typical-typical "},
      {{"x", "y", "z"}, {"z", "x"}, "x-x z-z "},
      {{"tt_1v0"}, {"tt_1v2"}, "tt_1v0-tt_1v2 "},
      {{"x", "y"}, {"z"}, ""},
      {{"x"}, {}, ""},
      {{}, {}, ""},
  };
  for (const Case& c : cases) {
    std::string pairs;
    for (const CornerPair& pair : PairCorners(AtCorners(c.a), AtCorners(c.b))) {
      pairs += pair.a + '-' + pair.b + ' ';
    }
    EXPECT_EQ(pairs, c.pairs);
  }
}

TEST(VersusTest, SaysWhatCanBeSaid) {
  using Edit = std::function<void(Comparison * b)>;
  struct Case {
    const char* what;
    Edit edit;  // Of a row with the same numbers, by other jobs.
    Finding finding;
  };
  const Case cases[] = {
      {"the same", [](Comparison*) {}, Finding::kAlike},
      {"g", [](Comparison* b) { b->effort.value = 1.1; }, Finding::kChanged},
      {"p", [](Comparison* b) { b->parasitic.value = 0.9; }, Finding::kChanged},
      {"g within its uncertainty",
       [](Comparison* b) {
         b->effort = {1.1, 0.01};  // k = 13.97 for three points.
       },
       Finding::kAlike},
      {"g beyond its uncertainty",
       [](Comparison* b) {
         b->effort = {1.1, 0.005};
       },
       Finding::kChanged},
      {"an uncertainty that is not known",
       [](Comparison* b) {
         b->effort = {1.1, std::nullopt};
       },
       Finding::kUnknown},
      {"g not known, but p changed",
       [](Comparison* b) {
         b->effort = {1.1, std::nullopt};
         b->parasitic.value = 2.0;
       },
       Finding::kChanged},
      {"a number that could not be kept",
       [](Comparison* b) {
         b->effort.value = std::numeric_limits<double>::quiet_NaN();
       },
       Finding::kUnknown},
      {"bent, over the same fanouts",
       [](Comparison* b) {
         b->effort.value = 1.1;
         b->bent = true;
         std::swap(b->points.front(), b->points.back());
       },
       Finding::kChanged},
      {"bent, over other fanouts",
       [](Comparison* b) {
         b->effort.value = 1.1;
         b->bent = true;
         b->points.back().fanout = 6.0;
       },
       Finding::kBentApart},
      {"bent, over more fanouts, and alike",
       [](Comparison* b) {
         b->bent = true;
         b->points.push_back({.fanout = 6.0, .job_key = "b"});
       },
       Finding::kAlike},
      {"straight, over other fanouts",
       [](Comparison* b) {
         b->effort.value = 1.1;
         b->points.back().fanout = 6.0;
       },
       Finding::kChanged},
      {"no line",
       [](Comparison* b) { b->line.reset(); },
       Finding::kNotMeasured},
  };
  RunResult a;
  a.comparisons = {RowOf("a", "nand2", Edge::kFall, 1.0, 1.0)};
  for (const Case& c : cases) {
    RunResult b;
    b.comparisons = {RowOf("b", "nand2", Edge::kFall, 1.0, 1.0)};
    c.edit(&b.comparisons.front());
    const Versus versus = PutSideBySide(a, b, PairCorners(a, b));
    ASSERT_EQ(versus.arcs.size(), 1U) << c.what;
    EXPECT_EQ(FindingName(versus.arcs[0].finding), FindingName(c.finding))
        << c.what;
    EXPECT_EQ(versus.arcs[0].changed(), c.finding == Finding::kChanged);
  }
}

// Its g may still move with the reference inverter's points.
TEST(VersusTest, TheSameJobsHaveNotChanged) {
  RunResult a;
  a.comparisons = {RowOf("a", "nand2", Edge::kFall, 1.0, 1.0)};
  RunResult b = a;
  b.comparisons[0].effort.value = 1.1;
  Versus versus = PutSideBySide(a, b, PairCorners(a, b));
  EXPECT_EQ(versus.arcs.at(0).finding, Finding::kSameJobs);
  for (RunResult* run : {&a, &b}) {
    for (Point& point : run->comparisons[0].points) {
      point.job_key.clear();  // Of nobody knows which job.
    }
  }
  versus = PutSideBySide(a, b, PairCorners(a, b));
  EXPECT_EQ(versus.arcs.at(0).finding, Finding::kChanged);
}

TEST(VersusTest, PairsArcsThatAreTheSameInEveryPart) {
  struct Case {
    const char* what;
    std::function<void(Arc*)> edit;
  };
  const Case cases[] = {
      {"cell", [](Arc* arc) { arc->cell = "NAND2"; }},
      {"pin", [](Arc* arc) { arc->pin = "b"; }},
      {"output", [](Arc* arc) { arc->output = "z"; }},
      {"input edge", [](Arc* arc) { arc->input_edge = Edge::kFall; }},
      {"edge", [](Arc* arc) { arc->edge = Edge::kRise; }},
      {"side", [](Arc* arc) { arc->side[0].high = false; }},
  };
  RunResult a;
  a.comparisons = {RowOf("a", "nand2", Edge::kFall, 1.0, 1.0)};
  for (const Case& c : cases) {
    RunResult b;
    b.comparisons = {RowOf("b", "nand2", Edge::kFall, 1.0, 1.0)};
    c.edit(&b.comparisons[0].arc);
    const Versus versus = PutSideBySide(a, b, PairCorners(a, b));
    EXPECT_TRUE(versus.arcs.empty()) << c.what;
    ASSERT_EQ(versus.only_a.size(), 1U) << c.what;
    ASSERT_EQ(versus.only_b.size(), 1U) << c.what;
    EXPECT_EQ(versus.only_a[0], a.comparisons.data());
    EXPECT_EQ(versus.only_b[0], b.comparisons.data());
  }
}

TEST(VersusTest, OneCornerAgainstAnotherOfTheSameRun) {
  RunResult run = AtCorners({"slow", "fast"});
  run.comparisons[3].effort.value = 1.2;
  const Versus versus = PutSideBySide(run, run, {{"slow", "fast"}});
  ASSERT_EQ(versus.arcs.size(), 2U);
  EXPECT_EQ(versus.arcs[1].a->corner, "slow");
  EXPECT_EQ(versus.arcs[1].b->corner, "fast");
  EXPECT_NEAR(versus.arcs[1].effort->relative, 0.2, 1e-12);
  EXPECT_TRUE(versus.only_a.empty());
  EXPECT_TRUE(versus.only_b.empty());
}

// What an older program may have stored.
TEST(VersusTest, AnArcThatIsThereTwiceIsPairedOnce) {
  const RunResult a = AtCorners({"typical", "typical"});
  const RunResult b = AtCorners({"typical"});
  const Versus versus = PutSideBySide(a, b, PairCorners(a, b));
  EXPECT_EQ(versus.arcs.size(), 2U);
  EXPECT_EQ(versus.only_a.size(), 2U);
  EXPECT_TRUE(versus.only_b.empty());
}

TEST(VersusTest, HandNumbersToThreeDecimals) {
  struct Case {
    double after;
    bool differs;
  };
  const Case cases[] = {
      {1.0, false}, {1.0004, false}, {1.001, true}, {0.999, true}};
  for (const Case& c : cases) {
    const Comparison a = RowOf("a", "inv", Edge::kFall, 1.0, 1.0);
    Comparison b = a;
    b.estimate.effort = c.after;
    ArcPair pair;
    pair.a = &a;
    pair.b = &b;
    EXPECT_EQ(HandEffortDiffers(pair), c.differs) << c.after;
  }
}

}  // namespace
}  // namespace gatedyno
