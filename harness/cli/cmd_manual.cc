// gatedyno manual: its manual page, which the build installs.

#include <fmt/format.h>

#include "harness/cli/commands.h"
#include "harness/cli/manual.h"

namespace gatedyno {

Command ManualCommand() {
  return {.name = "manual",
          .summary = "write the manual page (for man)",
          .add = [](CLI::App& app) -> Action {
            const CLI::App* program = app.get_parent();
            return [program]() -> Result<ExitCode> {
              fmt::print("{}", ManualPage(*program, GATEDYNO_VERSION));
              return kAllWithin;
            };
          },
          .hidden = true};
}

}  // namespace gatedyno
