// Cells that must be refused, and the whole message.

#ifndef GATEDYNO_TESTS_NETWORK_BAD_CELL_H_
#define GATEDYNO_TESTS_NETWORK_BAD_CELL_H_

#include <string>
#include <vector>

#include <gtest/gtest.h>

#include "harness/network/analysis.h"
#include "tests/support/cell_builder.h"

namespace gatedyno {

struct BadCell {
  const char* why;
  Cell cell;
  std::string message;
};

inline CellBuilder Start(const std::vector<std::string>& pins) {
  CellBuilder builder("bad");
  return builder.Pins(pins);
}

inline CellBuilder TwoInputs() {
  return Start({"a", "b", "y", "vdd", "vss"});
}

inline void ExpectMessages(const std::vector<BadCell>& table) {
  for (const BadCell& row : table) {
    const auto analysis = AnalyseNetwork(row.cell);
    ASSERT_FALSE(analysis.ok()) << row.why;
    EXPECT_EQ(analysis.error().message, row.message) << row.why;
    EXPECT_EQ(analysis.error().kind, ErrorKind::kBadInput) << row.why;
  }
}

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_NETWORK_BAD_CELL_H_
