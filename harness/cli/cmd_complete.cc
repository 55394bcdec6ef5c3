// gatedyno complete: what may stand next, for the completion of a shell.

#include <set>
#include <string>
#include <vector>

#include <fmt/format.h>

#include "harness/cli/commands.h"
#include "harness/cli/completion.h"
#include "harness/flow/cell_set.h"
#include "harness/node/process_node.h"

namespace gatedyno {
namespace {

std::vector<std::string> CornersOfBuiltInNodes() {
  std::set<std::string> corners;
  for (const std::string& name : BuiltInNodes()) {
    const Result<ProcessNode> node = LoadNode(name);
    if (node.ok()) {
      for (const Corner& corner : node->corners) {
        corners.insert(corner.name);
      }
    }
  }
  return {corners.begin(), corners.end()};
}

}  // namespace

Command CompleteCommand() {
  return {.name = "complete",
          .summary = "say what may stand next (for shells)",
          .add = [](CLI::App& app) -> Action {
            // Whatever follows the program's name is a word, no option of ours.
            app.prefix_command();
            const CLI::App* program = app.get_parent();
            return [&app, program]() -> Result<ExitCode> {
              std::vector<std::string> words = app.remaining();
              if (words.empty()) {
                return BadInput(
                    "complete: needs the words of the line, the "
                    "program's name first");
              }
              words.erase(words.begin());
              const KnownNames names = {.nodes = BuiltInNodes(),
                                        .corners = CornersOfBuiltInNodes(),
                                        .cells = BuiltInCells()};
              fmt::print("{}",
                         CompletionText(Complete(*program, words, names)));
              return kAllWithin;
            };
          },
          .hidden = true};
}

}  // namespace gatedyno
