// A plan of a hundred thousand jobs, answered by a formula instead of a
// simulator: what the program itself takes.
//
//   bench_size FOLDER    prints the figures, and fails where one is missed
//
// The plan is run to the half, dropped, and gone on with by a new process.

#include <chrono>
#include <cstdlib>
#include <filesystem>
#include <fstream>
#include <functional>
#include <optional>
#include <string>
#include <string_view>
#include <utility>

#include <fmt/format.h>
#include <sys/wait.h>
#include <unistd.h>

#include "harness/flow/characterize.h"
#include "harness/record/comparison_json.h"
#include "harness/record/run_result_json.h"
#include "harness/store/store.h"
#include "tests/bench/target.h"

namespace gatedyno {
namespace {

using Clock = std::chrono::steady_clock;

double SecondsSince(Clock::time_point start) {
  return std::chrono::duration<double>(Clock::now() - start).count();
}

// A straight line, so that arcs need few points and none is beyond.
Outcome Answer(const Job& job) {
  const size_t at = job.label.find(" h=");
  const double fanout = std::strtod(job.label.c_str() + at + 3, nullptr);
  const double delay_s = 2e-12 * (1.2 + fanout);
  Outcome outcome;
  outcome.ending = Ending::kMeasured;
  for (const char* edge : {"rise", "fall"}) {
    outcome.values_s[fmt::format("delay_{}", edge)] = delay_s;
    outcome.values_s[fmt::format("input_{}", edge)] = 5e-12;
    outcome.values_s[fmt::format("output_{}", edge)] = delay_s;
  }
  return outcome;
}

class FormulaRunner : public SimRunner {
 public:
  explicit FormulaRunner(Clock::time_point start) : start_(start) {}

  Status Run(JobSource& jobs, const OnOutcome& on_outcome) override {
    while (const std::optional<Job> job = jobs.Next()) {
      if (!first_job_s_) {
        first_job_s_ = SecondsSince(start_);
      }
      const Outcome outcome = Answer(*job);
      const Clock::time_point before = Clock::now();
      if (Status kept = on_outcome(*job, outcome); !kept.ok()) {
        return kept;
      }
      storing_s_ += SecondsSince(before);
      ++ended_;
    }
    return Ok();
  }

  double first_job_s() const { return first_job_s_.value_or(0.0); }
  double storing_s() const { return storing_s_; }
  int ended() const { return ended_; }

 private:
  Clock::time_point start_;
  std::optional<double> first_job_s_;
  double storing_s_ = 0.0;
  int ended_ = 0;
};

// All cells, side vectors and corners of a built-in node.
Plan LargePlan() {
  Plan plan;
  plan.title = "a hundred thousand jobs";
  plan.node = "p45";
  plan.cells = {"*"};
  plan.corners = {"*"};
  plan.all_side_vectors = true;
  plan.fanouts = {1, 1.5, 2, 2.5, 3, 3.5, 4, 5, 6, 7, 8};
  return plan;
}

// "VmHWM:    12345 kB", the most that was ever in memory.
double PeakMegabytes() {
  std::ifstream status("/proc/self/status");
  for (std::string line; std::getline(status, line);) {
    if (line.starts_with("VmHWM:")) {
      return std::strtod(line.c_str() + std::string_view("VmHWM:").size(),
                         nullptr) /
             1024.0;
    }
  }
  return 0.0;
}

Status KeepResults(Store* store, RunId run, const RunResult& result) {
  size_t next = 0;
  return store->FinishRun(
      run, RunHeadToJson(result).dump(), [&]() -> std::optional<std::string> {
        if (next == result.comparisons.size()) {
          return std::nullopt;
        }
        return ComparisonToJson(result.comparisons[next++]).dump();
      });
}

// Runs the plan until `stop_after` jobs have ended.
int RunPart(const std::filesystem::path& folder,
            std::string_view name,
            int stop_after) {
  const Clock::time_point start = Clock::now();
  const Result<PreparedRun> run = PrepareRun(LargePlan());
  Result<Store> store = Store::Open(folder / "large.db");
  if (!run.ok() || !store.ok()) {
    fmt::print("{}\n", run.ok() ? store.error().message : run.error().message);
    return EXIT_FAILURE;
  }
  FormulaRunner runner(start);
  WorkDesk desk(&runner, &*store, {.should_stop = [&] {
    return runner.ended() >= stop_after;
  }});
  const Result<std::vector<RunRecord>> runs = store->Runs();
  const bool goes_on = runs.ok() && !runs->empty();
  const Result<RunId> id = goes_on ? runs->back().id : store->BeginRun({});
  const auto arcs_before =
      goes_on ? static_cast<size_t>(runs->back().progress->arcs_ended) : 0;
  const Result<RunResult> result =
      Characterize(*run, "formula", &desk, arcs_before);
  bool good =
      id.ok() && (result.ok() ? KeepResults(&*store, *id, *result)
                              : store->NoteProgress(*id, desk.progress()))
                     .ok();
  fmt::print(
      "{}: {} jobs asked for, {} taken from the store, {} answered; "
      "{:.1f} s\n",
      name,
      desk.progress().jobs.wanted,
      desk.progress().jobs.reused,
      runner.ended(),
      SecondsSince(start));
  constexpr double kLongestWait_s = 3.0;
  constexpr double kLeastRate = 5000.0;
  constexpr double kMostMegabytes = 300.0;
  good &= AtMost("first job after, s", runner.first_job_s(), kLongestWait_s);
  good &= AtLeast("outcomes stored a second",
                  runner.ended() / runner.storing_s(),
                  kLeastRate);
  good &= AtMost("peak memory, MB", PeakMegabytes(), kMostMegabytes);
  return good ? EXIT_SUCCESS : EXIT_FAILURE;
}

// In a process of its own, whose memory is its own.
int InChild(const std::function<int()>& work) {
  std::fflush(stdout);
  const pid_t child = ::fork();
  if (child == 0) {
    const int code = work();
    std::fflush(stdout);
    ::_exit(code);
  }
  int status = 0;
  ::waitpid(child, &status, 0);
  return WIFEXITED(status) ? WEXITSTATUS(status) : EXIT_FAILURE;
}

int Main(const std::filesystem::path& folder) {
  constexpr int kHalf = 50'000;
  constexpr int kAll = 1'000'000;
  const int first =
      InChild([&] { return RunPart(folder, "first half", kHalf); });
  const int second =
      InChild([&] { return RunPart(folder, "gone on with", kAll); });
  return first == EXIT_SUCCESS ? second : first;
}

}  // namespace
}  // namespace gatedyno

int main(int argc, char** argv) {
  if (argc != 2) {
    fmt::print(stderr, "usage: bench_size FOLDER\n");
    return EXIT_FAILURE;
  }
  return gatedyno::Main(argv[1]);
}
