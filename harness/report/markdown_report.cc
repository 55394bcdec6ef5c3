#include "harness/report/markdown_report.h"

#include <algorithm>
#include <cstddef>
#include <vector>

#include <fmt/format.h>

#include "harness/compare/excuse.h"
#include "harness/report/exemption_text.h"
#include "harness/report/number_text.h"
#include "harness/report/run_table.h"
#include "harness/report/verdict_text.h"

namespace gatedyno {
namespace {

constexpr const char* kHead =
    "| cell | arc | corner | g hand | g | diff | p hand | p | diff | verdict "
    "|\n|---|---|---|--:|--:|--:|--:|--:|--:|---|\n";

std::string Row(const Comparison& row, const std::string& note) {
  const bool measured = row.line.has_value();
  const auto shown = [&](const std::string& text) {
    return measured ? text : std::string("-");
  };
  return fmt::format(
      "| {} | {} | {} | {:.3f} | {} | {} | {} | {} | {} | {}{}{} |\n",
      CodeSpan(row.arc.cell),
      CodeSpan(DescribeArc(row.arc)),
      CodeSpan(row.corner),
      row.estimate.effort,
      shown(WithUncertainty(row.effort, 3)),
      shown(SignedPercent(row.effort_difference)),
      row.hand_parasitic > 0 ? fmt::format("{:.2f}", row.hand_parasitic) : "-",
      shown(WithUncertainty(row.parasitic, 2)),
      shown(SignedPercent(row.parasitic_difference)),
      VerdictName(row.verdict),
      row.bent ? ", bent" : "",
      note.empty() ? "" : ", " + CodeSpan(note));
}

template <class Wanted>
std::string Rows(const RunResult& result,
                 const std::string& today,
                 const Wanted& wanted) {
  std::string rows;
  for (const Comparison& row : result.comparisons) {
    if (wanted(row)) {
      rows += Row(row, ExemptionNote(row, result.facts.exemptions, today));
    }
  }
  return rows;
}

std::string Corners(const RunResult& result) {
  std::string table = "| corner | tau | p_inv | FO4 |\n|---|--:|--:|--:|\n";
  for (const Calibration& calibration : result.calibrations) {
    table += fmt::format("| {} | {} | {} | {} |\n",
                         CodeSpan(calibration.corner.name),
                         Picoseconds(calibration.tau_s.value),
                         WithUncertainty(calibration.p_inv, 3),
                         Picoseconds(calibration.fo4_s));
  }
  return result.calibrations.empty() ? "" : table + '\n';
}

std::string Exemptions(const RunResult& result, const std::string& today) {
  const std::vector<Exemption>& exemptions = result.facts.exemptions;
  const std::vector<ExemptionUse> uses = UseOfExemptions(result, today);
  std::string list;
  for (size_t i = 0; i < exemptions.size(); ++i) {
    list += fmt::format("- {}: {}: {} ({})\n",
                        CodeSpan(ExemptionScope(exemptions[i])),
                        ExemptionStanding(exemptions[i], uses[i]),
                        CodeSpan(exemptions[i].reason),
                        CodeSpan(exemptions[i].author));
  }
  return list.empty() ? ""
                      : fmt::format("Exemptions on {}:\n\n{}\n", today, list);
}

size_t LongestRunOfBackticks(std::string_view text) {
  size_t longest = 0;
  size_t current = 0;
  for (const char c : text) {
    current = c == '`' ? current + 1 : 0;
    longest = std::max(longest, current);
  }
  return longest;
}

}  // namespace

std::string CodeSpan(std::string_view text) {
  std::string inside;
  for (const char c : text) {
    constexpr char kDelete = 0x7f;
    if (c == '|') {
      inside += "\\|";
    } else {
      inside += (c >= 0 && c < ' ') || c == kDelete ? ' ' : c;
    }
  }
  if (inside.find_first_not_of(' ') == std::string::npos) {
    return "(no name)";
  }
  const std::string fence(LongestRunOfBackticks(text) + 1, '`');
  const char* const pad = fence.size() > 1 ? " " : "";
  return fmt::format("{0}{1}{2}{1}{0}", fence, pad, inside);
}

std::string MarkdownReport(const RunResult& result, const std::string& today) {
  const RunFacts& facts = result.facts;
  std::string text =
      fmt::format("## {}\n\n**{}**\n\n{}, {} drive, begun {}, {}\n\n{}",
                  CodeSpan(facts.title),
                  VerdictSentence(result),
                  CodeSpan(fmt::format("{}: {}", facts.node, facts.node_title)),
                  DriveName(facts.drive),
                  facts.started,
                  facts.program,
                  Corners(result));
  const std::string open = Rows(result, today, [](const Comparison& row) {
    return row.verdict != Verdict::kWithin;
  });
  if (!open.empty()) {
    text += fmt::format("Not within:\n\n{}{}\n", kHead, open);
  }
  text += Exemptions(result, today);
  const std::string all =
      Rows(result, today, [](const Comparison&) { return true; });
  text +=
      fmt::format("<details><summary>All {}</summary>\n\n{}{}\n</details>\n\n",
                  Counted(static_cast<int>(result.comparisons.size()), "arc"),
                  kHead,
                  all);
  return text + kCaution + '\n';
}

}  // namespace gatedyno
