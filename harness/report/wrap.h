// Text that fits a terminal.

#ifndef GATEDYNO_REPORT_WRAP_H_
#define GATEDYNO_REPORT_WRAP_H_

#include <cstddef>
#include <string>
#include <string_view>

namespace gatedyno {

// No report for the terminal has a wider line.
inline constexpr std::size_t kColumns = 100;

// Columns of UTF-8 text without control characters, one a code point.
std::size_t ColumnsOf(std::string_view text);

// One paragraph, broken at blanks into lines of at most kColumns; all but the
// first are indented.  A % stays with its number.  A word that does not fit a
// line is broken where the line ends.  Control characters, which names and
// messages of others may hold, become '?'; so emphasis comes after wrapping.
// Without a final newline. REQUIRES: indent < kColumns.
std::string Wrap(std::string_view paragraph, std::size_t indent = 2);

// Cut where it is wider than `columns`; control characters become '?'.
std::string OneLine(std::string_view text, std::size_t columns);

}  // namespace gatedyno

#endif  // GATEDYNO_REPORT_WRAP_H_
