#include "harness/netlist/refused_lines.h"

#include <array>

#include <fmt/format.h>

#include "harness/base/text.h"
#include "harness/netlist/parse_error.h"

namespace gatedyno {
namespace {

struct Refusal {
  std::string_view word;
  std::string_view reason;
};

constexpr std::string_view kModels =
    "device models belong to the node, not to a cell";
constexpr std::string_view kFiles =
    "a cell file is read on its own: put the .subckt in it";
constexpr std::string_view kCommands = "cell files hold no simulator commands";
constexpr std::string_view kConditions =
    "cell files hold no conditional lines: write the cell out";

constexpr std::array<Refusal, 24> kRefusals = {{
    {".control", kCommands},
    {".endc", kCommands},
    {".exec", kCommands},
    {".tran", kCommands},
    {".ac", kCommands},
    {".dc", kCommands},
    {".op", kCommands},
    {".meas", kCommands},
    {".measure", kCommands},
    {".print", kCommands},
    {".plot", kCommands},
    {".probe", kCommands},
    {".save", kCommands},
    {".ic", kCommands},
    {".nodeset", kCommands},
    {".temp", "the temperature belongs to the corner, not to a cell"},
    {".model", kModels},
    {".lib", kModels},
    {".endl", kModels},
    {".include", kFiles},
    {".inc", kFiles},
    {".global",
     "a cell reaches its supplies through pins: add them to .subckt"},
    {".if", kConditions},
    {".func", "cell files define no functions: write the expression out"},
}};

}  // namespace

std::string WhyRefused(std::string_view word) {
  const std::string lower = ToLower(word);
  for (const Refusal& refusal : kRefusals) {
    if (lower == refusal.word) {
      return fmt::format("{} is refused: {}", lower, refusal.reason);
    }
  }
  if (word.starts_with('.')) {
    return fmt::format(
        "unknown line {}: a cell file holds .subckt, .ends, "
        ".param, .option scale and .end",
        Quote(word));
  }
  return fmt::format(
      "unknown kind of device {}: a cell holds M, X, R and C "
      "lines",
      Quote(word));
}

}  // namespace gatedyno
