#include "harness/netlist/parser.h"

#include <array>
#include <cstddef>
#include <optional>
#include <set>
#include <string>
#include <string_view>
#include <utility>

#include <fmt/format.h>

#include "harness/base/text.h"
#include "harness/netlist/fields.h"
#include "harness/netlist/instance_parser.h"
#include "harness/netlist/known_devices.h"
#include "harness/netlist/logical_line.h"
#include "harness/netlist/mosfet_parser.h"
#include "harness/netlist/name.h"
#include "harness/netlist/netlist_draft.h"
#include "harness/netlist/passive_parser.h"
#include "harness/netlist/refused_lines.h"
#include "harness/netlist/value_parser.h"

namespace gatedyno {
namespace {

// .param and .option: assignments and no words.
ParseStatus CheckOnlyAssignments(const Fields& fields) {
  if (fields.words.size() > 1) {
    return Complain(fields.words[1].position,
                    fmt::format("expected name=value, got {}",
                                Quote(fields.words[1].text)));
  }
  if (fields.params_keyword || fields.assignments.empty()) {
    return Complain(fields.words[0].position,
                    fmt::format("expected name=value after {}",
                                ToLower(fields.words[0].text)));
  }
  return std::monostate{};
}

Parsed<std::vector<std::string>> ParsePins(const Fields& fields) {
  std::vector<std::string> pins;
  std::set<std::string> taken;
  for (size_t i = 2; i < fields.words.size(); ++i) {
    Parsed<std::string> pin = ParseName(fields.words[i], "a pin");
    if (!pin.ok()) {
      return Forward(pin);
    }
    if (!taken.insert(ToLower(*pin)).second) {
      return Complain(fields.words[i].position,
                      fmt::format("pin {} is given twice", Quote(*pin)));
    }
    pins.push_back(*std::move(pin));
  }
  return pins;
}

class Parser {
 public:
  explicit Parser(const ReaderOptions& options) : options_(options) {}

  Parsed<Netlist> Run(const SourceText& source) {
    LogicalLineReader reader(source);
    while (true) {
      const Parsed<std::optional<LogicalLine>> line = reader.Next();
      if (!line.ok()) {
        return Forward(line);
      }
      if (!line->has_value()) {
        return draft_.Finish();
      }
      if (const ParseStatus parsed = ParseLine(**line); !parsed.ok()) {
        return Forward(parsed);
      }
    }
  }

 private:
  using ParseFunction = ParseStatus (Parser::*)(const LogicalLine&,
                                                const Fields&);

  // Null for a word that starts no line of a cell file.
  static ParseFunction KindOf(std::string_view word) {
    struct LineKind {
      std::string_view word;
      ParseFunction parse;
    };
    constexpr std::array<LineKind, 6> kLineKinds = {
        {{".subckt", &Parser::ParseSubckt},
         {".ends", &Parser::ParseEnds},
         {".param", &Parser::ParseParam},
         {".option", &Parser::ParseOption},
         {".options", &Parser::ParseOption},
         {".end", &Parser::ParseEnd}}};
    for (const LineKind& kind : kLineKinds) {
      if (kind.word == word) {
        return kind.parse;
      }
    }
    const bool is_device =
        std::string_view("mxrc").find(word[0]) != std::string_view::npos;
    return is_device ? &Parser::ParseDevice : nullptr;
  }

  // Only picks the parse function.
  ParseStatus ParseLine(const LogicalLine& line) {
    const size_t first = line.text.find_first_not_of(" \t");
    const size_t end = line.text.find_first_of(" \t=", first + 1);
    const std::string word = ToLower(line.text.substr(first, end - first));
    if (after_end_) {
      return Complain(line.PositionOf(first),
                      "text after .end: remove it or make it a comment");
    }
    if (word[0] != '.' && !draft_.is_open()) {
      return Complain(line.PositionOf(first),
                      "expected .subckt: make a title line a comment with '*'; "
                      "devices belong inside a .subckt");
    }
    const ParseFunction parse = KindOf(word);
    if (parse == nullptr) {
      return Complain(line.PositionOf(first), WhyRefused(word));
    }
    const Parsed<Fields> fields = SplitFields(line);
    if (!fields.ok()) {
      return Forward(fields);
    }
    if (fields->words.empty()) {
      return Complain(line.PositionOf(first),
                      fmt::format("unexpected '=' after {}", Quote(word)));
    }
    return (this->*parse)(line, *fields);
  }

