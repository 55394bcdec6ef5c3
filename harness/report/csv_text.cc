#include "harness/report/csv_text.h"

#include <fmt/format.h>
#include <fmt/ranges.h>

namespace gatedyno {

std::string CsvField(std::string_view text) {
  if (text.find_first_of(",\"\r\n") == std::string_view::npos) {
    return std::string(text);
  }
  std::string quoted = "\"";
  for (const char c : text) {
    quoted += c;
    if (c == '"') {
      quoted += c;
    }
  }
  return quoted + '"';
}

std::string CsvNumber(double value) {
  return fmt::format("{}", value);
}

std::string CsvLine(const std::vector<std::string>& fields) {
  return fmt::format("{}\r\n", fmt::join(fields, ","));
}

}  // namespace gatedyno
