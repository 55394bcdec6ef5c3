#include "harness/node/json_file.h"

#include <algorithm>
#include <string>
#include <string_view>

#include <fmt/format.h>

#include "harness/base/file.h"
#include "harness/node/json_schema.h"

namespace gatedyno {
namespace {

std::string PlaceAt(std::string_view text, size_t byte) {
  const std::string_view before = text.substr(0, byte == 0 ? 0 : byte - 1);
  const auto line = std::count(before.begin(), before.end(), '\n') + 1;
  const size_t last_break = before.rfind('\n');
  const size_t column =
      last_break == std::string_view::npos ? byte : byte - last_break - 1;
  return fmt::format("{}:{}", line, column);
}

Result<nlohmann::json> Parse(std::string_view text, const std::string& file) {
  try {
    return nlohmann::json::parse(text);
  } catch (const nlohmann::json::parse_error& thrown) {
    const std::string_view words = thrown.what();
    const size_t detail = words.find("syntax error");
    return BadInput(fmt::format(
        "{}:{}: not JSON: {}",
        file,
        PlaceAt(text, thrown.byte),
        detail == std::string_view::npos ? words : words.substr(detail)));
  }
}

}  // namespace

Result<nlohmann::json> ReadJsonFile(const std::filesystem::path& path,
                                    const std::filesystem::path& schema_path) {
  const Result<std::string> text = ReadFile(path);
  if (!text.ok()) {
    return Forward(text);
  }
  Result<nlohmann::json> value = Parse(*text, path.string());
  if (!value.ok()) {
    return value;
  }
  const Result<std::string> schema_text = ReadFile(schema_path);
  if (!schema_text.ok()) {
    return Forward(schema_text);
  }
  const Result<nlohmann::json> schema =
      Parse(*schema_text, schema_path.string());
  if (!schema.ok()) {
    return Forward(schema);
  }
  const Status checked = CheckJson(*value, *schema, path.string());
  if (!checked.ok()) {
    return Forward(checked);
  }
  return value;
}

}  // namespace gatedyno
