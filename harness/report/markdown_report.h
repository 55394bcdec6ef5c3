// The run for a review thread: GitHub Flavored Markdown, verdict first, then
// what is not within, then exemptions, then everything, folded.

#ifndef GATEDYNO_REPORT_MARKDOWN_REPORT_H_
#define GATEDYNO_REPORT_MARKDOWN_REPORT_H_

#include <string>
#include <string_view>

#include "harness/record/run_result.h"

namespace gatedyno {

// Exemptions stand as on the day `today`, "2026-12-02".
std::string MarkdownReport(const RunResult& result, const std::string& today);

// A text of the user's as a code span (CommonMark 0.31, 6.1) that is safe in a
// table (GFM 0.29, 4.10): nothing in it is a link, a mention or markup.
std::string CodeSpan(std::string_view text);

}  // namespace gatedyno

#endif  // GATEDYNO_REPORT_MARKDOWN_REPORT_H_
