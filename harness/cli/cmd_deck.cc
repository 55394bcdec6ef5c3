// gatedyno deck: writes the decks of a plan, for any SPICE simulator that knows
// the models.

#include <filesystem>
#include <memory>

#include <fmt/format.h>

#include "harness/base/file.h"
#include "harness/cli/commands.h"
#include "harness/cli/file_names.h"
#include "harness/cli/plan_options.h"
#include "harness/cli/value_kind.h"
#include "harness/flow/calibrate.h"
#include "harness/flow/characterize.h"
#include "harness/sim/worker_pool.h"
#include "harness/store/store.h"

namespace gatedyno {
namespace {

struct Options {
  PlanOptions plan;
  std::string folder;
};

// "nand2_a_y_rise_1_h4_typical": arc, side vector, fanout, corner.
std::string DeckStem(const StageTest& test, const std::string& corner) {
  const Arc& arc = test.arc;
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
                     test.fanout,
                     corner);
}

// Writes the decks of one command, each to a file of its own.
class DeckFolder {
 public:
  explicit DeckFolder(std::filesystem::path folder)
      : folder_(std::move(folder)) {}

  Status Write(const Bench& bench, const StageTest& test) {
    const std::string stem = DeckStem(test, bench.corner.name);
    ++written_;
    return WriteFile(folder_ / names_.FileName(stem, ".sp"),
                     DeckText(StageJob(bench, test), 0));
  }

  int written() const { return written_; }

 private:
  std::filesystem::path folder_;
  FileNames names_;
  int written_ = 0;
};

Status WriteCorner(const PreparedRun& run,
                   const Bench& bench,
                   const Calibration& calibration,
                   DeckFolder* folder) {
  for (size_t cell = 0; cell < run.cells.size(); ++cell) {
    for (StageTest& test : ArcTests(run, cell, calibration)) {
      for (const double fanout : AllFanouts(FanoutRuleOf(run.plan))) {
        test.fanout = fanout;
        Status written = folder->Write(bench, test);
        if (!written.ok()) {
          return written;
        }
      }
    }
  }
  return Ok();
}

// The run time of a deck follows from tau, so the reference inverter is
// measured first.
Status WriteDecks(const PreparedRun& run,
                  const Benches& benches,
                  WorkDesk* desk,
                  DeckFolder* folder) {
  const FanoutRule fanouts = FanoutRuleOf(run.plan);
  AccuracySample sample(run.plan.accuracy);
  const auto references = MeasureReferences(
      run, benches, {.fanouts = &fanouts, .sample = &sample, .desk = desk});
  if (!references.ok()) {
    return Forward(references);
  }
  const CalibrationSet calibrated =
      CalibrateCorners(run, *references, sample.DelayUncertainty());
  if (!calibrated.failures.empty()) {
    const auto& [corner, reason] = *calibrated.failures.begin();
    return Unavailable(fmt::format("corner {}: {}", corner, reason));
  }
  for (const auto& [name, calibration] : calibrated.by_corner) {
    Status written = WriteCorner(run, benches.at(name), calibration, folder);
    if (!written.ok()) {
      return written;
    }
  }
  return Ok();
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
  Result<WorkerPool> pool = WorkerPool::Make({});
  if (!pool.ok()) {
    return Forward(pool);
  }
  const Result<std::string> simulator = pool->Simulator();
  if (!simulator.ok()) {
    return Forward(simulator);
  }
  Result<Store> store = Store::Open(":memory:");
  if (!store.ok()) {
    return Forward(store);
  }
  const Result<Benches> benches = BenchesOf(*run, *simulator);
  if (!benches.ok()) {
    return Forward(benches);
  }
  WorkDesk desk(&*pool, &*store, {});
  DeckFolder folder(options.folder);
  const Status written = WriteDecks(*run, *benches, &desk, &folder);
  if (!written.ok()) {
    return Forward(written);
  }
  fmt::print("{} decks in {}\n", folder.written(), options.folder);
  return kAllWithin;
}

}  // namespace

Command DeckCommand() {
  return {"deck",
          "write the decks a run would simulate",
          [](CLI::App& app) -> Action {
            const auto options = std::make_shared<Options>();
            AddPlanOptions(app, options->plan);
            app.add_option("-o,--out", options->folder, "folder to write to")
                ->type_name(kFolder)
                ->required();
            return [options] { return Deck(*options); };
          }};
}

}  // namespace gatedyno
