// A job of a real run, simulated again.

#include <string>

#include <gmock/gmock.h>
#include <gtest/gtest.h>
#include <nlohmann/json.hpp>

#include "tests/cli/program.h"

namespace gatedyno {
namespace {

using nlohmann::json;
using ::testing::HasSubstr;
using ::testing::MatchesRegex;

class ReplayProgramTest : public testing::Test {
 protected:
  void SetUp() override {
    const Ended run = program_.Run({"run",
                                    "inv",
                                    "--fanouts",
                                    "1,2,3",
                                    "--store",
                                    "runs.db",
                                    "--json",
                                    "run.json"});
    ASSERT_EQ(run.exit_code, 0) << run.out << run.err;
    const json report = json::parse(program_.Read("run.json"));
    key_ = report["comparisons"][0]["points"][0]["job_key"];
  }

  Program program_;
  std::string key_;
};

// The simulator on the same machine is exact: every figure is the stored one.
TEST_F(ReplayProgramTest, GivesWhatTheRunGave) {
  const Ended replay = program_.Run({"replay", key_, "--store", "runs.db"});
  EXPECT_EQ(replay.exit_code, 0) << replay.err;
  EXPECT_EQ(replay.err, "");
  EXPECT_THAT(replay.out, HasSubstr("inv a->y h=1 typical\n  key " + key_));
  EXPECT_THAT(replay.out, HasSubstr("again at rung 0:\n"));
  const size_t rows = replay.out.find("difference\n");
  ASSERT_NE(rows, std::string::npos) << replay.out;
  EXPECT_THAT(replay.out.substr(rows + 11),
              MatchesRegex("(  [a-z_]+ +[0-9.]+ ps +[0-9.]+ ps +same\n)+"));
}

// More careful settings move a delay by far less than a hundredth.
TEST_F(ReplayProgramTest, AnotherRungIsClose) {
  const Ended replay =
      program_.Run({"replay", key_, "--store", "runs.db", "--rung", "1"});
  EXPECT_EQ(replay.exit_code, 0) << replay.err;
  const size_t rows = replay.out.find("again at rung 1:\n");
  ASSERT_NE(rows, std::string::npos) << replay.out;
  EXPECT_THAT(
      replay.out.substr(rows),
      MatchesRegex("again at rung 1:\n"
                   "  interval +now +stored +difference\n"
                   "(  [a-z_]+ +[0-9.]+ ps +[0-9.]+ ps +"
                   "(same|[+-]0\\.[0-9]+ %|[+-][0-9.]+e-[0-9]+ %)\n)+"));
}

TEST_F(ReplayProgramTest, StatusSaysItIsFinished) {
  const Ended status = program_.Run({"status", "runs.db"});
  EXPECT_EQ(status.exit_code, 0) << status.err;
  EXPECT_THAT(status.out, HasSubstr("run 1: cells on p45, finished\n"));
  const Ended none = program_.Run({"status", "none.db"});
  EXPECT_EQ(none.exit_code, 2);
  EXPECT_EQ(none.err, "gatedyno: none.db: no such store\n");
}

}  // namespace
}  // namespace gatedyno
