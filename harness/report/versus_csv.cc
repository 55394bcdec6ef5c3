#include "harness/report/versus_csv.h"

#include <cmath>
#include <optional>
#include <vector>

#include "harness/report/csv_text.h"

namespace gatedyno {
namespace {

// An arc of both runs, or of one.
struct Row {
  const Comparison* a = nullptr;
  const Comparison* b = nullptr;
  const ArcPair* pair = nullptr;  // None of one run.

  const Arc& arc() const { return a != nullptr ? a->arc : b->arc; }
};

std::string NumberOrNone(std::optional<double> value) {
  return value && std::isfinite(*value) ? CsvNumber(*value) : "";
}

// Corner, hand numbers, measured numbers and verdict of one side.
void AddSide(const Comparison* row, std::vector<std::string>* fields) {
  constexpr std::size_t kFields = 8;
  if (row == nullptr) {
    fields->insert(fields->end(), kFields, "");
    return;
  }
  const bool measured = row->line.has_value();
  const auto if_measured = [measured](std::optional<double> value) {
    return measured ? NumberOrNone(value) : "";
  };
  fields->insert(
      fields->end(),
      {CsvField(row->corner),
       NumberOrNone(row->estimate.effort),
       if_measured(row->effort.value),
       if_measured(row->effort.u),
       row->hand_parasitic > 0 ? NumberOrNone(row->hand_parasitic) : "",
       if_measured(row->parasitic.value),
       if_measured(row->parasitic.u),
       std::string(VerdictName(row->verdict))});
}

void AddChange(const std::optional<Change>& change,
               std::vector<std::string>* fields) {
  fields->push_back(change ? NumberOrNone(change->relative) : "");
  fields->push_back(change ? NumberOrNone(change->expanded) : "");
}

std::string FindingField(const Row& row) {
  if (row.pair == nullptr) {
    return row.a != nullptr ? "only in A" : "only in B";
  }
  return CsvField(FindingName(row.pair->finding));
}

std::string RowText(const Row& row) {
  const Arc& arc = row.arc();
  std::vector<std::string> fields = {CsvField(arc.cell),
                                     CsvField(arc.pin),
                                     CsvField(arc.output),
                                     std::string(EdgeName(arc.edge)),
                                     CsvField(DescribeSide(arc))};
  AddSide(row.a, &fields);
  AddSide(row.b, &fields);
  AddChange(row.pair != nullptr ? row.pair->effort : std::nullopt, &fields);
  AddChange(row.pair != nullptr ? row.pair->parasitic : std::nullopt, &fields);
  fields.push_back(FindingField(row));
  return CsvLine(fields);
}

}  // namespace

std::string VersusCsv(const Versus& versus) {
  std::string text = CsvLine({"cell",
                              "pin",
                              "output",
                              "edge",
                              "side",
                              "corner_a",
                              "g_hand_a",
                              "g_a",
                              "g_u_a",
                              "p_hand_tau_a",
                              "p_a",
                              "p_u_a",
                              "verdict_a",
                              "corner_b",
                              "g_hand_b",
                              "g_b",
                              "g_u_b",
                              "p_hand_tau_b",
                              "p_b",
                              "p_u_b",
                              "verdict_b",
                              "g_change",
                              "g_change_expanded",
                              "p_change",
                              "p_change_expanded",
                              "finding"});
  for (const ArcPair& pair : versus.arcs) {
    text += RowText({.a = pair.a, .b = pair.b, .pair = &pair});
  }
  for (const Comparison* row : versus.only_a) {
    text += RowText({.a = row});
  }
  for (const Comparison* row : versus.only_b) {
    text += RowText({.b = row});
  }
  return text;
}

}  // namespace gatedyno
