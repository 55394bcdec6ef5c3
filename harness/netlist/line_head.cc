#include "harness/netlist/line_head.h"

#include <string>
#include <utility>

#include <fmt/format.h>

#include "harness/netlist/name.h"

namespace gatedyno {

Parsed<LineHead> ParseHead(const Fields& fields, size_t net_count) {
  LineHead head;
  head.position = fields.words[0].position;
  Parsed<std::string> name = ParseName(fields.words[0], "a device name");
  if (!name.ok()) {
    return Forward(name);
  }
  head.name = *std::move(name);
  for (size_t i = 1; i <= net_count; ++i) {
    Parsed<std::string> net = ParseName(fields.words[i], "a net");
    if (!net.ok()) {
      return Forward(net);
    }
    head.nets.push_back(*std::move(net));
  }
  return head;
}

ParseStatus RefuseParamsKeyword(const Fields& fields) {
  if (fields.params_keyword) {
    return Complain(*fields.params_keyword,
                    "'params:' belongs on .subckt and X lines");
  }
  return std::monostate{};
}

ParseStatus RefuseMoreWords(const Fields& fields,
                            size_t most,
                            std::string_view after) {
  if (fields.words.size() > most) {
    return Complain(fields.words[most].position,
                    fmt::format("expected name=value after the {}, got {}",
                                after,
                                Quote(fields.words[most].text)));
  }
  return std::monostate{};
}

}  // namespace gatedyno
