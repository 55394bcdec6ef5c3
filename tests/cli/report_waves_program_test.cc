// Waveforms on the page of a real run: the built program and its worker.

#include <filesystem>
#include <string>
#include <utility>

#include <gmock/gmock.h>
#include <gtest/gtest.h>
#include <nlohmann/json.hpp>

#include "tests/cli/program.h"

namespace gatedyno {
namespace {

using nlohmann::json;
using ::testing::HasSubstr;
using ::testing::Not;

constexpr const char* kFar = "Not the simulation of the run.";

class ReportWavesProgramTest : public testing::Test {
 protected:
  // Of its own cards, which a test can take away or change.
  void SetUp() override {
    for (const char* file : {"p45.json", "p45.sp"}) {
      program_.Write(
          file, *ReadFile(std::string(GATEDYNO_SOURCE_DIR "/models/") + file));
    }
    const Ended run = program_.Run({"run",
                                    "inv",
                                    "--node",
                                    "p45.json",
                                    "--fanouts",
                                    "1,3,5",
                                    "--store",
                                    "runs.db",
                                    "--json",
                                    "run.json"});
    ASSERT_EQ(run.exit_code, 0) << run.out << run.err;
  }

  Ended Report() const {
    return program_.Run({"report", "runs.db", "-o", "a.html", "--waves", "2"});
  }

  // What the page draws.
  json Data() const {
    const std::string page = program_.Read("a.html");
    const std::string begin = "id=\"waves-data\">";
    const size_t at = page.find(begin);
    EXPECT_NE(at, std::string::npos);
    const size_t start = at + begin.size();
    return json::parse(page.substr(start, page.find("</script>", at) - start));
  }

  Program program_;
};

TEST_F(ReportWavesProgramTest, ShowsWhatTheRunMeasured) {
  const Ended report = Report();
  EXPECT_EQ(report.exit_code, 0) << report.err;
  EXPECT_THAT(report.out, HasSubstr("\nwaveforms: 2 of 2 arcs\nwritten: "));
  // The same simulator, deck and rung: the same delay, to the last bit.
  EXPECT_THAT(program_.Read("a.html"), Not(HasSubstr(kFar)));
  const json rows = json::parse(program_.Read("run.json")).at("comparisons");
  const json waves = Data();
  ASSERT_EQ(waves.size(), 2U);
  for (const json& one : waves) {
    // Of 3 and 5, as near to 4, the first.
    const json& point = rows.at(one.at("place").get<size_t>()).at("points")[1];
    EXPECT_EQ(point.at("fanout"), 3.0);
    constexpr double kPicosecond = 1e-12;
    constexpr double kRounding_s = 0.6e-15;  // The page's 0.001 ps.
    const std::pair<const char*, size_t> values[] = {
        {"delay_s", 0}, {"input_transition_s", 1}, {"output_transition_s", 2}};
    for (const auto& [name, place] : values) {
      const json& mark = one.at("marks")[place];
      const double length_ps =
          mark.at("to")[1].get<double>() - mark.at("from")[1].get<double>();
      EXPECT_NEAR(length_ps * kPicosecond,
                  point.at(name).get<double>(),
                  2 * kRounding_s)
          << name;
    }
  }
}

TEST_F(ReportWavesProgramTest, TheStoreDoesNotGrow) {
  ASSERT_EQ(Report().exit_code, 0);
  const std::string before = program_.Read("runs.db");
  ASSERT_EQ(Report().exit_code, 0);
  EXPECT_EQ(program_.Read("runs.db"), before);
}

// A card that has changed since gives another delay.
TEST_F(ReportWavesProgramTest, DoubtsWhatAnotherCardGives) {
  std::string card = program_.Read("p45.sp");
  const std::string thickness = "1.25e-9*ktox";
  const size_t at = card.find(thickness);
  ASSERT_NE(at, std::string::npos);
  card.replace(at, thickness.size(), "1.5e-9*ktox");
  program_.Write("p45.sp", card);
  const Ended report = Report();
  EXPECT_EQ(report.exit_code, 0) << report.err;
  EXPECT_THAT(program_.Read("a.html"), HasSubstr(kFar));
}

// The page is written all the same, with the simulator's words.
TEST_F(ReportWavesProgramTest, SaysWhyThereAreNone) {
  std::filesystem::remove(program_.path() / "p45.sp");
  const Ended report = Report();
  EXPECT_EQ(report.exit_code, 0) << report.err;
  EXPECT_THAT(
      report.out,
      HasSubstr("\nwaveforms: 0 of 2 arcs; the page says why no more\n"));
  const std::string page = program_.Read("a.html");
  EXPECT_THAT(page, HasSubstr("<strong>No waveforms.</strong> failed again: "));
  EXPECT_THAT(page, HasSubstr("p45.sp"));
  EXPECT_THAT(page, HasSubstr("id=\"arc-table\""));
}

}  // namespace
}  // namespace gatedyno
