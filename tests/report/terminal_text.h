// What a terminal makes of a report.

#ifndef GATEDYNO_TESTS_REPORT_TERMINAL_TEXT_H_
#define GATEDYNO_TESTS_REPORT_TERMINAL_TEXT_H_

#include <sstream>
#include <string>

#include <gtest/gtest.h>

#include "harness/report/wrap.h"

namespace gatedyno {

// Without the sequences of colour and emphasis.
inline std::string Plain(const std::string& text) {
  std::string plain;
  for (size_t i = 0; i < text.size(); ++i) {
    if (text[i] == '\x1b') {
      i = text.find('m', i);
    } else {
      plain += text[i];
    }
  }
  return plain;
}

inline void ExpectFits(const std::string& text) {
  std::istringstream lines(Plain(text));
  for (std::string line; std::getline(lines, line);) {
    EXPECT_LE(ColumnsOf(line), kColumns) << line;
    EXPECT_FALSE(line.ends_with(' ')) << line << "|";
  }
}

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_REPORT_TERMINAL_TEXT_H_
