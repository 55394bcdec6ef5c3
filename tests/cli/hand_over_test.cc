// What is handed over with the program: its manual page and completion, as the
// programs that read them see them.

#include <filesystem>
#include <string>

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "tests/cli/program.h"

namespace gatedyno {
namespace {

using ::testing::HasSubstr;

bool IsInstalled(const char* program) {
  return std::filesystem::exists(std::string("/usr/bin/") + program);
}

TEST(HandOverTest, TheManualPageIsGoodRoff) {
  if (!IsInstalled("groff")) {
    GTEST_SKIP() << "groff is not installed (Debian's package groff-base)";
  }
  const Program gatedyno;
  const Ended manual = gatedyno.Run({"manual"});
  ASSERT_EQ(manual.exit_code, 0) << manual.err;
  const std::string file = gatedyno.Write("gatedyno.1", manual.out);
  const Ended shown =
      Program("/usr/bin/groff")
          .Run({"-man", "-ww", "-Tutf8", "-P-c", "-P-b", "-P-u", file});
  EXPECT_EQ(shown.exit_code, 0);
  EXPECT_EQ(shown.err, "");  // No warning.
  EXPECT_THAT(shown.out, HasSubstr("gatedyno report store [option ...]"));
  EXPECT_THAT(shown.out, HasSubstr("EXIT STATUS"));
}

// What bash would offer for the words.
std::string OffersOf(const std::string& words) {
  const Ended ended =
      Program("/bin/bash")
          .Run({"-c",
                "gatedyno() { \"" GATEDYNO_BIN_DIR "/gatedyno\" \"$@\"; }\n"
                ". \"" GATEDYNO_SOURCE_DIR
                "/harness/cli/shell/gatedyno.bash\"\n"
                "touch netlist.sp; mkdir night\n"
                "COMP_WORDS=(" +
                    words +
                    ")\nCOMP_CWORD=$((${#COMP_WORDS[@]} - 1))\n"
                    "_gatedyno\nprintf '%s;' \"${COMPREPLY[@]}\"\n"});
  EXPECT_EQ(ended.err, "");
  return ended.out;
}

TEST(HandOverTest, BashCompletes) {
  EXPECT_EQ(OffersOf("gatedyno est"), "estimate;");
  EXPECT_EQ(OffersOf("gatedyno run --node p1"), "p130;p180;");
  EXPECT_EQ(OffersOf("gatedyno run --node = p1"), "p130;p180;");
  EXPECT_EQ(OffersOf("gatedyno run --node p45 ne"), "netlist.sp;");
  EXPECT_EQ(OffersOf("gatedyno deck inv --out ''"), "night;");
  EXPECT_THAT(OffersOf("gatedyno run --corner slow"), HasSubstr("slow_"));
}

}  // namespace
}  // namespace gatedyno
