#include "tests/bench/program.h"

#include <fmt/format.h>

#include "harness/base/install.h"
#include "tests/bench/shell.h"

namespace gatedyno {
namespace {

std::string Program() {
  return Quoted(ProgramFolder() / "gatedyno");
}

}  // namespace

std::string FreshRun(const std::filesystem::path& folder,
                     const std::string& name,
                     const std::string& arguments) {
  return fmt::format(
      "mkdir -p {0} && cd {0} && rm -f {1}.db* && {2} run {3} --store {1}.db "
      "--json {1}.json >{1}.txt 2>{1}.log",
      Quoted(folder),
      name,
      Program(),
      arguments);
}

std::string DeckCommand(const std::filesystem::path& folder,
                        const std::string& arguments) {
  return fmt::format(
      "{} deck {} -o {} >/dev/null", Program(), arguments, Quoted(folder));
}

std::filesystem::path ArbiterPlan() {
  return DecksFolder() / "plans/arbiter.json";
}

}  // namespace gatedyno
