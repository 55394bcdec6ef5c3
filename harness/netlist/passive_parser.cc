#include "harness/netlist/passive_parser.h"

#include <cstddef>
#include <string>
#include <string_view>
#include <utility>

#include <fmt/format.h>

#include "harness/base/text.h"
#include "harness/netlist/line_head.h"
#include "harness/netlist/value_parser.h"

namespace gatedyno {
namespace {

// The name and two nets; the value may follow them or be an assignment.
constexpr size_t kWordsBeforeValue = 3;

const Assignment* Find(const Fields& fields, std::string_view name) {
  for (const Assignment& assignment : fields.assignments) {
    if (assignment.name == name) {
      return &assignment;
    }
  }
  return nullptr;
}

ParseStatus CheckParameters(const Fields& fields, std::string_view own) {
  for (const Assignment& assignment : fields.assignments) {
    if (assignment.name != own && assignment.name != "m") {
      return Complain(assignment.position,
                      fmt::format("unknown parameter {} of {}: known are {}, m",
                                  Quote(assignment.name),
                                  Quote(fields.words[0].text),
                                  own));
    }
  }
  return std::monostate{};
}

ParseStatus CheckWords(const Fields& fields) {
  if (ParseStatus refused = RefuseParamsKeyword(fields); !refused.ok()) {
    return refused;
  }
  if (fields.words.size() < kWordsBeforeValue) {
    return Complain(fields.words[0].position,
                    fmt::format("expected two nets and a value after {}",
                                Quote(fields.words[0].text)));
  }
  return RefuseMoreWords(fields, kWordsBeforeValue + 1, "value");
}

// `own` is the parameter that may hold the value: r or c.
Parsed<Value> ParseOwnValue(const LogicalLine& line,
                            const Fields& fields,
                            std::string_view own,
                            std::string_view role) {
  const Assignment* assigned = Find(fields, own);
  if (fields.words.size() == kWordsBeforeValue) {
    if (assigned != nullptr) {
      return ParseValue(line, *assigned, role);
    }
    return Complain(
        fields.words[0].position,
        fmt::format("expected {} after {}", role, Quote(fields.words[0].text)));
  }
  if (assigned != nullptr) {
    return Complain(assigned->position,
                    fmt::format("a second value: the first is {}",
                                Quote(fields.words.back().text)));
  }
  return ParseValue(line, fields.words.back(), role);
}

}  // namespace

Parsed<CellLine> ParsePassive(const LogicalLine& line, const Fields& fields) {
  PassiveLine passive;
  passive.is_capacitor =
      EqualsIgnoringCase(fields.words[0].text.substr(0, 1), "c");
  const std::string_view own = passive.is_capacitor ? "c" : "r";
  if (const ParseStatus words = CheckWords(fields); !words.ok()) {
    return Forward(words);
  }
  if (const ParseStatus known = CheckParameters(fields, own); !known.ok()) {
    return Forward(known);
  }
  Parsed<LineHead> head = ParseHead(fields, 2);
  if (!head.ok()) {
    return Forward(head);
  }
  passive.head = *std::move(head);
  Parsed<Value> value =
      ParseOwnValue(line,
                    fields,
                    own,
                    passive.is_capacitor ? "a capacitance in farads"
                                         : "a resistance in ohms");
  if (!value.ok()) {
    return Forward(value);
  }
  passive.value = *std::move(value);
  if (const Assignment* assigned = Find(fields, "m")) {
    Parsed<Value> multiplicity = ParseValue(line, *assigned, "a multiplicity");
    if (!multiplicity.ok()) {
      return Forward(multiplicity);
    }
    passive.multiplicity = *std::move(multiplicity);
  }
  return CellLine(std::move(passive));
}

}  // namespace gatedyno
