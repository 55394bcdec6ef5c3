// Lines of CSV as RFC 4180 has them.

#ifndef GATEDYNO_REPORT_CSV_TEXT_H_
#define GATEDYNO_REPORT_CSV_TEXT_H_

#include <string>
#include <string_view>
#include <vector>

namespace gatedyno {

// RFC 4180, section 2: fields with commas, quotes or line breaks are quoted,
// and quotes inside are doubled.
std::string CsvField(std::string_view text);

// Full digits.
std::string CsvNumber(double value);

// With its line end, CRLF.
std::string CsvLine(const std::vector<std::string>& fields);

}  // namespace gatedyno

#endif  // GATEDYNO_REPORT_CSV_TEXT_H_
