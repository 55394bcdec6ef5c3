#include "harness/netlist/scope.h"

#include <cstddef>
#include <set>

#include <fmt/format.h>
#include <fmt/ranges.h>

namespace gatedyno {
namespace {

// A longer chain of parameters defined by parameters is a mistake; the limit
// bounds the recursion.
constexpr int kLongestChain = 200;
// More names would not help whoever mistyped one.
constexpr size_t kMostNamesListed = 12;

}  // namespace

void Scope::Define(const std::string& name, double value) {
  entries_.emplace(name, Entry{State::kKnown, value, nullptr});
}

void Scope::Define(const ParameterDefinition& definition) {
  entries_.emplace(definition.name,
                   Entry{State::kWaiting, 0.0, &definition.value});
}

Parsed<double> Scope::Find(const std::string& name, SourcePosition position) {
  for (Scope* scope = this; scope != nullptr; scope = scope->enclosing_) {
    const auto found = scope->entries_.find(name);
    if (found != scope->entries_.end()) {
      return scope->Settle(name, found->second, position);
    }
  }
  const std::vector<std::string> names = Names();
  if (names.empty() || names.size() > kMostNamesListed) {
    return Complain(position, fmt::format("unknown parameter {}", Quote(name)));
  }
  return Complain(position,
                  fmt::format("unknown parameter {}: known here are {}",
                              Quote(name),
                              fmt::join(names, ", ")));
}

Parsed<double> Scope::Settle(const std::string& name,
                             Entry& entry,
                             SourcePosition position) {
  if (entry.state == State::kKnown) {
    return entry.value;
  }
  if (entry.state == State::kBusy) {
    return Complain(
        position,
        fmt::format("parameter {} is defined by itself", Quote(name)));
  }
  if (depth_ == kLongestChain) {
    return Complain(position,
                    fmt::format("a chain of more than {} parameters defined "
                                "by parameters",
                                kLongestChain));
  }
  ++depth_;
  entry.state = State::kBusy;
  Parsed<double> value = Evaluate(entry.definition->expression, *this);
  --depth_;
  if (value.ok()) {
    entry.state = State::kKnown;
    entry.value = *value;
  }
  return value;
}

ParseStatus Scope::CheckAll() {
  for (auto& [name, entry] : entries_) {
    const SourcePosition position = entry.definition == nullptr
                                        ? SourcePosition{}
                                        : entry.definition->position;
    if (const Parsed<double> value = Settle(name, entry, position);
        !value.ok()) {
      return Forward(value);
    }
  }
  return std::monostate{};
}

std::vector<std::string> Scope::Names() const {
  std::set<std::string> names;
  for (const Scope* scope = this; scope != nullptr; scope = scope->enclosing_) {
    for (const auto& [name, entry] : scope->entries_) {
      names.insert(name);
    }
  }
  return {names.begin(), names.end()};
}

}  // namespace gatedyno
