// The command `gatedyno task` alone, for the farm's tests: the rest of the
// program has no part in a task.

#include <CLI/CLI.hpp>
#include <fmt/format.h>

#include "harness/cli/commands.h"

int main(int argc, char** argv) {
  using namespace gatedyno;
  CLI::App app("", "gatedyno");
  const Command command = TaskCommand();
  CLI::App* sub = app.add_subcommand(command.name, command.summary);
  const Action action = command.add(*sub);
  CLI11_PARSE(app, argc, argv);
  const Result<ExitCode> done = action();
  if (!done.ok()) {
    fmt::print(stderr, "gatedyno: {}\n", done.error().message);
    return ExitCodeOf(done.error());
  }
  return *done;
}
