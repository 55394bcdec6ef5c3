#include "tests/bench/batch.h"

#include <cstdlib>
#include <sstream>
#include <thread>

#include <fmt/format.h>

#include "harness/base/file.h"

namespace gatedyno {
namespace {

// What xargs ends with; the logs tell which.
constexpr int kSomeFailed = 123;

}  // namespace

Result<Spent> RunFolder(const std::filesystem::path& folder, Threads threads) {
  const Status written =
      WriteFile(folder / ".spiceinit",
                threads == Threads::kOne ? "set num_threads=1\n" : "* none\n");
  if (!written.ok()) {
    return Forward(written);
  }
  return RunShell(
      fmt::format("cd {} && printf '%s\\n' *.sp | "
                  "xargs -P{} -I@ ngspice -b -o @.log @ >/dev/null 2>&1",
                  Quoted(folder),
                  std::thread::hardware_concurrency()),
      {0, kSomeFailed});
}

Result<int> ThreadsOf(const std::filesystem::path& deck) {
  const std::filesystem::path folder = deck.parent_path();
  const Result<Spent> run =
      RunShell(fmt::format("cd {} && {{ ngspice -b -o one.log {} >one.out "
                           "2>&1 & }} && sleep 0.1 && "
                           "{{ ps -o nlwp= -p $! || echo 0; }} >threads; wait",
                           Quoted(folder),
                           Quoted(deck.filename())));
  if (!run.ok()) {
    return Forward(run);
  }
  const Result<std::string> count = ReadFile(folder / "threads");
  if (!count.ok()) {
    return Forward(count);
  }
  return std::atoi(count->c_str());
}

Result<std::map<std::string, double>> ReadLog(
    const std::filesystem::path& log) {
  const Result<std::string> text = ReadFile(log);
  if (!text.ok()) {
    return Forward(text);
  }
  std::map<std::string, double> values;
  std::istringstream lines(*text);
  for (std::string line; std::getline(lines, line);) {
    std::istringstream words(line);
    std::string name;
    std::string equals;
    double value = 0.0;
    if (words >> name >> equals >> value && equals == "=") {
      values[name] = value;
    }
  }
  return values;
}

}  // namespace gatedyno
