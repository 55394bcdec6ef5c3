// A release decision for people: on the terminal, at most 100 columns wide, and
// in a review thread.

#ifndef GATEDYNO_REPORT_RELEASE_TEXT_H_
#define GATEDYNO_REPORT_RELEASE_TEXT_H_

#include <string>

#include "harness/report/release_report.h"
#include "harness/report/style.h"

namespace gatedyno {

// The first line is "release: yes" or "release: no".
std::string ReleaseText(const ReleaseReport& report, const Style& style);

// GitHub Flavored Markdown; the same parts.
std::string ReleaseMarkdown(const ReleaseReport& report);

}  // namespace gatedyno

#endif  // GATEDYNO_REPORT_RELEASE_TEXT_H_
