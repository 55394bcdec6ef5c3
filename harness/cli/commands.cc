#include "harness/cli/commands.h"

namespace gatedyno {

std::vector<Command> Commands() {
  return {EstimateCommand(),
          RunCommand(),
          DeckCommand(),
          StatusCommand(),
          ReportCommand(),
          ReplayCommand(),
          TaskCommand()};
}

}  // namespace gatedyno
