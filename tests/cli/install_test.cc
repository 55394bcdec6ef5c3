// An installation in a folder of its own finds all that came with it.

#include <filesystem>
#include <string>

#include <boost/process.hpp>
#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "tests/cli/program.h"

namespace gatedyno {
namespace {

using ::testing::HasSubstr;

TEST(InstallTest, InstalledProgramFindsNodesCellsPlansAndWorker) {
  const TemporaryFolder prefix;
  const Ended installed = Program(CMAKE_PROGRAM)
                              .Run({"--install",
                                    GATEDYNO_BUILD_DIR,
                                    "--prefix",
                                    (prefix.path() / "pre fix").string()});
  ASSERT_EQ(installed.exit_code, 0) << installed.err;
  // Elsewhere later: nothing may remember the first place.
  const std::filesystem::path moved = prefix.path() / "moved here";
  std::filesystem::rename(prefix.path() / "pre fix", moved);

  const Program program((moved / "bin/gatedyno").string());
  EXPECT_EQ(program.Run({"--version"}).exit_code, 0);
  const Ended estimate = program.Run({"estimate", "inv"});
  EXPECT_EQ(estimate.exit_code, 0) << estimate.err;
  EXPECT_THAT(estimate.out, HasSubstr("y = !a"));
  const Ended run =
      program.Run({"run", "inv", "--fanouts", "1,2,3", "--node", "p65"});
  EXPECT_EQ(run.exit_code, 0) << run.out << run.err;
  EXPECT_THAT(run.out, HasSubstr("2 arcs: 2 within"));
  // All cells of the plan, but only the reference inverter is simulated.
  const Ended decks =
      program.Run({"deck",
                   (moved / "share/gatedyno/decks/plans/arbiter.json").string(),
                   "-o",
                   "decks"});
  EXPECT_EQ(decks.exit_code, 0) << decks.err;
  EXPECT_THAT(decks.out, ::testing::MatchesRegex("[0-9]+ decks in decks\n"));
}

}  // namespace
}  // namespace gatedyno
