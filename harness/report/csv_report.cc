#include "harness/report/csv_report.h"

#include <array>
#include <optional>
#include <string_view>
#include <vector>

#include <fmt/format.h>
#include <fmt/ranges.h>

namespace gatedyno {
namespace {

// RFC 4180, section 2: fields with commas, quotes or line breaks are quoted,
// and quotes inside are doubled.
std::string Field(std::string_view text) {
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

std::string Number(double value) {
  return fmt::format("{}", value);
}

std::string IfMeasured(const Comparison& row, std::optional<double> value) {
  return row.line && value ? Number(*value) : "";
}

struct Column {
  const char* name;
  std::string (*value)(const Comparison& row);
};

constexpr std::array kColumns = {
    Column{"corner", [](const Comparison& r) { return Field(r.corner); }},
    Column{"cell", [](const Comparison& r) { return Field(r.arc.cell); }},
    Column{"pin", [](const Comparison& r) { return Field(r.arc.pin); }},
    Column{"output", [](const Comparison& r) { return Field(r.arc.output); }},
    Column{
        "edge",
        [](const Comparison& r) { return std::string(EdgeName(r.arc.edge)); }},
    Column{"side",
           [](const Comparison& r) { return Field(DescribeSide(r.arc)); }},
    Column{"g_hand",
           [](const Comparison& r) { return Number(r.estimate.effort); }},
    Column{"g",
           [](const Comparison& r) { return IfMeasured(r, r.effort.value); }},
    Column{"g_u",
           [](const Comparison& r) { return IfMeasured(r, r.effort.u); }},
    Column{
        "g_mean_tau",
        [](const Comparison& r) { return IfMeasured(r, r.effort_mean.value); }},
    Column{
        "g_difference",
        [](const Comparison& r) { return IfMeasured(r, r.effort_difference); }},
    Column{"p_hand_nodes",
           [](const Comparison& r) {
             return Number(r.estimate.parasitic_by_nodes);
           }},
    Column{"p_hand_elmore",
           [](const Comparison& r) {
             return Number(r.estimate.parasitic_by_elmore);
           }},
    Column{"p_hand_tau",
           [](const Comparison& r) { return IfMeasured(r, r.hand_parasitic); }},
    Column{
        "p",
        [](const Comparison& r) { return IfMeasured(r, r.parasitic.value); }},
    Column{"p_u",
           [](const Comparison& r) { return IfMeasured(r, r.parasitic.u); }},
    Column{"p_difference",
           [](const Comparison& r) {
             return IfMeasured(r, r.parasitic_difference);
           }},
    Column{"slope_s",
           [](const Comparison& r) {
             return r.line ? Number(r.line->slope_s) : "";
           }},
    Column{"intercept_s",
           [](const Comparison& r) {
             return r.line ? Number(r.line->intercept_s) : "";
           }},
    Column{"largest_residual_s",
           [](const Comparison& r) {
             return r.line ? Number(r.line->largest_residual_s) : "";
           }},
    Column{
        "bent",
        [](const Comparison& r) { return std::string(r.bent ? "yes" : "no"); }},
    Column{"verdict",
           [](const Comparison& r) {
             return std::string(VerdictName(r.verdict));
           }},
    Column{"reason", [](const Comparison& r) { return Field(r.reason); }},
};

}  // namespace

std::string CsvReport(const RunResult& result) {
  constexpr const char* kLineEnd = "\r\n";
  std::vector<std::string> fields;
  fields.reserve(kColumns.size());
  for (const Column& column : kColumns) {
    fields.emplace_back(column.name);
  }
  std::string text = fmt::format("{}{}", fmt::join(fields, ","), kLineEnd);
  for (const Comparison& row : result.comparisons) {
    fields.clear();
    for (const Column& column : kColumns) {
      fields.push_back(column.value(row));
    }
    text += fmt::format("{}{}", fmt::join(fields, ","), kLineEnd);
  }
  return text;
}

}  // namespace gatedyno
