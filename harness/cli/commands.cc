#include "harness/cli/commands.h"

namespace gatedyno {

std::vector<Command> Commands() {
  return {EstimateCommand(),
          RunCommand(),
          DeckCommand(),
          StatusCommand(),
          ReportCommand(),
          ReleaseCommand(),
          VersusCommand(),
          ReplayCommand(),
          TaskCommand(),
          CompleteCommand(),
          ManualCommand()};
}

std::vector<AddedCommand> AddCommands(CLI::App& program) {
  std::vector<AddedCommand> added;
  for (const Command& command : Commands()) {
    CLI::App* app = program.add_subcommand(command.name, command.summary);
    if (command.hidden) {
      app->group("");
    }
    added.push_back({app, command.add(*app)});
  }
  return added;
}

}  // namespace gatedyno
