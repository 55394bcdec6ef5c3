#include "harness/record/agreement_json.h"

#include <stdexcept>
#include <string>

#include <fmt/format.h>

namespace gatedyno {
namespace {

using nlohmann::json;

constexpr const char* kAll = "*";

json PatternToJson(const ArcPattern& pattern) {
  json out = json::object();
  const auto add = [&out](const char* field, const std::string& name) {
    if (name != kAll) {
      out[field] = name;
    }
  };
  add("cells", pattern.cells);
  add("pins", pattern.pins);
  add("outputs", pattern.outputs);
  add("corners", pattern.corners);
  if (pattern.edge) {
    out["edge"] = EdgeName(*pattern.edge);
  }
  return out;
}

// The value of that name; none when the field is not there.
template <class Enum, class Name>
std::optional<Enum> ReadNamed(const json& from,
                              const char* field,
                              std::initializer_list<Enum> values,
                              const Name& name) {
  if (!from.contains(field)) {
    return std::nullopt;
  }
  const std::string word = from.at(field).get<std::string>();
  for (const Enum value : values) {
    if (word == name(value)) {
      return value;
    }
  }
  throw std::runtime_error(fmt::format("unknown {} '{}'", field, word));
}

ArcPattern ReadPattern(const json& from) {
  return {
      .cells = from.value("cells", kAll),
      .pins = from.value("pins", kAll),
      .outputs = from.value("outputs", kAll),
      .corners = from.value("corners", kAll),
      .edge = ReadNamed(from, "edge", {Edge::kRise, Edge::kFall}, EdgeName)};
}

std::optional<double> ReadOptional(const json& from, const char* field) {
  return from.contains(field)
             ? std::optional<double>(from.at(field).get<double>())
             : std::nullopt;
}

}  // namespace

json ToleranceRulesToJson(const std::vector<ToleranceRule>& rules) {
  json list = json::array();
  for (const ToleranceRule& rule : rules) {
    json out = PatternToJson(rule.where);
    if (rule.effort) {
      out["effort"] = *rule.effort;
    }
    if (rule.parasitic) {
      out["parasitic"] = *rule.parasitic;
    }
    list.push_back(std::move(out));
  }
  return list;
}

json ExemptionsToJson(const std::vector<Exemption>& exemptions) {
  json list = json::array();
  for (const Exemption& exemption : exemptions) {
    json out = PatternToJson(exemption.where);
    if (exemption.quantity) {
      out["quantity"] = QuantityName(*exemption.quantity);
    }
    out["reason"] = exemption.reason;
    out["author"] = exemption.author;
    out["expires"] = exemption.expires;
    list.push_back(std::move(out));
  }
  return list;
}

std::vector<ToleranceRule> ReadToleranceRules(const json& list) {
  std::vector<ToleranceRule> rules;
  for (const json& from : list) {
    rules.push_back({.where = ReadPattern(from),
                     .effort = ReadOptional(from, "effort"),
                     .parasitic = ReadOptional(from, "parasitic")});
  }
  return rules;
}

std::vector<Exemption> ReadExemptions(const json& list) {
  std::vector<Exemption> exemptions;
  for (const json& from : list) {
    exemptions.push_back(
        {.where = ReadPattern(from),
         .quantity = ReadNamed(from,
                               "quantity",
                               {Quantity::kEffort, Quantity::kParasitic},
                               QuantityName),
         .reason = from.at("reason").get<std::string>(),
         .author = from.at("author").get<std::string>(),
         .expires = from.at("expires").get<std::string>()});
  }
  return exemptions;
}

}  // namespace gatedyno
