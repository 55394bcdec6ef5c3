// A command of the table, run in this process with the words of its line.

#ifndef GATEDYNO_TESTS_CLI_RUN_COMMAND_H_
#define GATEDYNO_TESTS_CLI_RUN_COMMAND_H_

#include <algorithm>
#include <string>
#include <vector>

#include <gtest/gtest.h>

#include "harness/cli/commands.h"

namespace gatedyno {

// What it prints goes to `out`.
inline Result<ExitCode> RunCommandLine(const Command& command,
                                       std::vector<std::string> words,
                                       std::string* out) {
  CLI::App app;
  const Action action = command.add(app);
  std::reverse(words.begin(), words.end());  // What CLI11 wants.
  app.parse(words);
  ::testing::internal::CaptureStdout();
  Result<ExitCode> exit_code = action();
  *out = ::testing::internal::GetCapturedStdout();
  return exit_code;
}

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_CLI_RUN_COMMAND_H_
