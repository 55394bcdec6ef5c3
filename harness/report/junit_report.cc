#include "harness/report/junit_report.h"

#include <cstddef>
#include <optional>
#include <span>
#include <string_view>
#include <vector>

#include <fmt/format.h>

#include "harness/compare/excuse.h"
#include "harness/compare/summary.h"
#include "harness/report/exemption_text.h"
#include "harness/report/html_text.h"

namespace gatedyno {
namespace {

using Rows = std::span<const Comparison>;

// Line breaks in an attribute are read as blanks unless they are references.
std::string Attribute(std::string_view text) {
  std::string xml;
  for (const char c : Html(text)) {
    c == '\n' ? xml += "&#10;" : c == '\t' ? xml += "&#9;" : xml += c;
  }
  return xml;
}

std::string Property(std::string_view name, const std::string& value) {
  return fmt::format(
      "        <property name=\"{}\" value=\"{}\"/>\n", name, Attribute(value));
}

std::string Property(std::string_view name, double value) {
  return Property(name, fmt::format("{}", value));
}

std::string Property(std::string_view name, std::optional<double> value) {
  return value ? Property(name, *value) : "";
}

// What was not measured has no property.
std::string Numbers(const Comparison& row) {
  std::string text = Property("g_hand", row.estimate.effort) +
                     Property("p_hand_nodes", row.estimate.parasitic_by_nodes);
  if (row.line) {
    text += Property("g", row.effort.value) + Property("g_u", row.effort.u) +
            Property("g_difference", row.effort_difference) +
            Property("p_hand_tau", row.hand_parasitic) +
            Property("p", row.parasitic.value) +
            Property("p_u", row.parasitic.u) +
            Property("p_difference", row.parasitic_difference);
  }
  return text + Property("bent", row.bent ? "yes" : "no");
}

// What exemptions say, by the row.
struct Excuses {
  const std::vector<Exemption>& exemptions;
  const std::string& today;

  bool Cover(const Comparison& row) const {
    return IsExcused(row, exemptions, today);
  }
};

std::string Outcome(const Comparison& row, const Excuses& excuses) {
  if (row.verdict == Verdict::kWithin) {
    return "";
  }
  if (excuses.Cover(row)) {
    return fmt::format(
        "      <skipped message=\"{}\"/>\n",
        Attribute(ExemptionNote(row, excuses.exemptions, excuses.today)));
  }
  const bool beyond = row.verdict == Verdict::kBeyond;
  return fmt::format("      <{} type=\"{}\" message=\"{}\"/>\n",
                     beyond ? "failure" : "error",
                     VerdictName(row.verdict),
                     Attribute(row.reason));
}

std::string Case(const Comparison& row, const Excuses& excuses) {
  const std::string side = DescribeSide(row.arc);
  return fmt::format(
      "    <testcase classname=\"{}\" name=\"{}{}\">\n      <properties>\n{}"
      "      </properties>\n{}    </testcase>\n",
      Attribute(row.corner + "." + row.arc.cell),
      Attribute(DescribeArc(row.arc)),
      side.empty() ? "" : Attribute(" with " + side),
      Numbers(row),
      Outcome(row, excuses));
}

std::string Counts(Rows rows, const Excuses& excuses) {
  Summary summary;
  int skipped = 0;
  for (const Comparison& row : rows) {
    const bool covered = excuses.Cover(row);
    skipped += covered ? 1 : 0;
    summary.beyond += !covered && row.verdict == Verdict::kBeyond ? 1 : 0;
    summary.not_measured +=
        !covered && row.verdict == Verdict::kNotMeasured ? 1 : 0;
  }
  return fmt::format(
      "tests=\"{}\" failures=\"{}\" errors=\"{}\" skipped=\"{}\"",
      rows.size(),
      summary.beyond,
      summary.not_measured,
      skipped);
}

// The rows of one corner follow each other.
std::vector<Rows> ByCorner(Rows rows) {
  std::vector<Rows> suites;
  size_t from = 0;
  for (size_t i = 1; i <= rows.size(); ++i) {
    if (i == rows.size() || rows[i].corner != rows[from].corner) {
      suites.push_back(rows.subspan(from, i - from));
      from = i;
    }
  }
  return suites;
}

// ISO 8601 without a zone, as the schemas of this format want it.
std::string Timestamp(std::string started) {
  if (started.ends_with('Z')) {
    started.pop_back();
  }
  return started;
}

}  // namespace

std::string JunitReport(const RunResult& result, const std::string& today) {
  const Excuses excuses{result.facts.exemptions, today};
  const Rows rows(result.comparisons);
  std::string text = fmt::format(
      "<?xml version=\"1.0\" encoding=\"UTF-8\"?>\n<testsuites name=\"{}\" "
      "{}>\n",
      Attribute(result.facts.title),
      Counts(rows, excuses));
  for (const Rows suite : ByCorner(rows)) {
    text += fmt::format("  <testsuite name=\"{}\" {} timestamp=\"{}\">\n",
                        Attribute(suite.front().corner),
                        Counts(suite, excuses),
                        Attribute(Timestamp(result.facts.started)));
    for (const Comparison& row : suite) {
      text += Case(row, excuses);
    }
    text += "  </testsuite>\n";
  }
  return text + "</testsuites>\n";
}

}  // namespace gatedyno
