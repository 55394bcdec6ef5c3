#include "harness/report/release_text.h"

#include <string>

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "harness/report/run_table.h"
#include "tests/report/sample_release.h"
#include "tests/report/terminal_text.h"
#include "tests/support/golden.h"

namespace gatedyno {
namespace {

using ::testing::HasSubstr;
using ::testing::Not;
using ::testing::StartsWith;

const Style kNoColour(false);

TEST(ReleaseTextTest, Golden) {
  ExpectGolden("release.txt", ReleaseText(SampleRelease(), kNoColour));
  ExpectGolden("release.md", ReleaseMarkdown(SampleRelease()));
}

TEST(ReleaseTextTest, FitsTheTerminal) {
  ExpectFits(ReleaseText(SampleRelease(), kNoColour));
}

TEST(ReleaseTextTest, YesHasNoReasons) {
  RunResult result = SampleRun();
  result.comparisons = {SampleRow("inv", "a", Edge::kRise)};
  result.warnings.clear();
  const ReleaseReport report = ReleaseOf(std::move(result));
  const std::string text = ReleaseText(report, kNoColour);
  EXPECT_EQ(text,
            std::string("release: yes\n"
                        "gates of an interrupt arbiter\n"
                        "node p45: predictive 45 nm bulk, high performance\n"
                        "plan plan.json, decided on 2026-12-02 from "
                        "night/a.db, simulator simulator 1\n"
                        "allowed: g 25 %, p 35 % of the hand number\n"
                        "1 arc: 1 within, 0 beyond, 0 not measured\n\n") +
                kCaution + '\n');
  EXPECT_THAT(ReleaseMarkdown(report), StartsWith("## release: yes\n"));
}

TEST(ReleaseTextTest, NothingMovedIsSaid) {
  ReleaseReport report = ReleaseOf(SampleRun());
  CompareWith(SampleRun(), &report);
  EXPECT_THAT(ReleaseText(report, kNoColour),
              HasSubstr("\nmoved since the baseline\n  run 3 of b.db: 7 arcs "
                        "compared, 0 moved; only now: 0 arcs, only then: 0 "
                        "arcs\n"));
}

TEST(ReleaseTextTest, ColourOnlyRepeatsWhatWordsSay) {
  const std::string coloured = ReleaseText(SampleRelease(), Style(true));
  EXPECT_EQ(Plain(coloured), ReleaseText(SampleRelease(), kNoColour));
  EXPECT_NE(coloured, Plain(coloured));
}

// Names and reasons of others are neither markup nor mentions.
TEST(ReleaseTextTest, WordsOfOthersStayWords) {
  RunResult result = ExemptRun();
  result.facts.title = result.facts.exemptions[0].reason = "<b>@all\n# x";
  const ReleaseReport report = ReleaseOf(std::move(result));
  EXPECT_THAT(ReleaseMarkdown(report), HasSubstr("`<b>@all # x`"));
  EXPECT_THAT(ReleaseMarkdown(report), Not(HasSubstr("\n# x")));
  EXPECT_THAT(ReleaseText(report, kNoColour), HasSubstr("<b>@all?# x"));
}

}  // namespace
}  // namespace gatedyno
