// Delays a second against what a designer would otherwise script, in the same
// run, on the same arcs; everybody's delays are held against golden.

#include <filesystem>
#include <map>
#include <string>
#include <vector>

#include <fmt/format.h>
#include <fmt/ranges.h>
#include <nlohmann/json.hpp>

#include "harness/base/file.h"
#include "harness/deck/stage_measures.h"
#include "harness/record/comparison_json.h"
#include "harness/sim/job_list.h"
#include "tests/bench/batch.h"
#include "tests/bench/contest.h"
#include "tests/bench/deck_set.h"
#include "tests/bench/golden.h"
#include "tests/bench/parts.h"
#include "tests/bench/program.h"
#include "tests/bench/scene.h"
#include "tests/bench/shell.h"
#include "tests/bench/statistics.h"
#include "tests/bench/target.h"

namespace gatedyno {
namespace {

namespace fs = std::filesystem;

const std::vector<double> kFanouts = {1, 2, 3, 4, 5, 6};

Plan SamplePlan() {
  Plan plan;
  plan.node = "p45";
  plan.cells = {"inv", "nand2", "nor2", "nand3"};
  plan.fanouts = kFanouts;
  return plan;
}

std::string FanoutOption() {
  return fmt::format("--fanouts {}", fmt::join(kFanouts, ","));
}

// By the job's key.
using Delays = std::map<std::string, Outcome>;

Result<Delays> GoldenDelays(const std::vector<SampleDeck>& decks,
                            SimRunner* pool) {
  std::vector<Job> jobs;
  for (const SampleDeck& deck : decks) {
    jobs.push_back(deck.job);
  }
  Delays delays;
  GoldenRunner golden(pool, kGoldenStep_s);
  JobList list(std::move(jobs));
  const Status done =
      golden.Run(list, [&](const Job& job, const Outcome& outcome) {
        delays[job.key] = outcome;
        return Ok();
      });
  if (!done.ok() || golden.failed() > 0) {
    return done.ok() ? Unavailable("a golden deck was not measured")
                     : Forward(done);
  }
  return delays;
}

Result<RelativeErrors> ErrorsOfLogs(const fs::path& folder,
                                    const std::vector<SampleDeck>& decks,
                                    const Delays& golden) {
  RelativeErrors errors;
  for (const SampleDeck& deck : decks) {
    const auto log = ReadLog(folder / (deck.name + ".log"));
    if (!log.ok()) {
      return Forward(log);
    }
    for (const char* name : {"delay_rise", "delay_fall"}) {
      const auto found = log->find(name);
      if (found == log->end()) {
        errors.AddMissing();
      } else {
        errors.Add(fmt::format("{} {}", deck.job.label, name),
                   found->second,
                   golden.at(deck.job.key).values_s.at(name));
      }
    }
  }
  return errors;
}

// Of what the program itself wrote.  REQUIRES: both edges share their decks.
Result<RelativeErrors> ErrorsOfRun(const fs::path& result,
                                   const std::vector<SampleDeck>& decks,
                                   const Delays& golden) {
  const Result<std::string> text = ReadFile(result);
  if (!text.ok()) {
    return Forward(text);
  }
  // Keys depend on the accuracy asked for, labels do not.
  std::map<std::string, std::string> keys;
  for (const SampleDeck& deck : decks) {
    keys[deck.job.label] = deck.job.key;
  }
  RelativeErrors errors;
  const auto json = nlohmann::json::parse(*text, nullptr, false);
  for (const nlohmann::json& row : json["comparisons"]) {
    const Result<Comparison> comparison = ComparisonFromJson(row);
    if (!comparison.ok()) {
      return Forward(comparison);
    }
    for (const Point& point : comparison->points) {
      errors.Add(fmt::format("{} {} h={}",
                             comparison->arc.cell,
                             DescribeArc(comparison->arc),
                             point.fanout),
                 point.delay_s,
                 DelayOf(golden.at(keys.at(fmt::format("{} {}->{} h={} {}",
                                                       comparison->arc.cell,
                                                       comparison->arc.pin,
                                                       comparison->arc.output,
                                                       point.fanout,
                                                       comparison->corner))),
                         comparison->arc.edge));
    }
  }
  return errors;
}

Contender Ours(const fs::path& folder, const std::string& what, int rounds) {
  return {"gatedyno run",
          [=] {
            return RunShell(
                FreshRun(folder, "ours", what + " " + FanoutOption()), {0, 1});
          },
          rounds};
}

Contender Batch(const std::string& name, const fs::path& folder, int rounds) {
  return {name, [=] { return RunFolder(folder, Threads::kOne); }, rounds};
}

Result<Spent> Export(const std::string& what, const fs::path& folder) {
  return RunShell(DeckCommand(folder, what + " " + FanoutOption()));
}

// The script with the simulator's own number of threads, on a few small decks.
Status PrintThreads(const fs::path& folder,
                    const std::vector<SampleDeck>& decks) {
  constexpr size_t kFew = 4;
  const std::vector<SampleDeck> few(decks.begin(), decks.begin() + kFew);
  const fs::path careful = folder / "threads_careful";
  const fs::path script = folder / "threads_script";
  const Status written = WriteDecks(few, careful, script);
  if (!written.ok()) {
    return written;
  }
  const Result<Spent> one = RunFolder(script, Threads::kOne);
  const Result<int> one_thread = ThreadsOf(script / few.back().name);
  const Result<Spent> two = RunFolder(script, Threads::kDefault);
  const Result<int> two_threads = ThreadsOf(script / few.back().name);
  if (!one.ok() || !one_thread.ok() || !two.ok() || !two_threads.ok()) {
    return Unavailable("the script's decks did not run");
  }
  Figure("threads of the simulator as told here", *one_thread);
  Figure("threads of the simulator by default", *two_threads);
  Figure("the script with them, times as long",
         two->wall_s / one->wall_s,
         fmt::format("{} decks, {:.2f} s", kFew, two->wall_s));
  return Ok();
}

Result<bool> JudgeErrors(const fs::path& folder,
                         const std::vector<SampleDeck>& decks,
                         const Delays& golden) {
  const auto ours = ErrorsOfRun(folder / "ours.json", decks, golden);
  const auto exact = ErrorsOfRun(folder / "exact.json", decks, golden);
  const auto script = ErrorsOfLogs(folder / "script", decks, golden);
  const auto careful = ErrorsOfLogs(folder / "careful", decks, golden);
  for (const auto* errors : {&ours, &exact, &script, &careful}) {
    if (!errors->ok()) {
      return Forward(*errors);
    }
  }
  fmt::print("  error of a delay: ours    {}\n", ours->Text());
  fmt::print("  error of a delay: exact   {}\n", exact->Text());
  fmt::print("  error of a delay: script  {}\n", script->Text());
  fmt::print("  error of a delay: careful {}\n", careful->Text());
  return AtMost("our largest error, %", 100.0 * ours->largest(), 0.2);
}

Result<bool> BenchSample(const fs::path& folder) {
  Result<WorkerPool> pool = WorkerPool::Make({});
  if (!pool.ok()) {
    return Forward(pool);
  }
  const Result<Scene> scene = MeasureScene(SamplePlan(), &*pool, &*pool);
  if (!scene.ok()) {
    return Forward(scene);
  }
  const std::vector<SampleDeck> decks = DecksOf(*scene);
  const Status written =
      WriteDecks(decks, folder / "careful", folder / "script");
  const Result<Delays> golden = GoldenDelays(decks, &*pool);
  const std::string what =
      fmt::format("{} --node p45", fmt::join(SamplePlan().cells, " "));
  const Result<Spent> exported = Export(what, folder / "exported");
  if (!written.ok() || !golden.ok() || !exported.ok()) {
    return !written.ok()  ? Forward(written)
           : !golden.ok() ? Forward(golden)
                          : Forward(exported);
  }
  std::vector<Contender> contenders = {
      Ours(folder, what, 5),
      Batch("script", folder / "script", 2),
      Batch("careful script, each deck once", folder / "careful", 5),
      Batch("careful script, decks as exported", folder / "exported", 3),
      {"gatedyno run --accuracy 0.0001",
       [&] {
         return RunShell(
             FreshRun(folder,
                      "exact",
                      what + " --accuracy 0.0001 " + FanoutOption()),
             {0, 1});
       },
       3}};
  if (const Status run = RunRounds(&contenders); !run.ok()) {
    return Forward(run);
  }
  const size_t delays = scene->Tests().size() * kFanouts.size();
  fmt::print("\nspeed: {} at p45, {} delays, {} decks\n",
             fmt::join(SamplePlan().cells, " "),
             delays,
             decks.size());
  PrintContenders(contenders, delays);
  const double ours_s = contenders[0].median_s();
  constexpr double kOverScript = 60.0;
  constexpr double kOverCareful = 3.0;
  bool good = AtLeast(
      "over the script", contenders[1].median_s() / ours_s, kOverScript);
  good &= AtLeast("over the careful script, decks as exported",
                  contenders[3].median_s() / ours_s,
                  kOverCareful);
  Figure("over the script, when as exact as can be asked for",
         contenders[1].median_s() / contenders[4].median_s());
  const Result<bool> errors = JudgeErrors(folder, decks, *golden);
  const Status threads = PrintThreads(folder, decks);
  if (!errors.ok() || !threads.ok()) {
    return errors.ok() ? Forward(threads) : Forward(errors);
  }
  return good && *errors;
}

// Where starting up no longer counts.
Result<bool> BenchLarge(const fs::path& folder) {
  Result<Plan> plan = LoadPlan(ArbiterPlan());
  Result<WorkerPool> pool = WorkerPool::Make({});
  if (!plan.ok() || !pool.ok()) {
    return plan.ok() ? Forward(pool) : Forward(plan);
  }
  plan->fanouts = kFanouts;
  const Result<Scene> scene = MeasureScene(*plan, &*pool, &*pool);
  if (!scene.ok()) {
    return Forward(scene);
  }
  const std::vector<SampleDeck> decks = DecksOf(*scene);
  const Status written = WriteDecks(decks, folder / "careful", {});
  const std::string what = Quoted(ArbiterPlan());
  const Result<Spent> exported = Export(what, folder / "exported");
  if (!written.ok() || !exported.ok()) {
    return written.ok() ? Forward(exported) : Forward(written);
  }
  std::vector<Contender> contenders = {
      Ours(folder, what, 2),
      Batch("careful script, each deck once", folder / "careful", 2),
      Batch("careful script, decks as exported", folder / "exported", 1)};
  if (const Status run = RunRounds(&contenders); !run.ok()) {
    return Forward(run);
  }
  const size_t delays = scene->Tests().size() * kFanouts.size();
  fmt::print("\nspeed: the arbiter's plan, {} delays, {} decks\n",
             delays,
             decks.size());
  PrintContenders(contenders, delays);
  constexpr double kOverCareful = 3.0;
  return AtLeast("over the careful script, decks as exported",
                 contenders[2].median_s() / contenders[0].median_s(),
                 kOverCareful);
}

}  // namespace

Result<bool> BenchSpeed(const fs::path& folder) {
  const Result<bool> sample = BenchSample(folder / "sample");
  if (!sample.ok()) {
    return Forward(sample);
  }
  const Result<bool> large = BenchLarge(folder / "large");
  if (!large.ok()) {
    return Forward(large);
  }
  return *sample && *large;
}

}  // namespace gatedyno
