#include "harness/report/csv_report.h"

#include <array>
#include <optional>
#include <vector>

#include "harness/compare/excuse.h"
#include "harness/report/csv_text.h"
#include "harness/report/exemption_text.h"

namespace gatedyno {
namespace {

std::string IfMeasured(const Comparison& row, std::optional<double> value) {
  return row.line && value ? CsvNumber(*value) : "";
}

struct Column {
  const char* name;
  std::string (*value)(const Comparison& row);
};

constexpr std::array kColumns = {
    Column{"corner", [](const Comparison& r) { return CsvField(r.corner); }},
    Column{"cell", [](const Comparison& r) { return CsvField(r.arc.cell); }},
    Column{"pin", [](const Comparison& r) { return CsvField(r.arc.pin); }},
    Column{"output",
           [](const Comparison& r) { return CsvField(r.arc.output); }},
    Column{
        "edge",
        [](const Comparison& r) { return std::string(EdgeName(r.arc.edge)); }},
    Column{"side",
           [](const Comparison& r) { return CsvField(DescribeSide(r.arc)); }},
    Column{"g_hand",
           [](const Comparison& r) { return CsvNumber(r.estimate.effort); }},
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
             return CsvNumber(r.estimate.parasitic_by_nodes);
           }},
    Column{"p_hand_elmore",
           [](const Comparison& r) {
             return CsvNumber(r.estimate.parasitic_by_elmore);
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
             return r.line ? CsvNumber(r.line->slope_s) : "";
           }},
    Column{"intercept_s",
           [](const Comparison& r) {
             return r.line ? CsvNumber(r.line->intercept_s) : "";
           }},
    Column{"largest_residual_s",
           [](const Comparison& r) {
             return r.line ? CsvNumber(r.line->largest_residual_s) : "";
           }},
    Column{
        "bent",
        [](const Comparison& r) { return std::string(r.bent ? "yes" : "no"); }},
    Column{"verdict",
           [](const Comparison& r) {
             return std::string(VerdictName(r.verdict));
           }},
    Column{"reason", [](const Comparison& r) { return CsvField(r.reason); }},
};

}  // namespace

std::string CsvReport(const RunResult& result, const std::string& today) {
  std::vector<std::string> fields;
  fields.reserve(kColumns.size());
  for (const Column& column : kColumns) {
    fields.emplace_back(column.name);
  }
  fields.insert(fields.end(), {"excused", "exemption"});
  std::string text = CsvLine(fields);
  for (const Comparison& row : result.comparisons) {
    fields.clear();
    for (const Column& column : kColumns) {
      fields.push_back(column.value(row));
    }
    const std::vector<Exemption>& exemptions = result.facts.exemptions;
    fields.emplace_back(IsExcused(row, exemptions, today) ? "yes" : "no");
    fields.push_back(CsvField(ExemptionNote(row, exemptions, today)));
    text += CsvLine(fields);
  }
  return text;
}

}  // namespace gatedyno
