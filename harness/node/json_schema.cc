#include "harness/node/json_schema.h"

#include <algorithm>
#include <array>
#include <exception>
#include <string_view>
#include <vector>

#include <fmt/format.h>
#include <fmt/ranges.h>
#include <valijson/adapters/nlohmann_json_adapter.hpp>
#include <valijson/schema.hpp>
#include <valijson/schema_parser.hpp>
#include <valijson/validation_results.hpp>
#include <valijson/validator.hpp>

namespace gatedyno {
namespace {

using nlohmann::json;

// valijson names a place {"<root>", "[width]", "[0]"}; this is its pointer.
json::json_pointer PointerOf(const std::vector<std::string>& context) {
  json::json_pointer pointer;
  for (size_t i = 1; i < context.size(); ++i) {
    const std::string& step = context[i];
    const bool bracketed = step.size() > 2 && step.front() == '[';
    pointer /= bracketed ? step.substr(1, step.size() - 2) : step;
  }
  return pointer;
}

const json& Resolve(const json& schema, const json& root) {
  if (schema.is_object() && schema.contains("$ref")) {
    const std::string reference = schema["$ref"].get<std::string>();
    return root.at(json::json_pointer(reference.substr(1)));
  }
  return schema;
}

// The part of the schema that rules the place `pointer`; null when there is
// none.
json SchemaAt(const json& root, const std::vector<std::string>& context) {
  json here = Resolve(root, root);
  for (size_t i = 1; i < context.size(); ++i) {
    const std::string name = context[i].substr(1, context[i].size() - 2);
    if (here.contains("properties") && here["properties"].contains(name)) {
      here = json(Resolve(here["properties"][name], root));
    } else if (here.contains("patternProperties")) {
      here = json(Resolve(here["patternProperties"].front(), root));
    } else if (here.contains("items")) {
      here = json(Resolve(here["items"], root));
    } else if (here.contains("additionalProperties")) {
      here = json(Resolve(here["additionalProperties"], root));
    } else {
      return nullptr;
    }
  }
  return here;
}

struct Rule {
  const char* keyword;
  const char* words;
};
constexpr auto kRules =
    std::to_array<Rule>({{"const", "the value {}"},
                         {"enum", "one of {}"},
                         {"exclusiveMinimum", "more than {}"},
                         {"minimum", "at least {}"},
                         {"exclusiveMaximum", "less than {}"},
                         {"maximum", "at most {}"},
                         {"minItems", "at least {} of them"},
                         {"uniqueItems", "no two alike"},
                         {"minLength", "at least {} long"},
                         {"pattern", "matching {}"}});

std::string Expectation(const json& schema) {
  std::vector<std::string> parts;
  if (schema.contains("type")) {
    const json& type = schema["type"];
    parts.push_back(type.is_string() ? type.get<std::string>() : type.dump());
  }
  for (const Rule& rule : kRules) {
    if (schema.contains(rule.keyword)) {
      parts.push_back(
          fmt::format(fmt::runtime(rule.words), schema[rule.keyword].dump()));
    }
  }
  return fmt::format("{}", fmt::join(parts, ", "));
}

// Complaints about an object as a whole (a key missing or unknown) say it
// best in the library's words.
bool IsAboutKeys(std::string_view description) {
  return description.find("required property") != std::string_view::npos ||
         description.find("additionalProperties") != std::string_view::npos;
}

std::string QuotedTail(std::string_view description) {
  const size_t end = description.rfind('\'');
  const size_t begin = end == 0 || end == std::string_view::npos
                           ? std::string_view::npos
                           : description.rfind('\'', end - 1);
  return begin == std::string_view::npos
             ? std::string(description)
             : std::string(description.substr(begin, end - begin + 1));
}

std::string KeyComplaint(std::string_view description, const json& schema) {
  const std::string key = QuotedTail(description);
  if (description.find("required property") != std::string_view::npos) {
    return fmt::format("key {} is missing", key);
  }
  if (schema.contains("patternProperties")) {
    return fmt::format("unknown key {}; known are those matching {}",
                       key,
                       schema["patternProperties"].begin().key());
  }
  std::vector<std::string> known;
  if (schema.contains("properties")) {
    for (const auto& [name, unused] : schema["properties"].items()) {
      known.push_back(name);
    }
  }
  return fmt::format(
      "unknown key {}; known are: {}", key, fmt::join(known, ", "));
}

std::string Complaint(const valijson::ValidationResults::Error& error,
                      const json& value,
                      const json& schema,
                      const std::string& file) {
  const json::json_pointer pointer = PointerOf(error.context);
  const json rules = SchemaAt(schema, error.context);
  const std::string place =
      pointer.empty() ? std::string("/") : pointer.to_string();
  if (IsAboutKeys(error.description)) {
    return fmt::format(
        "{}: {}: {}", file, place, KeyComplaint(error.description, rules));
  }
  const std::string expected =
      rules.is_object() ? Expectation(rules) : error.description;
  const std::string got =
      value.contains(pointer) ? value[pointer].dump() : "nothing";
  constexpr size_t kShown = 60;
  return fmt::format("{}: {}: expected {}; got {}",
                     file,
                     place,
                     expected,
                     got.size() > kShown ? got.substr(0, kShown) + "..." : got);
}

// A complaint about a part is followed by one about each whole it is in.
valijson::ValidationResults::Error Deepest(
    const valijson::ValidationResults& results) {
  return *std::max_element(
      results.begin(), results.end(), [](const auto& a, const auto& b) {
        return a.context.size() < b.context.size();
      });
}

}  // namespace

Status CheckJson(const json& value,
                 const json& schema,
                 const std::string& file) {
  try {
    valijson::Schema compiled;
    valijson::SchemaParser parser;
    const valijson::adapters::NlohmannJsonAdapter schema_adapter(schema);
    parser.populateSchema(schema_adapter, compiled);
    valijson::Validator validator;
    valijson::ValidationResults results;
    const valijson::adapters::NlohmannJsonAdapter value_adapter(value);
    if (validator.validate(compiled, value_adapter, &results)) {
      return Ok();
    }
    return BadInput(Complaint(Deepest(results), value, schema, file));
  } catch (const std::exception& thrown) {
    return Internal(fmt::format(
        "{}: its schema cannot be applied: {}", file, thrown.what()));
  }
}

}  // namespace gatedyno
