// The program gatedyno.

#include <algorithm>
#include <cerrno>
#include <cstdio>
#include <exception>
#include <iostream>
#include <string>
#include <system_error>
#include <vector>

#include <CLI/CLI.hpp>
#include <fmt/format.h>

#include "harness/base/text.h"
#include "harness/cli/commands.h"
#include "harness/sim/worker_pool.h"

namespace gatedyno {
namespace {

// A message quotes files, and the terminal must not obey them.
std::string Printable(std::string text) {
  std::replace_if(
      text.begin(),
      text.end(),
      [](char c) {
        constexpr char kDelete = 0x7f;
        return (c >= 0 && c < ' ' && c != '\n' && c != '\t') || c == kDelete;
      },
      '?');
  return text;
}

int Complain(const Error& error) {
  fmt::print(stderr, "gatedyno: {}\n", Printable(error.message));
  return ExitCodeOf(error);
}

std::string UsageMessage(const CLI::ParseError& wrong) {
  std::string message = wrong.what();
  message.front() = ToLower(message.substr(0, 1)).front();
  return message + "; see gatedyno --help";
}

int PrintVersion() {
  PoolOptions options;
  options.workers = 1;
  Result<WorkerPool> pool = WorkerPool::Make(std::move(options));
  const Result<std::string> simulator =
      pool.ok() ? pool->Simulator() : Forward(pool);
  if (!simulator.ok()) {
    return Complain(simulator.error());
  }
  fmt::print("gatedyno {}\nsimulator: {}\n", GATEDYNO_VERSION, *simulator);
  return kAllWithin;
}

int RunChosen(const std::vector<AddedCommand>& commands) {
  for (const AddedCommand& command : commands) {
    if (command.app->parsed()) {
      const Result<ExitCode> done = command.action();
      return done.ok() ? *done : Complain(done.error());
    }
  }
  return kBadUsage;
}

int Main(int argc, char** argv) {
  CLI::App app(
      "Checks hand effort estimates of static CMOS cells against "
      "circuit simulation.",
      "gatedyno");
  bool version = false;
  app.add_flag("--version", version, "versions of the program and simulator");
  app.footer(
      "Exit codes: 0 all within, 1 some beyond, 2 bad input, 3 jobs "
      "that could not be measured,\n4 a fault of ours or the system's, 5 "
      "stopped by Ctrl-C.");
  const std::vector<AddedCommand> commands = AddCommands(app);
  app.require_subcommand(0, 1);
  try {
    app.parse(argc, argv);
  } catch (const CLI::Success& help) {
    app.exit(help);
    return kAllWithin;
  } catch (const CLI::ParseError& wrong) {
    return Complain({ErrorKind::kBadInput, UsageMessage(wrong)});
  }
  if (version) {
    return PrintVersion();
  }
  if (app.get_subcommands().empty()) {
    fmt::print("{}", app.help());
    return kBadUsage;
  }
  return RunChosen(commands);
}

// Nothing is well that did not reach its reader: a full disk shows only here.
int Delivered(int exit_code) {
  errno = 0;
  if (std::fflush(stdout) == 0 && std::ferror(stdout) == 0 &&
      std::cout.flush()) {
    return exit_code;
  }
  const std::string reason =
      errno == 0 ? "cannot be written"
                 : std::error_code(errno, std::generic_category()).message();
  return Complain(
      {ErrorKind::kUnavailable, fmt::format("standard output: {}", reason)});
}

}  // namespace
}  // namespace gatedyno

int main(int argc, char** argv) {
  try {
    return gatedyno::Delivered(gatedyno::Main(argc, argv));
  } catch (const std::exception& thrown) {
    fmt::print(stderr, "gatedyno: unexpected: {}\n", thrown.what());
    return gatedyno::kOwnFault;
  }
}
