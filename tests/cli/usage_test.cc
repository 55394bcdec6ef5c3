// How the program is called, and what it says when it is not called so.

#include <string>
#include <vector>

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "tests/cli/program.h"

namespace gatedyno {
namespace {

using ::testing::HasSubstr;
using ::testing::MatchesRegex;

TEST(UsageTest, VersionNamesProgramAndSimulator) {
  const Ended ended = Program().Run({"--version"});
  EXPECT_EQ(ended.exit_code, 0) << ended.err;
  EXPECT_THAT(ended.out,
              MatchesRegex("gatedyno [0-9]+\\.[0-9]+\\.[0-9]+\n"
                           "simulator: ngspice-[^\n]+\n"));
}

TEST(UsageTest, HelpNamesCommandsAndExitCodes) {
  const Ended help = Program().Run({"--help"});
  EXPECT_EQ(help.exit_code, 0);
  EXPECT_EQ(help.err, "");
  for (const char* text : {"estimate ",
                           "run ",
                           "deck ",
                           "status ",
                           "replay ",
                           "report ",
                           "versus ",
                           "Exit codes: 0 all within, 1 some beyond, 2 bad "
                           "input, 3 jobs that could not be measured,"}) {
    EXPECT_THAT(help.out, HasSubstr(text));
  }
  const Ended nothing = Program().Run({});
  EXPECT_EQ(nothing.exit_code, 2);
  EXPECT_EQ(nothing.out, help.out);
}

TEST(UsageTest, EveryCommandHasHelp) {
  for (const char* command :
       {"estimate", "run", "deck", "status", "replay", "report", "versus"}) {
    const Ended help = Program().Run({command, "--help"});
    EXPECT_EQ(help.exit_code, 0) << command;
    EXPECT_THAT(help.out, HasSubstr("Usage: gatedyno " + std::string(command)));
  }
}

struct Refused {
  std::vector<std::string> arguments;
  const char* message;
};

TEST(UsageTest, RefusesWhatItDoesNotKnow) {
  const std::vector<Refused> cases = {
      {{"frobnicate"},
       "the following argument was not expected: frobnicate; see gatedyno "
       "--help"},
      {{"run"}, "plan-or-cells is required; see gatedyno --help"},
      {{"estimate"}, "cells is required; see gatedyno --help"},
      {{"deck", "inv"}, "--out is required; see gatedyno --help"},
      {{"status"}, "store is required; see gatedyno --help"},
      {{"replay"}, "key is required; see gatedyno --help"},
      {{"run", "inv", "--fast"},
       "the following argument was not expected: --fast; see gatedyno --help"},
      {{"run", "inv", "--store"},
       "--store: 1 required FILE missing; see gatedyno --help"},
      {{"run", "inv", "--drive", "step"},
       "--drive: step not in {matched,self}; see gatedyno --help"},
      {{"run", "inv", "--workers", "0"},
       "--workers: Value 0 not in range 1 to 1024; see gatedyno --help"},
      {{"run", "inv", "--fanouts", "1,two"},
       "could not convert: --fanouts = 1,two; see gatedyno --help"},
      {{"run", "inv", "--fanouts", "0"},
       "--fanouts: 0: must be above 0 and at most 1000"},
      {{"run", "inv", "--fanouts", "4"},
       "--fanouts: a line needs two different ones, got 1"},
      {{"run", "inv", "--fanouts", "4,4"}, "--fanouts: 4 is there twice"},
      {{"run", "inv", "--allow-g", "0"}, "--allow-g: 0: must be above 0"},
      {{"run", "inv", "--allow-p", "-1"}, "--allow-p: -1: must be above 0"},
      {{"run", "inv", "a.json"},
       "a.json: a plan stands alone, without cells or other plans"},
      {{"run", "none.json"},
       "none.json: cannot be read: No such file or directory"},
      {{"run", "inv", "--node", "p40"},
       "node 'p40': neither a built-in node (p130, p180, p45, p65) nor a file"},
  };
  const Program program;
  for (const Refused& refused : cases) {
    const Ended ended = program.Run(refused.arguments);
    EXPECT_EQ(ended.exit_code, 2) << refused.message;
    EXPECT_EQ(ended.out, "");
    EXPECT_EQ(ended.err, std::string("gatedyno: ") + refused.message + "\n");
  }
}

TEST(UsageTest, ASystemThatRefusesIsNoBadInput) {
  const Program program;
  Ended ended = program.Run({"run", "inv", "--store", "/no/such/folder/x.db"});
  EXPECT_EQ(ended.exit_code, 4);
  EXPECT_EQ(ended.err,
            "gatedyno: /no/such/folder/x.db: unable to open database file\n");
  // A disk that is full.
  ended = program.Run({"estimate", "*"}, "/dev/full");
  EXPECT_EQ(ended.exit_code, 4);
  EXPECT_THAT(ended.err, HasSubstr("No space left on device"));
  ended = program.Run({"estimate", "inv"}, "/dev/full");
  EXPECT_EQ(ended.exit_code, 4);
  EXPECT_EQ(ended.err, "gatedyno: standard output: No space left on device\n");
}

TEST(UsageTest, AFileThatIsNoStoreStaysAsItIs) {
  const Program program;
  program.Write("notes.txt", "not to be lost\n");
  const Ended ended = program.Run({"run", "inv", "--store", "notes.txt"});
  EXPECT_EQ(ended.exit_code, 2);
  EXPECT_EQ(ended.err, "gatedyno: notes.txt: not a gatedyno store\n");
  EXPECT_EQ(program.Read("notes.txt"), "not to be lost\n");
}

}  // namespace
}  // namespace gatedyno
