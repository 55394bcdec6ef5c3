#include "harness/report/markdown_report.h"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "tests/report/exempt_run.h"
#include "tests/report/sample_run.h"

namespace gatedyno {
namespace {

using ::testing::HasSubstr;
using ::testing::Not;

TEST(MarkdownReportTest, OpensWithTheVerdict) {
  const std::string text = MarkdownReport(SampleRun(), kToday);
  EXPECT_EQ(text.find("## `gates of an interrupt arbiter`\n\n**2 of 7 arcs"),
            0U);
  EXPECT_THAT(
      text, HasSubstr("| `typical` | 2.230 ps | 1.254 ±0.002 | 11.71 ps |\n"));
  EXPECT_THAT(text,
              HasSubstr("| `nand2` | `b->y fall` | `typical` | 1.333 | 1.900 "
                        "±0.010 | +42 % | 2.51 | 1.71 ±0.02 | -32 % | beyond, "
                        "bent |\n"));
  EXPECT_THAT(text,
              HasSubstr("| `nand2` | `b->y rise` | `slow_lo_m40` | 1.333 | - "
                        "| - | - | - | - | not measured |\n"));
  EXPECT_THAT(text, HasSubstr("<summary>All 7 arcs</summary>"));
}

TEST(MarkdownReportTest, NothingStandsOpenWhereAllIsWithin) {
  RunResult result = SampleRun();
  result.comparisons = {SampleRow("inv", "a", Edge::kRise)};
  EXPECT_THAT(MarkdownReport(result, kToday), Not(HasSubstr("Not within:")));
}

TEST(MarkdownReportTest, CodeSpans) {
  struct Case {
    const char* text;
    const char* span;
  };
  const Case cases[] = {
      {"nand2", "`nand2`"},
      {"a|b", "`a\\|b`"},
      {"@team #1 <b> *x*", "`@team #1 <b> *x*`"},
      {"a`b", "`` a`b ``"},
      {"``", "``` `` ```"},
      {"a\nb", "`a b`"},
      {"", "(no name)"},
      {"  ", "(no name)"},
  };
  for (const Case& test : cases) {
    EXPECT_EQ(CodeSpan(test.text), test.span);
  }
}

TEST(MarkdownReportTest, ListsExemptionsAndMarksTheirArcs) {
  const std::string text = MarkdownReport(ExemptRun(), kToday);
  EXPECT_THAT(
      text,
      HasSubstr("Exemptions on 2026-12-02:\n\n- `nand2, pin b, fall, only g`: "
                "in force until 2027-03-31, needed by 1 of 1 arc: `skewed on "
                "purpose` (`M. Ober`)\n"));
  EXPECT_THAT(
      text, HasSubstr(std::string("| beyond, bent, `") + kExemptNote + "` |"));
  EXPECT_THAT(text, HasSubstr(std::string("`") + kExpiredNote + "` |"));
  EXPECT_THAT(MarkdownReport(SampleRun(), kToday), Not(HasSubstr("xempt")));
}

}  // namespace
}  // namespace gatedyno