  ParseStatus ParseSubckt(const LogicalLine& line, const Fields& fields) {
    Subckt subckt;
    subckt.position = fields.words[0].position;
    if (fields.words.size() < 2) {
      return Complain(subckt.position, "expected a name after .subckt");
    }
    subckt.name_position = fields.words[1].position;
    Parsed<std::string> name = ParseName(fields.words[1], "a subcircuit name");
    if (!name.ok()) {
      return Forward(name);
    }
    if (FindDevice(options_, *name, true) != nullptr) {
      return Complain(subckt.name_position,
                      fmt::format("{} is a device of this node: a cell file "
                                  "does not define it",
                                  Quote(*name)));
    }
    Parsed<std::vector<std::string>> pins = ParsePins(fields);
    if (!pins.ok()) {
      return Forward(pins);
    }
    auto header = ParseParameters(line, fields.assignments);
    if (!header.ok()) {
      return Forward(header);
    }
    subckt.name = *std::move(name);
    subckt.pins = *std::move(pins);
    subckt.header = *std::move(header);
    return draft_.Open(std::move(subckt));
  }

  ParseStatus ParseEnds(const LogicalLine& /*line*/, const Fields& fields) {
    if (fields.words.size() > 2 || !fields.assignments.empty()) {
      return Complain(fields.words[0].position, "only a name may follow .ends");
    }
    const bool is_named = fields.words.size() == 2;
    return draft_.Close(is_named ? fields.words[1].text : "",
                        fields.words.back().position);
  }

  ParseStatus ParseParam(const LogicalLine& line, const Fields& fields) {
    if (ParseStatus checked = CheckOnlyAssignments(fields); !checked.ok()) {
      return checked;
    }
    auto parameters = ParseParameters(line, fields.assignments);
    if (!parameters.ok()) {
      return Forward(parameters);
    }
    return draft_.AddParameters(*std::move(parameters));
  }

  ParseStatus ParseOption(const LogicalLine& line, const Fields& fields) {
    if (ParseStatus checked = CheckOnlyAssignments(fields); !checked.ok()) {
      return checked;
    }
    const Assignment& first = fields.assignments.front();
    if (first.name != "scale" || fields.assignments.size() > 1) {
      const Assignment& wrong =
          first.name != "scale" ? first : fields.assignments[1];
      return Complain(wrong.position,
                      fmt::format("unknown option {}: a cell file sets scale "
                                  "and no other",
                                  Quote(wrong.name)));
    }
    ParseStatus outside =
        draft_.RequireClosed(fields.words[0].position, ".option");
    if (!outside.ok()) {
      return outside;
    }
    Parsed<Value> scale = ParseValue(line, first, "a number of metres");
    if (!scale.ok()) {
      return Forward(scale);
    }
    return draft_.SetScale(*std::move(scale));
  }

  ParseStatus ParseEnd(const LogicalLine& /*line*/, const Fields& fields) {
    const SourcePosition position = fields.words[0].position;
    if (fields.words.size() > 1 || !fields.assignments.empty()) {
      return Complain(position, "nothing may follow .end");
    }
    after_end_ = true;
    return draft_.RequireClosed(position, ".end");
  }

  ParseStatus ParseDevice(const LogicalLine& line, const Fields& fields) {
    const std::string letter = ToLower(fields.words[0].text.substr(0, 1));
    Parsed<CellLine> device =
        letter == "m"   ? ParseMosfet(line, fields, options_)
        : letter == "x" ? ParseInstance(line, fields, options_)
                        : ParsePassive(line, fields);
    if (!device.ok()) {
      return Forward(device);
    }
    return draft_.AddLine(*std::move(device));
  }

  const ReaderOptions& options_;
  NetlistDraft draft_;
  bool after_end_ = false;
};

}  // namespace

Parsed<Netlist> ParseNetlist(const SourceText& source,
                             const ReaderOptions& options) {
  return Parser(options).Run(source);
}

}  // namespace gatedyno
