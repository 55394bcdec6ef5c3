#include "harness/farm/command.h"

#include <chrono>
#include <string>
#include <vector>

#include <gtest/gtest.h>

#include "tests/support/leftovers.h"

namespace gatedyno {
namespace {

using std::chrono::milliseconds;
using std::chrono::seconds;

constexpr seconds kLong(20);

Result<CommandEnd> Shell(const std::string& text, milliseconds limit = kLong) {
  return RunCommand("sh", {"-c", text}, limit);
}

struct Row {
  std::string text;
  int exit_code;
  std::string output;
  std::string complaints;
};

TEST(CommandTest, TellsExitCodeAndBothStreams) {
  const Row rows[] = {
      {"true", 0, "", ""},
      {"echo out; echo err >&2; exit 3", 3, "out\n", "err\n"},
      {"kill -KILL $$", 137, "", ""},
      {"cat", 0, "", ""},  // There is no input.
      {"exec >&- 2>&-; sleep 0.05; exit 4", 4, "", ""},
  };
  for (const Row& row : rows) {
    const auto end = Shell(row.text);
    ASSERT_TRUE(end.ok()) << row.text << ": " << end.error().message;
    EXPECT_EQ(end->exit_code, row.exit_code) << row.text;
    EXPECT_EQ(end->output, row.output) << row.text;
    EXPECT_EQ(end->complaints, row.complaints) << row.text;
  }
}

TEST(CommandTest, HearsMoreThanAPipeHolds) {
  const auto end = Shell(
      "head -c 300000 /dev/zero; head -c 300000 /dev/zero "
      ">&2");
  ASSERT_TRUE(end.ok());
  EXPECT_EQ(end->output.size(), 300'000U);
  EXPECT_EQ(end->complaints.size(), 300'000U);
}

TEST(CommandTest, DoesNotWaitForWhatACommandLeavesBehind) {
  const auto start = std::chrono::steady_clock::now();
  const auto end = Shell("sleep 5 & echo done");
  ASSERT_TRUE(end.ok());
  EXPECT_EQ(end->output, "done\n");
  EXPECT_LT(std::chrono::steady_clock::now() - start, seconds(4));
}

TEST(CommandTest, KillsWhatTakesTooLong) {
  const long before = OpenDescriptors();
  const auto end = Shell("exec sleep 30", milliseconds(150));
  ASSERT_FALSE(end.ok());
  EXPECT_EQ(end.error().message, "sh: gave no answer in 0.15 s");
  EXPECT_FALSE(HasChildren());
  EXPECT_EQ(OpenDescriptors(), before);
}

TEST(CommandTest, NamesAProgramThatIsNotThere) {
  const auto end = RunCommand("no-such-program", {}, kLong);
  ASSERT_FALSE(end.ok());
  EXPECT_EQ(end.error().kind, ErrorKind::kUnavailable);
  EXPECT_EQ(end.error().message, "no-such-program: not found on PATH");
}

}  // namespace
}  // namespace gatedyno
