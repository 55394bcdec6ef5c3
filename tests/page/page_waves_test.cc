#include "harness/page/page_waves.h"

#include <string>
#include <vector>

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "tests/page/sample_waves.h"
#include "tests/report/sample_run.h"

namespace gatedyno {
namespace {

using ::testing::HasSubstr;
using ::testing::Not;

std::string Section(const std::vector<ArcWaves>& waves,
                    const RunResult& result = SampleRun()) {
  return WavesSection(waves, result);
}

TEST(PageWavesTest, IsNotThereUnlessAskedFor) {
  EXPECT_EQ(Section({}), "");
  EXPECT_EQ(WavesLink({}), "");
  EXPECT_EQ(WavesLink(std::vector<ArcWaves>{SampleWaves()}),
            "<a href=\"#waves\">Waveforms</a>\n");
}

TEST(PageWavesTest, TellsHowTheDelayCameAbout) {
  const std::string section = Section({SampleWaves()});
  for (const char* part : {
           "<h2>Waveforms of the arc that differs most</h2>",
           "<figure id=\"waves-5\"><figcaption><strong><a href=\"#arc-5\">"
           "<bdi>nand2 b-&gt;y fall</bdi></a></strong>at <bdi>typical</bdi>, "
           "with <bdi>a=1</bdi>, fanout 4, g +42&nbsp;%: <bdi>b</bdi> rises, "
           "<bdi>y</bdi> falls. Delay 11.00 ps, by hand 17.75 ps; "
           "<bdi>transition of b</bdi> 12.00 ps; <bdi>transition of y</bdi> "
           "18.00 ps.</figcaption>",
           "<caption>Time 0 is 1010.0 ps into the deck of job "
           "<code>00ff</code>",
           "<tr><th scope=\"row\"><bdi>delay</bdi></th><td>11.000</td><td>"
           "<bdi>b</bdi> rises</td><td>0.5 V, 50&nbsp;%</td><td>0.000</td><td>"
           "<bdi>y</bdi> falls</td><td>0.5 V, 50&nbsp;%</td><td>11.000</td>"
           "</tr>",
           "<tr><th scope=\"row\"><bdi>transition of b</bdi></th><td>12.000"
           "</td><td><bdi>b</bdi> rises</td><td>0.2 V, 20&nbsp;%</td><td>"
           "-6.000</td><td><bdi>b</bdi> rises</td><td>0.8 V, 80&nbsp;%</td>"
           "<td>6.000</td></tr>",
           "<tr><th scope=\"row\"><bdi>transition of y</bdi></th><td>18.000"
           "</td><td><bdi>y</bdi> falls</td><td>0.8 V, 80&nbsp;%</td><td>2.000"
           "</td><td><bdi>y</bdi> falls</td><td>0.2 V, 20&nbsp;%</td><td>"
           "20.000</td></tr>",
           "<script type=\"application/json\" id=\"waves-data\">[{",
       }) {
    EXPECT_THAT(section, HasSubstr(part));
  }
  EXPECT_THAT(section, Not(HasSubstr("class=\"doubt\"")));
}

TEST(PageWavesTest, LevelsOfAnUnknownCornerAreVoltsAlone) {
  RunResult result = SampleRun();
  result.calibrations.clear();
  const std::string section = Section({SampleWaves()}, result);
  EXPECT_THAT(section, HasSubstr("<td>0.5 V</td>"));
  EXPECT_THAT(section, Not(HasSubstr("by hand")));
}

TEST(PageWavesTest, DoubtsASimulationThatGivesAnotherDelay) {
  struct Case {
    double change;
    std::string doubt;  // Empty: none.
  };
  const Case cases[] = {
      {0.0, ""},
      {0.9 * kSameDelay, ""},
      {-0.9 * kSameDelay, ""},
      {2e-6, "measured is 11.00 ps; this one differs by -0.0002&nbsp;%: "},
      {-0.01,
       "measured is 10.89 ps; this one differs by +1&nbsp;%: another "
       "simulator version, or model files that have changed.</p>"},
  };
  for (const Case& test : cases) {
    ArcWaves waves = SampleWaves();
    waves.stored_delay_s *= 1.0 + test.change;
    const std::string section = Section({waves});
    EXPECT_EQ(
        section.find("Not the simulation of the run.") == std::string::npos,
        test.doubt.empty())
        << test.change;
    EXPECT_THAT(section, HasSubstr(test.doubt));
  }
}

TEST(PageWavesTest, AnArcWithoutSaysWhy) {
  ArcWaves trouble;
  trouble.place = 4;
  trouble.fanout = 3.0;
  trouble.job_key = "k";
  trouble.trouble = "failed again: <no such file> cards.inc";
  const std::string section = Section({SampleWaves(), trouble});
  EXPECT_THAT(section,
              HasSubstr("<h2>Waveforms of the 2 arcs that differ most</h2>"));
  EXPECT_THAT(
      section,
      HasSubstr("fanout 3, g +42&nbsp;%: <bdi>b</bdi> rises, <bdi>y</bdi> "
                "falls.</figcaption>\n<p class=\"doubt\"><strong>No waveforms."
                "</strong> failed again: &lt;no such file&gt; cards.inc.</p>"
                "</figure>"));
}

TEST(PageWavesTest, NamesStayText) {
  const std::string name = "</script><img src=x onerror=alert(1)>";
  RunResult result = SampleRun();
  Comparison& row = result.comparisons[4];
  row.arc.cell = row.arc.pin = row.arc.output = row.corner = name;
  row.arc.side = {{name, true}};
  ArcWaves waves = SampleWaves();
  waves.job_key = name;
  ArcWaves trouble = waves;
  trouble.trouble = name;
  const std::string section = Section({waves, trouble}, result);
  EXPECT_THAT(section, Not(HasSubstr("<img")));
  EXPECT_EQ(section.find("</script"), section.rfind("</script"));
}

}  // namespace
}  // namespace gatedyno
