// What gatedyno takes and how exact it is, against what a designer would
// otherwise script (README.md).
//
//   bench_run FOLDER [speed] [accuracy] [processors]
//
// All parts where none is named.  Fails where a target is missed.

#include <cstdlib>
#include <filesystem>
#include <functional>
#include <map>
#include <string>
#include <vector>

#include <fmt/format.h>

#include "tests/bench/parts.h"

namespace gatedyno {
namespace {

using Part = std::function<Result<bool>(const std::filesystem::path& folder)>;

const std::map<std::string, Part>& Parts() {
  static const auto& parts = *new std::map<std::string, Part>{
      {"speed", BenchSpeed},
      {"accuracy", [](const auto&) { return BenchAccuracy(); }},
      {"processors", BenchProcessors}};
  return parts;
}

int Main(const std::filesystem::path& folder, std::vector<std::string> names) {
  if (names.empty()) {
    names = {"processors", "speed", "accuracy"};
  }
  bool good = true;
  for (const std::string& name : names) {
    const auto part = Parts().find(name);
    if (part == Parts().end()) {
      fmt::print(stderr, "bench_run: no part '{}'\n", name);
      return EXIT_FAILURE;
    }
    const Result<bool> met = part->second(folder);
    if (!met.ok()) {
      fmt::print(stderr, "bench_run: {}: {}\n", name, met.error().message);
      return EXIT_FAILURE;
    }
    good &= *met;
  }
  return good ? EXIT_SUCCESS : EXIT_FAILURE;
}

}  // namespace
}  // namespace gatedyno

int main(int argc, char** argv) {
  const std::vector<std::string> arguments(argv + 1, argv + argc);
  if (arguments.empty()) {
    fmt::print(stderr,
               "usage: bench_run FOLDER [speed] [accuracy] [processors]\n");
    return EXIT_FAILURE;
  }
  return gatedyno::Main(std::filesystem::absolute(arguments.front()),
                        {arguments.begin() + 1, arguments.end()});
}
