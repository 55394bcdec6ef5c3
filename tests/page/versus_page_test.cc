#include "harness/page/versus_page.h"

#include <cstddef>
#include <string>

#include <gmock/gmock.h>
#include <gtest/gtest.h>
#include <nlohmann/json.hpp>

#include "harness/page/page_arcs.h"
#include "harness/page/page_parts.h"
#include "harness/page/versus_data.h"
#include "harness/page/versus_lists.h"
#include "tests/page/count.h"
#include "tests/report/sample_versus.h"

namespace gatedyno {
namespace {

using ::testing::HasSubstr;
using ::testing::Not;

TEST(VersusPageTest, SaysWhatTheReadersAsk) {
  const SampleVersus sample;
  const std::string page = VersusPage(sample.view());
  for (const char* part : {
           "<h1>p45 against p65</h1>",
           "<p class=\"verdict\">g of 2 of 3 arcs agrees within 10&nbsp;%:",
           "<tr><th scope=\"row\">node</th><td>p45: 45 nm</td><td>p65: 65 "
           "nm</td></tr>",
           "<tr><th scope=\"row\">store</th><td>first.db, run 1</td><td>"
           "second.db, run 3</td></tr>",
           "<p>Of A, not compared: corner slow_hot.</p>",
           // tau, FO4 and p_inv of both.
           "<td>2.000 ±0.000</td><td>5.000 ±0.000</td><td>2.500</td>"
           "<td>10.00 ps</td><td>26.25 ps</td><td>2.625</td>"
           "<td>1.000 ±0.000</td><td>1.250 ±0.000</td><td>1.250</td>",
           "<tr><th scope=\"row\">g</th><td>3</td><td>+6.7&nbsp;%</td><td>12"
           "&nbsp;%</td><td>2</td><td class=\"words\">+20&nbsp;% "
           "<bdi>nand2</bdi> <bdi>a-&gt;y fall</bdi> at <bdi>typical</bdi>",
           "<tr><th scope=\"row\">fall, pull-down 2 high</th><td>1</td>",
           "<tr><th scope=\"row\">nand2<td>a-&gt;y fall <small>with b=1"
           "</small><td>typical<td>1.500 ±0.000<td>1.800 ±0.003<td>+20&nbsp;% "
           "<small>±2.8&nbsp;%</small><td>2.00 ±0.00<td>2.00 ±0.00<td>+0.0"
           "&nbsp;% <small>±0.0&nbsp;%</small><td><b class=\"changed\">"
           "changed: g</b>; by hand g 1.000 in A, 1.250 in B; within in A, "
           "beyond in B\n",
           "<b class=\"unsaid\">not measured</b>; within in A, not measured in "
           "B <small>B: h=4: timed out after 60 s</small>",
           "<h3>Only in A: 1 arc</h3>\n<ul>\n<li><strong><bdi>nor2</bdi>"
           "</strong> at <bdi>typical</bdi>: a-&gt;y fall with b=1</li>",
           "<h3>Only in B: 1 arc</h3>",
           "most arcs are in this list",
           "compares two predictive cards, not two factories.",
           "Apache License",
       }) {
    EXPECT_THAT(page, HasSubstr(part));
  }
}

TEST(VersusPageTest, IsNamedByWhatSetsTheSidesApart) {
  SampleVersus sample;
  sample.b.facts.node = sample.a.facts.node;
  EXPECT_THAT(VersusPage(sample.view()),
              HasSubstr("<h1>p45 before and after</h1>"));
  EXPECT_THAT(VersusPage(sample.view()),
              Not(HasSubstr("most arcs are in this list")));
  sample.versus = PutSideBySide(sample.a, sample.a, {{"typical", "slow_hot"}});
  const VersusView corners = {.a = {sample.a, sample.source_a},
                              .b = {sample.a, sample.source_a},
                              .versus = sample.versus};
  EXPECT_THAT(VersusPage(corners),
              HasSubstr("<h1>typical against slow_hot</h1>"));
}

TEST(VersusPageTest, ListsAreCappedAndTheTableIsNot) {
  SampleVersus sample;
  const Comparison a = sample.a.comparisons[0];
  const Comparison b = sample.b.comparisons[0];
  sample.a.comparisons.clear();
  sample.b.comparisons.clear();
  for (std::size_t i = 0; i <= kRowsAtOnce; ++i) {
    sample.a.comparisons.push_back(a);
    sample.b.comparisons.push_back(b);
    sample.a.comparisons.back().arc.cell =
        sample.b.comparisons.back().arc.cell = "cell" + std::to_string(i);
  }
  sample.PairUp();
  const std::string page = VersusPage(sample.view());
  EXPECT_EQ(Count(page, "<tbody class=\"more\">"), 1U);
  EXPECT_EQ(Count(page, "<b class=\"changed\">"), kRowsAtOnce + 1 + kListed);
  EXPECT_THAT(page,
              HasSubstr("<p>The 20 with the largest change of g, of 201; "
                        "all are in <a href=\"#arcs\">"));
}

TEST(VersusPageTest, SaysWhereThereIsNothing) {
  SampleVersus sample;
  sample.b = sample.a;
  sample.PairUp();
  const std::string page = VersusPage(sample.view());
  for (const char* part :
       {"<p>No arc changed by more than the uncertainty of its change.</p>",
        "<p>Every arc has the same verdict in both.</p>",
        "<p>Every arc is in both, at the corners compared.</p>"}) {
    EXPECT_THAT(page, HasSubstr(part));
  }
}

TEST(VersusPageTest, AsksNothingOfANetwork) {
  const SampleVersus sample;
  const std::string page = VersusPage(sample.view());
  EXPECT_EQ(page, VersusPage(sample.view()));
  EXPECT_THAT(page, HasSubstr("content=\"default-src 'none'; "));
  for (const char* outside :
       {"<link rel=\"stylesheet", "<script src", "<img", "@import", "url("}) {
    EXPECT_EQ(Count(std::string(kVersusShell.text), outside), 0U) << outside;
  }
  EXPECT_THAT(std::string(kVersusScript.text), Not(HasSubstr("</script")));
  EXPECT_THAT(std::string(kVersusScript.text), Not(HasSubstr("<!--")));
}

TEST(VersusPageTest, NamesStayText) {
  SampleVersus sample;
  const std::string name = "</script></title><img src=x onerror=alert(1)>";
  sample.source_a.store = sample.source_b.store = name;
  for (RunResult* run : {&sample.a, &sample.b}) {
    run->facts.title = run->facts.node = run->facts.node_title = name;
    run->facts.simulator = run->facts.started = name;
    run->calibrations[0].corner.name = name;
    run->cells[0].name = name;
    run->warnings = {name};
    for (Comparison& row : run->comparisons) {
      row.arc.cell = row.arc.output = row.corner = row.reason = name;
    }
  }
  sample.PairUp();
  ASSERT_FALSE(sample.versus.arcs.empty());
  ASSERT_FALSE(sample.versus.only_a.empty());
  const std::string page = VersusPage(sample.view());
  EXPECT_EQ(Count(page, "<img"), 0U);
  EXPECT_EQ(Count(page, "</script"), 3U);
  EXPECT_EQ(Count(page, "</title"), 1U);
}

TEST(VersusDataTest, HasAllThatIsDrawn) {
  using nlohmann::json;
  const SampleVersus sample;
  const json data = json::parse(VersusData(sample.view()));
  EXPECT_EQ(data.at("format"), "gatedyno-versus-page/1");
  EXPECT_EQ(data.at("agreement"), 0.1);
  EXPECT_EQ(data.at("cells"), (json{"inv", "nand2"}));
  EXPECT_EQ(data.at("outputs"),
            (json{"fall, pull-down 1 high",
                  "fall, pull-down 2 high",
                  "rise, pull-up 1 high"}));
  ASSERT_EQ(data.at("arcs").size(), 4U);
  EXPECT_EQ(data.at("arcs")[0],
            (json{{"c", 0},
                  {"k", 0},
                  {"o", 0},
                  {"n", "a->y fall"},
                  {"e", "fall"},
                  {"f", "changed"},
                  {"d", false},
                  {"g", {1.0, 1.0, 0.0, 0.0}},
                  {"p", {1.0, 1.25, 0.25, 0.0}}}));
  EXPECT_EQ(data.at("arcs")[3].at("g"), (json{1.5, nullptr, nullptr, nullptr}));
  EXPECT_EQ(data.at("arcs")[3].at("o"), 2);
}

}  // namespace
}  // namespace gatedyno
