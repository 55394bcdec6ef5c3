#include "harness/report/release_text.h"

#include <fmt/format.h>

#include "harness/report/markdown_report.h"
#include "harness/report/run_table.h"
#include "harness/report/verdict_text.h"
#include "harness/report/wrap.h"

namespace gatedyno {
namespace {

std::string Decision(const ReleaseReport& report) {
  return fmt::format("release: {}", report.decision.yes() ? "yes" : "no");
}

std::string Item(const ReleaseItem& item, const Style& style) {
  constexpr size_t kIndent = 4;
  const std::string what =
      item.subject.empty() ? item.text : item.subject + ": " + item.text;
  const std::string note =
      item.note.empty()
          ? ""
          : style.Quiet(Wrap(std::string(kIndent, ' ') + item.note, kIndent)) +
                '\n';
  return Wrap("  " + what, kIndent) + '\n' + note;
}

// Where the numbers are from, and what was allowed.
std::string FactLines(const ReleaseReport& report) {
  const RunFacts& facts = report.result.facts;
  return Wrap(facts.title) + '\n' +
         Wrap(fmt::format("node {}: {}", facts.node, facts.node_title)) + '\n' +
         Wrap(fmt::format("plan {}, decided on {} from {}, simulator {}",
                          report.plan,
                          report.today,
                          report.store,
                          facts.simulator)) +
         '\n' + Wrap("allowed: " + AllowedText(facts)) + '\n' +
         Wrap(ReleaseCounts(report)) + '\n';
}

std::string MarkdownItem(const ReleaseItem& item) {
  return fmt::format("- {}{}{}\n",
                     item.subject.empty() ? "" : CodeSpan(item.subject) + ": ",
                     CodeSpan(item.text),
                     item.note.empty() ? "" : "<br>" + CodeSpan(item.note));
}

}  // namespace

std::string ReleaseText(const ReleaseReport& report, const Style& style) {
  const Verdict colour =
      report.decision.yes() ? Verdict::kWithin : Verdict::kBeyond;
  std::string text =
      style.OfVerdict(colour, Decision(report)) + '\n' + FactLines(report);
  for (const ReleasePart& part : ReleaseParts(report)) {
    text += '\n' + style.Heading(Wrap(part.title)) + '\n';
    for (const ReleaseItem& item : part.items) {
      text += Item(item, style);
    }
  }
  for (const std::string& warning : report.result.warnings) {
    text += '\n' + Wrap("warning: " + warning);
  }
  text += report.result.warnings.empty() ? "\n" : "\n\n";
  return text + style.Quiet(kCaution) + '\n';
}

std::string ReleaseMarkdown(const ReleaseReport& report) {
  const RunFacts& facts = report.result.facts;
  std::string text = fmt::format(
      "## {}\n\n{}, {}\n\nPlan {}, decided on {} from {}, simulator {}; "
      "allowed: {}\n\n{}\n\n",
      Decision(report),
      CodeSpan(facts.title),
      CodeSpan(fmt::format("{}: {}", facts.node, facts.node_title)),
      CodeSpan(report.plan),
      report.today,
      CodeSpan(report.store),
      CodeSpan(facts.simulator),
      AllowedText(facts),
      ReleaseCounts(report));
  for (const ReleasePart& part : ReleaseParts(report)) {
    text += fmt::format("### {}\n\n", part.title);
    for (const ReleaseItem& item : part.items) {
      text += MarkdownItem(item);
    }
    text += '\n';
  }
  return text + kCaution + '\n';
}

}  // namespace gatedyno
