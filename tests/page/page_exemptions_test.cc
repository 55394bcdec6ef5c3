#include "harness/page/page_exemptions.h"

#include <string>

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "harness/page/page.h"
#include "tests/report/exempt_run.h"

namespace gatedyno {
namespace {

using ::testing::HasSubstr;
using ::testing::Not;

TEST(PageExemptionsTest, OneRowEach) {
  const std::string section = ExemptionSection(ExemptRun(), kToday);
  for (const char* part : {
           "<section id=\"exemptions\">",
           "<caption>As of 2026-12-02</caption>",
           "<tr><th scope=\"row\">nand2, pin b, fall</th><td>g</td>"
           "<td>in force</td><td>2027-03-31</td><td>skewed on purpose</td>"
           "<td>M. Ober</td><td>1 of 1</td></tr>",
           "<tr><th scope=\"row\">nand2, rise</th><td>g, p, not measured</td>"
           "<td>expired</td><td>2026-01-31</td><td>waits for new models</td>"
           "<td>library lead</td><td>3 of 3</td></tr>",
           "<td>not needed</td><td>2026-12-02</td>",
           "<td>covers no arc</td><td>2027-03-31</td>",
           "<td>0 of 2</td></tr>",
           "<td>0 of 0</td></tr>",
       }) {
    EXPECT_THAT(section, HasSubstr(part));
  }
}

TEST(PageExemptionsTest, WordsStayText) {
  RunResult result = ExemptRun();
  const std::string hostile = "</td><script>alert(1)</script>";
  Exemption& exemption = result.facts.exemptions[0];
  exemption.where.outputs = exemption.reason = hostile;
  exemption.author = exemption.expires = hostile;
  EXPECT_THAT(ExemptionSection(result, hostile), Not(HasSubstr("<script")));
}

TEST(PageExemptionsTest, ThePageHasThemAndMarksTheirArcs) {
  const std::string page = Page(
      ExemptRun(), {.store = "a.db", .run = 1, .plan = "{}", .today = kToday});
  for (const std::string& part :
       {std::string("<a href=\"#exemptions\">Exemptions</a>"),
        std::string("<section id=\"exemptions\">"),
        std::string("<small>") + kExemptNote + "</small>",
        std::string("<small>") + kExpiredNote + "</small>",
        std::string("of the hand number, but for 2 rules of the plan)"),
        std::string("<dt>allowed by rule</dt><dd>g 30&nbsp;%, p 50&nbsp;% for "
                    "nor*, rise</dd>"),
        std::string("<dt>allowed by rule</dt><dd>p 40&nbsp;% for corner "
                    "slow_*</dd>")}) {
    EXPECT_NE(page.find(part), std::string::npos) << part;
  }
}

TEST(PageExemptionsTest, NothingWhereThereAreNone) {
  EXPECT_EQ(ExemptionSection(SampleRun(), kToday), "");
  EXPECT_EQ(ExemptionLink(SampleRun()), "");
}

}  // namespace
}  // namespace gatedyno
