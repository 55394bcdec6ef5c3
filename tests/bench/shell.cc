#include "tests/bench/shell.h"

#include <algorithm>
#include <chrono>
#include <cstdio>
#include <cstdlib>

#include <fmt/format.h>
#include <sys/resource.h>
#include <sys/wait.h>

namespace gatedyno {
namespace {

double Seconds(const timeval& time) {
  constexpr double kMicro = 1e-6;
  return static_cast<double>(time.tv_sec) +
         kMicro * static_cast<double>(time.tv_usec);
}

}  // namespace

double ChildrenProcessorTime() {
  rusage usage{};
  ::getrusage(RUSAGE_CHILDREN, &usage);
  return Seconds(usage.ru_utime) + Seconds(usage.ru_stime);
}

Result<Spent> RunShell(const std::string& command,
                       const std::vector<int>& good_codes) {
  std::fflush(stdout);
  const double processor_before_s = ChildrenProcessorTime();
  const auto start = std::chrono::steady_clock::now();
  const int status = std::system(command.c_str());
  const std::chrono::duration<double> wall =
      std::chrono::steady_clock::now() - start;
  const int code = WIFEXITED(status) ? WEXITSTATUS(status) : -1;
  if (std::find(good_codes.begin(), good_codes.end(), code) ==
      good_codes.end()) {
    return Unavailable(fmt::format("{}: exit code {}", command, code));
  }
  return Spent{.wall_s = wall.count(),
               .processor_s = ChildrenProcessorTime() - processor_before_s};
}

std::string Quoted(const std::filesystem::path& path) {
  return fmt::format("'{}'", path.string());
}

}  // namespace gatedyno
