// gatedyno estimate: the hand numbers of cells, without simulation.

#include <memory>

#include <fmt/format.h>
#include <unistd.h>

#include "harness/cli/commands.h"
#include "harness/cli/value_kind.h"
#include "harness/flow/prepared_run.h"
#include "harness/report/estimate_table.h"

namespace gatedyno {
namespace {

struct Options {
  std::vector<std::string> cells;
  std::string node = "p45";
  bool all_side_vectors = false;
};

Result<ExitCode> PrintEstimates(const Options& options) {
  Plan plan;
  plan.node = options.node;
  plan.cells = options.cells;
  plan.all_side_vectors = options.all_side_vectors;
  const Result<PreparedRun> run = PrepareRun(plan);
  if (!run.ok()) {
    return Forward(run);
  }
  const Style style(TakesColour(STDOUT_FILENO));
  for (const CellEstimate& estimate : run->estimates) {
    fmt::print("{}\n", EstimateTable(estimate, style));
  }
  for (const std::string& warning : run->warnings) {
    fmt::print(stderr, "warning: {}\n", warning);
  }
  return kAllWithin;
}

}  // namespace

Command EstimateCommand() {
  return {"estimate",
          "hand numbers of cells: function, network check, g and p",
          [](CLI::App& app) -> Action {
            const auto options = std::make_shared<Options>();
            app.add_option("cells",
                           options->cells,
                           "netlist files, or built-in cells by name (* and ? "
                           "allowed)")
                ->type_name(kCell)
                ->required();
            app.add_option("--node",
                           options->node,
                           "built-in node or a node file (default: p45)")
                ->type_name(kNode);
            app.add_flag("--all-side-vectors",
                         options->all_side_vectors,
                         "list every side vector, not only the worst");
            return [options] { return PrintEstimates(*options); };
          }};
}

}  // namespace gatedyno
