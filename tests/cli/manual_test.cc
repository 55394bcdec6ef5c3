#include "harness/cli/manual.h"

#include <string>

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "harness/cli/commands.h"

namespace gatedyno {
namespace {

using ::testing::HasSubstr;

std::string Manual() {
  CLI::App program("", "gatedyno");
  program.footer("Exit codes: 0 all within.");
  AddCommands(program);
  return ManualPage(program, "1.2.3");
}

TEST(ManualTest, HasEveryCommandWithItsOptions) {
  const std::string manual = Manual();
  EXPECT_THAT(manual, HasSubstr(".TH GATEDYNO 1 \"\" \"gatedyno 1.2.3\""));
  for (const Command& command : Commands()) {
    const std::string heading = ".SS " + command.name + "\n";
    EXPECT_EQ(manual.find(heading) == std::string::npos, command.hidden)
        << command.name;
  }
  EXPECT_THAT(manual,
              HasSubstr("\\fBgatedyno report\\fR \\fIstore\\fR [\\fIoption\\fR "
                        "...]\n.PP\n"));
  EXPECT_THAT(manual,
              HasSubstr(".TP\n\\fB\\-\\-drive\\fR \\fBmatched\\fR|\\fBself\\fR"
                        "\nwhat drives the cell under test\n"));
  EXPECT_THAT(manual,
              HasSubstr(".TP\n\\fB\\-o\\fR, \\fB\\-\\-page\\fR "
                        "\\fIFILE\\fR\n"));
  EXPECT_THAT(manual, HasSubstr("\n.PP\nNothing is simulated and nothing "));
  EXPECT_THAT(manual, HasSubstr(".SH EXIT STATUS\nExit codes: 0 all within."));
}

TEST(ManualTest, TextIsNoMarkup) {
  CLI::App program("", "gatedyno");
  CLI::App* command = program.add_subcommand("odd", ".so /etc/passwd \\fB a-b");
  bool flag = false;
  command->add_flag("--flag", flag, "'quoted");
  const std::string manual = ManualPage(program, "1");
  EXPECT_THAT(manual, HasSubstr("\n\\&.so /etc/passwd \\efB a\\-b.\n"));
  EXPECT_THAT(manual, HasSubstr("\n\\&'quoted\n"));
}

}  // namespace
}  // namespace gatedyno
