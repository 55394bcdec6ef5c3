// The commands of the program: one table, one file a command.

#ifndef GATEDYNO_CLI_COMMANDS_H_
#define GATEDYNO_CLI_COMMANDS_H_

#include <functional>
#include <string>
#include <vector>

#include <CLI/CLI.hpp>

#include "harness/base/result.h"
#include "harness/cli/exit_code.h"

namespace gatedyno {

// Runs a command whose options have been parsed.
using Action = std::function<Result<ExitCode>()>;

struct Command {
  std::string name;
  std::string summary;
  // Adds the command's options and says what to do once they are parsed.
  std::function<Action(CLI::App& app)> add;
  bool hidden = false;  // Works, but is not in the list: programs call it.
};

std::vector<Command> Commands();

struct AddedCommand {
  CLI::App* app;
  Action action;
};

// Gives the program its commands, of the table.
std::vector<AddedCommand> AddCommands(CLI::App& program);

Command EstimateCommand();  // cmd_estimate.cc
Command DeckCommand();      // cmd_deck.cc
Command RunCommand();       // cmd_run.cc
Command StatusCommand();    // cmd_status.cc
Command ReplayCommand();    // cmd_replay.cc
Command ReportCommand();    // cmd_report.cc
Command ReleaseCommand();   // cmd_release.cc
Command VersusCommand();    // cmd_versus.cc
Command TaskCommand();      // cmd_task.cc
Command CompleteCommand();  // cmd_complete.cc
Command ManualCommand();    // cmd_manual.cc

}  // namespace gatedyno

#endif  // GATEDYNO_CLI_COMMANDS_H_
