#include "harness/netlist/netlist_draft.h"

#include <utility>
#include <variant>

#include <fmt/format.h>

#include "harness/base/text.h"

namespace gatedyno {

ParseStatus NetlistDraft::Take(NamesTaken& taken,
                               const std::string& name,
                               SourcePosition position) {
  const auto [first, is_new] = taken.emplace(ToLower(name), position.line);
  if (!is_new) {
    return Complain(
        position,
        fmt::format(
            "{} is already defined in line {}", Quote(name), first->second));
  }
  return std::monostate{};
}

ParseStatus NetlistDraft::Open(Subckt subckt) {
  ParseStatus done = RequireClosed(subckt.position, ".subckt");
  if (done.ok()) {
    done = Take(subckts_, subckt.name, subckt.name_position);
  }
  locals_.clear();
  devices_.clear();
  for (const ParameterDefinition& parameter : subckt.header) {
    if (done.ok()) {
      done = Take(locals_, parameter.name, parameter.value.position);
    }
  }
  if (done.ok()) {
    open_ = std::move(subckt);
  }
  return done;
}

ParseStatus NetlistDraft::Close(std::string_view name,
                                SourcePosition position) {
  if (!open_) {
    return Complain(position, ".ends without .subckt");
  }
  if (!name.empty() && !EqualsIgnoringCase(name, open_->name)) {
    return Complain(
        position,
        fmt::format("expected .ends {}, got {}", open_->name, Quote(name)));
  }
  netlist_.index.emplace(ToLower(open_->name), netlist_.subckts.size());
  netlist_.subckts.push_back(*std::move(open_));
  open_.reset();
  return std::monostate{};
}

ParseStatus NetlistDraft::AddParameters(
    std::vector<ParameterDefinition> parameters) {
  NamesTaken& taken = open_ ? locals_ : globals_;
  std::vector<ParameterDefinition>& list =
      open_ ? open_->locals : netlist_.globals;
  for (ParameterDefinition& parameter : parameters) {
    ParseStatus is_free = Take(taken, parameter.name, parameter.value.position);
    if (!is_free.ok()) {
      return is_free;
    }
    list.push_back(std::move(parameter));
  }
  return std::monostate{};
}

ParseStatus NetlistDraft::AddLine(CellLine line) {
  const LineHead& head = std::visit(
      [](const auto& one) -> const LineHead& { return one.head; }, line);
  if (ParseStatus is_free = Take(devices_, head.name, head.position);
      !is_free.ok()) {
    return is_free;
  }
  open_->lines.push_back(std::move(line));
  return std::monostate{};
}

ParseStatus NetlistDraft::SetScale(Value scale) {
  if (netlist_.scale) {
    return Complain(scale.position,
                    fmt::format("a second scale: line {} sets one",
                                netlist_.scale->position.line));
  }
  netlist_.scale = std::move(scale);
  return std::monostate{};
}

ParseStatus NetlistDraft::RequireClosed(SourcePosition position,
                                        std::string_view what) const {
  if (open_) {
    return Complain(position,
                    fmt::format("{} inside .subckt {} of line {}: is its .ends "
                                "missing?",
                                what,
                                Quote(open_->name),
                                open_->position.line));
  }
  return std::monostate{};
}

Parsed<Netlist> NetlistDraft::Finish() {
  if (open_) {
    return Complain(open_->position,
                    fmt::format("no .ends for .subckt {}", Quote(open_->name)));
  }
  if (netlist_.subckts.empty()) {
    return Complain({}, "no .subckt: a cell file holds one cell or more");
  }
  return std::move(netlist_);
}

}  // namespace gatedyno
