#include "harness/cli/completion.h"

#include <string>
#include <vector>

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "harness/cli/commands.h"

namespace gatedyno {
namespace {

using ::testing::Contains;
using ::testing::ElementsAre;
using ::testing::IsSupersetOf;
using ::testing::Not;

class CompletionTest : public ::testing::Test {
 protected:
  CompletionTest() { AddCommands(program_); }

  Completion At(const std::vector<std::string>& words) const {
    return Complete(program_,
                    words,
                    {.nodes = {"p45", "p65"},
                     .corners = {"slow_cold", "typical"},
                     .cells = {"inv", "nand2", "nand3"}});
  }

 private:
  CLI::App program_{"", "gatedyno"};
};

TEST_F(CompletionTest, Commands) {
  EXPECT_THAT(At({""}).words, IsSupersetOf({"estimate", "run", "report"}));
  EXPECT_THAT(At({""}).words, Not(Contains("task")));  // It is hidden.
  EXPECT_THAT(At({}).words, Contains("run"));
  EXPECT_THAT(At({"est"}).words, ElementsAre("estimate"));
  EXPECT_THAT(At({"--he"}).words, ElementsAre("--help"));
  EXPECT_THAT(At({"frobnicate", ""}).words, ElementsAre());
}

TEST_F(CompletionTest, Values) {
  struct Case {
    std::vector<std::string> words;
    std::string offered;
  };
  const Case cases[] = {
      {{"run", "nand"}, "nand2\nnand3\n:files\n"},
      {{"run", "inv", "n"}, "nand2\nnand3\n:files\n"},  // As many as you like.
      {{"run", "--node", ""}, "p45\np65\n:files\n"},
      {{"run", "--node", "p6"}, "p65\n:files\n"},
      {{"run", "--node=p6"}, "p65\n:files\n"},
      {{"run", "--node", "=", "p6"}, "p65\n:files\n"},  // As bash splits it.
      {{"run", "--node", "="}, "p45\np65\n:files\n"},
      {{"run", "inv", "--corner", "t"}, "typical\n"},
      {{"run", "--drive", ""}, "matched\nself\n"},
      {{"run", "--farm", "s"}, "slurm\n"},
      {{"run", "--farm-folder", ""}, ":folders\n"},
      {{"run", "--all-side-vectors", "i"}, "inv\n:files\n"},  // Takes no value.
      {{"run", "--fanouts", ""}, ""},
      {{"report", ""}, ":files\n"},
      {{"report", "x.db", ""}, ""},  // One store is enough.
      {{"report", "x.db", "-o", ""}, ":files\n"},
      {{"report", "x.db", "--ju"}, "--junit\n"},
  };
  for (const Case& c : cases) {
    EXPECT_EQ(CompletionText(At(c.words)), c.offered)
        << ::testing::PrintToString(c.words);
  }
}

}  // namespace
}  // namespace gatedyno
