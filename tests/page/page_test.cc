#include "harness/page/page.h"

#include <string>

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "harness/page/page_parts.h"
#include "tests/page/count.h"
#include "tests/report/sample_run.h"

namespace gatedyno {
namespace {

using ::testing::HasSubstr;
using ::testing::Not;

const RunSource kSource = {
    .store = "arbiter.db", .run = 3, .plan = R"({"node":"p45"})"};

TEST(PageTest, SaysWhatTheReadersAsk) {
  const std::string page = Page(SampleRun(), kSource);
  for (const char* part : {
           "<h1>gates of an interrupt arbiter</h1>",
           "<p class=\"verdict\">2 of 7 arcs, in 2 of 3 cells, lie beyond",
           "<tr><th scope=\"row\">cells</th><td>1</td><td>2</td><td>0</td>",
           "<tr><th scope=\"row\">arcs</th><td>2</td><td>2</td><td>3</td>",
           // tau, p_inv and FO4 of the sample's one calibration.
           "<td>2.230 ±0.001</td><td>2.181 ±0.001</td><td>2.278 ±0.001</td>"
           "<td>1.254 ±0.002</td><td>11.71 ps</td>",
           "<li><a href=\"#arc-5\"><bdi>nand2</bdi> <bdi>b-&gt;y fall</bdi>",
           "<code>y = !(a &amp; b)</code>",
           "<td>a=1<td>1.333 = 4/3<td>2.000<td>2.333 = 7/3",
           "<dt>accuracy checked</dt><dd>kept: 8 delays",
           "<dt>simulator</dt><dd>simulator 1</dd>",
           "<dt>store</dt><dd>arbiter.db, run 3</dd>",
           "{\n &quot;node&quot;: &quot;p45&quot;\n}",
           "<h3>Warnings</h3>",
           "<h3>Jobs that failed</h3>",
           "Predictive device models are not a foundry&#39;s.",
           "Apache License",
       }) {
    EXPECT_THAT(page, HasSubstr(part));
  }
}

TEST(PageTest, HasARowForEveryArc) {
  const std::string page = Page(SampleRun(), kSource);
  EXPECT_EQ(Count(page, "<tr id=\"arc-"), 7U);
  EXPECT_EQ(Count(page, "<tbody class=\"more\">"), 0U);
  RunResult large = SampleRun();
  large.comparisons.assign(201, BeyondRow());
  EXPECT_EQ(Count(Page(large, kSource), "<tbody class=\"more\">"), 1U);
}

TEST(PageTest, IsTheSameForTheSameRun) {
  EXPECT_EQ(Page(SampleRun(), kSource), Page(SampleRun(), kSource));
}

TEST(PageTest, AsksNothingOfANetwork) {
  const std::string page = Page(SampleRun(), kSource);
  EXPECT_THAT(page, HasSubstr("content=\"default-src 'none'; "));
  EXPECT_EQ(Count(page, "script-src 'sha256-"), 1U);
  for (const char* outside :
       {"<link rel=\"stylesheet", "<script src", "<img", "@import", "url("}) {
    EXPECT_EQ(Count(std::string(kPageShell.text) + std::string(kPageStyle.text),
                    outside),
              0U)
        << outside;
  }
}

// An element of script ends at these whatever the script means by them.
TEST(PageTest, TheScriptsDoNotEndEarly) {
  for (const PagePart* part : {&kChartScript, &kPageScript}) {
    EXPECT_THAT(std::string(part->text), Not(HasSubstr("</script")));
    EXPECT_THAT(std::string(part->text), Not(HasSubstr("<!--")));
  }
}

TEST(PageTest, NamesStayText) {
  RunResult result = SampleRun();
  const std::string name = "</script></title><img src=x onerror=alert(1)>";
  result.facts.title = name;
  result.facts.node_title = name;
  result.facts.simulator = name;
  result.cells[0].name = name;
  result.cells[0].functions = {name};
  result.calibrations[0].corner.name = name;
  result.warnings = {name};
  result.failed_jobs = {{name, name, name}};
  for (Comparison& row : result.comparisons) {
    row.arc.cell = row.arc.pin = row.corner = row.reason = name;
  }
  const std::string page =
      Page(result, {.store = name, .run = 1, .plan = name});
  EXPECT_EQ(Count(page, "<img"), 0U);
  EXPECT_EQ(Count(page, "</script"), 3U);
  EXPECT_EQ(Count(page, "</title"), 1U);
}

TEST(PageTest, AnEmptyRunIsAPage) {
  const std::string page = Page(RunResult(), {});
  EXPECT_THAT(page, HasSubstr("Nothing was measured"));
  EXPECT_THAT(page, HasSubstr("No arc has a verdict."));
}

}  // namespace
}  // namespace gatedyno
