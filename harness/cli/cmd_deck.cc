// gatedyno deck: writes the decks of a plan, for any SPICE simulator that knows
// the models.

#include <filesystem>
#include <map>
#include <memory>

#include <fmt/format.h>

#include "harness/base/file.h"
#include "harness/base/install.h"
#include "harness/cli/commands.h"
#include "harness/cli/file_names.h"
#include "harness/cli/plan_options.h"
#include "harness/flow/calibrate.h"
#include "harness/flow/characterize.h"
#include "harness/sim/simulator_identity.h"
#include "harness/sim/worker_pool.h"
#include "harness/store/store.h"

namespace gatedyno {
namespace {

struct Options {
  PlanOptions plan;
  std::string folder;
};

// "nand2_a_y_rise_1_h4_typical": arc, side vector, fanout, corner.
std::string DeckStem(const ArcSweep& sweep,
                     double fanout,
                     const std::string& corner) {
  const Arc& arc = sweep.arc;
  std::string side;
  for (const SideInput& input : arc.side) {
    side += input.high ? '1' : '0';
  }
  return fmt::format("{}_{}_{}_{}{}_h{}_{}",
                     arc.cell,
                     arc.pin,
                     arc.output,
                     EdgeName(arc.edge),
                     side.empty() ? "" : "_" + side,
                     fanout,
                     corner);
}

// Writes the decks of one command, each to a file of its own.
class DeckFolder {
 public:
  explicit DeckFolder(std::filesystem::path folder)
      : folder_(std::move(folder)) {}

  Status Write(const ArcSweep& sweep, const std::string& corner) {
    for (size_t i = 0; i < sweep.jobs.size(); ++i) {
      const std::string stem = DeckStem(sweep, sweep.fanouts[i], corner);
      Status status =
          WriteFile(folder_ / names_.FileName(stem, ".sp"), sweep.jobs[i].deck);
      if (!status.ok()) {
        return status;
      }
    }
    written_ += sweep.jobs.size();
    return Ok();
  }

  size_t written() const { return written_; }

 private:
  std::filesystem::path folder_;
  FileNames names_;
  size_t written_ = 0;
};

// The run time of a deck follows from tau, so the reference inverter is
// measured first.
Result<ExitCode> WriteDecks(const PreparedRun& run,
                            const std::string& simulator,
                            OutcomeBook* book,
                            DeckFolder* folder) {
  const Result<CalibrationSet> calibrated =
      CalibrateCorners(run, simulator, book);
  if (!calibrated.ok()) {
    return Forward(calibrated);
  }
  for (const auto& [corner, reason] : calibrated->failures) {
    return Unavailable(fmt::format("corner {}: {}", corner, reason));
  }
  for (const auto& [name, calibration] : calibrated->by_corner) {
    const Result<std::vector<ArcSweep>> sweeps =
        PlanArcs(run, calibration.corner, calibration, simulator);
    if (!sweeps.ok()) {
      return Forward(sweeps);
    }
    for (const ArcSweep& sweep : *sweeps) {
      const Status written = folder->Write(sweep, name);
      if (!written.ok()) {
        return Forward(written);
      }
    }
  }
  return kAllWithin;
}

Result<ExitCode> Deck(const Options& options) {
  const Result<Plan> plan = PlanOf(options.plan);
  if (!plan.ok()) {
    return Forward(plan);
  }
  const Result<PreparedRun> run = PrepareRun(*plan);
  if (!run.ok()) {
    return Forward(run);
  }
  const Result<std::string> simulator = SimulatorIdentity(WorkerProgram());
  if (!simulator.ok()) {
    return Forward(simulator);
  }
  Result<Store> store = Store::Open(":memory:");
  if (!store.ok()) {
    return Forward(store);
  }
  Result<WorkerPool> pool = WorkerPool::Make({});
  if (!pool.ok()) {
    return Forward(pool);
  }
  const Result<RunId> run_id = store->BeginRun({});
  if (!run_id.ok()) {
    return Forward(run_id);
  }
  OutcomeBook book(
      &*pool, &*store, *run_id, [](const JobCounts& /*counts*/) {});
  DeckFolder folder(options.folder);
  Result<ExitCode> done = WriteDecks(*run, *simulator, &book, &folder);
  if (done.ok()) {
    fmt::print("{} decks in {}\n", folder.written(), options.folder);
  }
  return done;
}

}  // namespace

Command DeckCommand() {
  return {"deck",
          "write the decks a run would simulate",
          [](CLI::App& app) -> Action {
            const auto options = std::make_shared<Options>();
            AddPlanOptions(app, options->plan);
            app.add_option("-o,--out", options->folder, "folder to write to")
                ->required();
            return [options] { return Deck(*options); };
          }};
}

}  // namespace gatedyno
