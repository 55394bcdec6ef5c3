#include "harness/report/junit_report.h"

#include <sstream>
#include <string>

#include <boost/property_tree/ptree.hpp>
#include <boost/property_tree/xml_parser.hpp>
#include <gtest/gtest.h>

#include "tests/report/exempt_run.h"
#include "tests/report/sample_run.h"

namespace gatedyno {
namespace {

using boost::property_tree::ptree;

// Read by a parser that is not ours.
ptree Read(const RunResult& result) {
  std::istringstream text(JunitReport(result, kToday));
  ptree root;
  boost::property_tree::read_xml(text, root);
  return root.get_child("testsuites");
}

TEST(JunitReportTest, HasASuiteForEachCorner) {
  const ptree root = Read(SampleRun());
  EXPECT_EQ(root.get<std::string>("<xmlattr>.name"),
            "gates of an interrupt arbiter");
  EXPECT_EQ(root.get<int>("<xmlattr>.tests"), 7);
  EXPECT_EQ(root.get<int>("<xmlattr>.failures"), 2);
  EXPECT_EQ(root.get<int>("<xmlattr>.errors"), 3);
  ASSERT_EQ(root.count("testsuite"), 2U);
  const ptree& typical = root.get_child("testsuite");
  EXPECT_EQ(typical.get<std::string>("<xmlattr>.name"), "typical");
  EXPECT_EQ(typical.get<std::string>("<xmlattr>.timestamp"),
            "2024-01-02T03:04:05");
  EXPECT_EQ(typical.get<int>("<xmlattr>.tests"), 6);
  EXPECT_EQ(typical.get<int>("<xmlattr>.errors"), 2);
}

TEST(JunitReportTest, ACaseSaysWhatIsWrong) {
  RunResult result = SampleRun();
  result.comparisons = {BeyondRow(), UnmeasuredRow()};
  result.comparisons[1].arc.cell = "<b>\n\"&'";
  const ptree suite = Read(result).get_child("testsuite");
  const ptree& beyond = suite.front().first == "<xmlattr>"
                            ? std::next(suite.begin())->second
                            : suite.front().second;
  EXPECT_EQ(beyond.get<std::string>("<xmlattr>.classname"), "typical.nand2");
  EXPECT_EQ(beyond.get<std::string>("<xmlattr>.name"), "b->y fall with a=1");
  EXPECT_EQ(beyond.get<std::string>("failure.<xmlattr>.message"),
            "g 1.90 against 1.33 by hand: +42.5 % (allowed 25 %)");
  const ptree& property = beyond.get_child("properties.property");
  EXPECT_EQ(property.get<std::string>("<xmlattr>.name"), "g_hand");
  EXPECT_EQ(property.get<double>("<xmlattr>.value"), 4.0 / 3.0);
  const ptree& failed = suite.back().second;
  EXPECT_EQ(failed.get<std::string>("error.<xmlattr>.message"),
            UnmeasuredRow().reason);
  EXPECT_EQ(failed.get<std::string>("<xmlattr>.classname"),
            "typical.<b>\n\"&'");
}

TEST(JunitReportTest, AnEmptyRunHasNoSuite) {
  EXPECT_EQ(Read(RunResult()).count("testsuite"), 0U);
}

// Beyond, excused; not measured, its exemption expired.
TEST(JunitReportTest, WhatIsExcusedIsSkipped) {
  RunResult result = ExemptRun();
  result.comparisons = {BeyondRow(), UnmeasuredRow()};
  std::istringstream text(JunitReport(result, kToday));
  ptree root;
  boost::property_tree::read_xml(text, root);
  const ptree& suite = root.get_child("testsuites.testsuite");
  EXPECT_EQ(suite.get<int>("<xmlattr>.tests"), 2);
  EXPECT_EQ(suite.get<int>("<xmlattr>.failures"), 0);
  EXPECT_EQ(suite.get<int>("<xmlattr>.errors"), 1);
  EXPECT_EQ(suite.get<int>("<xmlattr>.skipped"), 1);
  const ptree& beyond = suite.get_child("testcase");
  EXPECT_EQ(beyond.count("failure"), 0U);
  EXPECT_EQ(beyond.get<std::string>("skipped.<xmlattr>.message"), kExemptNote);
  EXPECT_EQ(suite.back().second.count("error"), 1U);
  EXPECT_EQ(suite.back().second.count("skipped"), 0U);
}

}  // namespace
}  // namespace gatedyno
