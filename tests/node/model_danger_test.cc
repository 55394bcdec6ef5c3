// That the simulator really does what the rules for model files refuse: with
// each of these files included, it runs a command of the machine.  A rule whose
// reason goes away with a newer simulator shows here.

#include <filesystem>
#include <string>

#include <gtest/gtest.h>

#include "tests/node/node_folder.h"
#include "tests/support/ngspice_batch.h"

namespace gatedyno {
namespace {

// COMMAND stands for the command.
constexpr const char* kDangers[] = {
    ".control\nCOMMAND\n.endc\n",
    "  .CONTROL now\nCOMMAND\n.endc\n",
    ".controls\nCOMMAND\n.endc\n",
    ".con\rtrol\nCOMMAND\n.endc\n",
    "*#COMMAND\n",
    "*# COMMAND\n",
    "  *#COMMAND\n",
    "*\r#COMMAND\n",
    "$#COMMAND\n",
    ";#COMMAND\n",
    "=#COMMAND\n",
    "\"#COMMAND\n",
    "\f#COMMAND\n",
    ".param q=1\n+\n*#COMMAND\n",
    ".subckt s a\n*#COMMAND\n.ends\n",
    ".if (1==1)\n.control\nCOMMAND\n.endc\n.endif\n",
};

std::string With(std::string text, const std::string& command) {
  const std::string mark = "COMMAND";
  return text.replace(text.find(mark), mark.size(), command);
}

TEST(ModelDangerTest, SimulatorRunsWhatIsRefused) {
  NodeFolder folder;
  // A relative name in lower case: the simulator changes the case of some.
  const auto before = std::filesystem::current_path();
  std::filesystem::current_path(folder.path());
  const std::string proof = "proof";
  for (const char* danger : kDangers) {
    folder.WriteCards(With(danger, "shell touch " + proof));
    std::filesystem::remove(proof);
    const Result<BatchMeasures> run = RunBatch(
        "* danger\nv1 a 0 pulse(0 1 1n 1n 1n 5n 20n)\nr1 a 0 1k\n.include \"" +
        folder.CardsFile() +
        "\"\n.tran 0.1n 10n\n.meas tran t trig v(a) val=0.2 rise=1 targ v(a) "
        "val=0.8 rise=1\n.end\n");
    EXPECT_TRUE(run.ok()) << danger << run.error().message;
    EXPECT_TRUE(std::filesystem::exists(proof)) << danger;
    EXPECT_FALSE(folder.Load(SmallNode()).ok()) << danger;
  }
  std::filesystem::current_path(before);
}

}  // namespace
}  // namespace gatedyno
