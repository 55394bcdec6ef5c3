#include "harness/deck/deck_head.h"

#include <fmt/format.h>

#include "harness/deck/deck_text.h"

namespace gatedyno {

std::string DeckHead(const Bench& bench) {
  const Corner& corner = bench.corner;
  std::string text =
      fmt::format("* node {}, corner {}: {} process, {} V, {} C\n",
                  DeckRemark(bench.node->name),
                  DeckRemark(corner.name),
                  DeckRemark(corner.process),
                  corner.supply_v,
                  corner.temperature_c);
  if (bench.node->option_scale_m) {
    text += fmt::format(".option scale={}\n", *bench.node->option_scale_m);
  }
  text += fmt::format(".temp {}\n", corner.temperature_c);
  for (const auto& [name, value] : ProcessOf(*bench.node, corner).parameters) {
    text += fmt::format(".param {}={}\n", name, DeckNumber(value));
  }
  text += fmt::format("vpwr {} 0 {}\n", kPowerNet, corner.supply_v);
  return text;
}

std::string ModelLines(const Bench& bench) {
  std::string text;
  for (const ModelFile& model : ProcessOf(*bench.node, bench.corner).models) {
    text += model.section.empty()
                ? fmt::format(".include \"{}\"\n", model.path.string())
                : fmt::format(
                      ".lib \"{}\" {}\n", model.path.string(), model.section);
  }
  return text;
}

}  // namespace gatedyno
