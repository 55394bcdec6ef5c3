#include "harness/flow/prepared_run.h"

#include <system_error>
#include <utility>

#include <fmt/format.h>
#include <fnmatch.h>

#include "harness/flow/agreement_warnings.h"
#include "harness/flow/cell_set.h"
#include "harness/flow/width_warnings.h"

namespace gatedyno {
namespace {

// A plan's node is a built-in name, or a path that starts from the plan.
Result<ProcessNode> NodeOf(const Plan& plan) {
  const std::filesystem::path beside = plan.folder / plan.node;
  std::error_code ignored;
  return std::filesystem::is_regular_file(beside, ignored)
             ? LoadNode(beside.string())
             : LoadNode(plan.node);
}

Result<std::vector<Corner>> CornersOf(const Plan& plan,
                                      const ProcessNode& node) {
  if (plan.corners.empty()) {
    return std::vector<Corner>{node.corners.front()};
  }
  std::vector<bool> chosen(node.corners.size(), false);
  for (const std::string& pattern : plan.corners) {
    bool matched = false;
    for (size_t i = 0; i < node.corners.size(); ++i) {
      if (::fnmatch(pattern.c_str(), node.corners[i].name.c_str(), 0) == 0) {
        chosen[i] = matched = true;
      }
    }
    if (!matched) {
      return Forward(FindCorner(node, pattern));
    }
  }
  std::vector<Corner> corners;
  for (size_t i = 0; i < node.corners.size(); ++i) {
    if (chosen[i]) {
      corners.push_back(node.corners[i]);
    }
  }
  return corners;
}

Status EstimateAll(PreparedRun* run) {
  const EstimateOptions options{.mu = run->node.mu,
                                .all_side_vectors = run->plan.all_side_vectors};
  for (const Cell& cell : run->cells) {
    Result<CellEstimate> estimate = EstimateCell(cell, options);
    if (!estimate.ok()) {
      return Forward(estimate);
    }
    const Result<std::vector<std::string>> widths =
        WidthWarnings(cell, run->node, options);
    if (!widths.ok()) {
      return Forward(widths);
    }
    for (const std::vector<std::string>& from :
         {cell.warnings, estimate->warnings, *widths}) {
      for (const std::string& warning : from) {
        run->warnings.push_back(fmt::format("{}: {}", cell.name, warning));
      }
    }
    run->estimates.push_back(*std::move(estimate));
  }
  return Ok();
}

}  // namespace

Result<PreparedRun> PrepareRun(const Plan& plan) {
  Result<ProcessNode> node = NodeOf(plan);
  if (!node.ok()) {
    return Forward(node);
  }
  Result<std::vector<Corner>> corners = CornersOf(plan, *node);
  if (!corners.ok()) {
    return Forward(corners);
  }
  Result<std::vector<Cell>> cells = ReadCellSet(plan.cells, plan.folder, *node);
  if (!cells.ok()) {
    return Forward(cells);
  }
  PreparedRun run{.plan = plan,
                  .node = *std::move(node),
                  .corners = *std::move(corners),
                  .cells = *std::move(cells),
                  .estimates = {},
                  .warnings = {}};
  const Status estimated = EstimateAll(&run);
  if (!estimated.ok()) {
    return Forward(estimated);
  }
  for (std::string& warning : AgreementWarnings(run)) {
    run.warnings.push_back(std::move(warning));
  }
  return run;
}

}  // namespace gatedyno
