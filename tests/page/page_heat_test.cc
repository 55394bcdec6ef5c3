#include "harness/page/page_heat.h"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "tests/report/sample_run.h"

namespace gatedyno {
namespace {

using ::testing::HasSubstr;
using ::testing::Not;

TEST(PageHeatTest, TheShadeFollowsTheNumberAsPrinted) {
  struct Case {
    double difference;
    const char* shade;
  };
  // At 20 %: steps at 5, 10 and 20 %.
  const Case cases[] = {
      {0.0, "h0"},
      {0.05, "h0"},
      {-0.05, "h0"},
      {0.0504, "h0"},
      {0.0506, "up1"},
      {-0.06, "down1"},
      {0.10, "up1"},
      {0.1049, "up1"},
      {0.106, "up2"},
      {-0.2, "down2"},
      {-0.2049, "down2"},
      {0.206, "up3"},
      {-3.0, "down3"},
  };
  for (const Case& test : cases) {
    EXPECT_EQ(HeatClass(test.difference, 0.2), test.shade) << test.difference;
  }
}

TEST(PageHeatTest, ShowsTheArcThatDiffersMost) {
  const std::string maps = HeatMaps(SampleRun());
  // nand2 at typical: beyond by its fifth row, with rows not measured.
  EXPECT_THAT(
      maps,
      HasSubstr("<tr><th scope=\"row\">nand2</th><td class=\"up3\"><a "
                "href=\"#arc-5\">+42 %</a> <span class=\"mark\" role=\"img\" "
                "aria-label=\"beyond\">&#9670;</span> <span class=\"mark\" "
                "role=\"img\" aria-label=\"some arcs not measured\">&#9651;"
                "</span></td><td class=\"unmeasured\">not measured</td></tr>"));
  // inv has no arc at the other corner.
  EXPECT_THAT(maps,
              HasSubstr("<tr><th scope=\"row\">inv</th><td class=\"h0\"><a "
                        "href=\"#arc-1\">-2.8 %</a></td><td>&ndash;</td>"
                        "</tr>"));
}

// The arc that differs most may be too uncertain to be beyond.
TEST(PageHeatTest, MarksWhatIsBeyondEvenBehindALargerDifference) {
  RunResult result = SampleRun();
  Comparison uncertain = UncertainRow();
  uncertain.effort_difference = 0.9;
  result.comparisons = {BeyondRow(), uncertain};
  EXPECT_THAT(HeatMaps(result),
              HasSubstr("<a href=\"#arc-2\">+90 %</a> <span class=\"mark\" "
                        "role=\"img\" aria-label=\"beyond\">"));
}

TEST(PageHeatTest, EscapesNames) {
  RunResult result = SampleRun();
  result.comparisons = {BeyondRow()};
  result.comparisons[0].arc.cell = "<i>";
  result.comparisons[0].corner = "\"hot\"";
  const std::string maps = HeatMaps(result);
  EXPECT_THAT(maps, Not(HasSubstr("<i>")));
  EXPECT_THAT(maps, HasSubstr("<th scope=\"col\">&quot;hot&quot;</th>"));
}

}  // namespace
}  // namespace gatedyno
