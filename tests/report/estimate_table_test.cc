#include "harness/report/estimate_table.h"

#include <string>

#include <gtest/gtest.h>

#include "tests/report/terminal_text.h"
#include "tests/support/bundle_gates.h"
#include "tests/support/find_arc.h"
#include "tests/support/gates.h"
#include "tests/support/golden.h"

namespace gatedyno {
namespace {

const Style kNoColour(false);

std::string TableOf(const Cell& cell) {
  return EstimateTable(MustEstimate(cell), kNoColour);
}

TEST(EstimateTableTest, Golden) {
  ExpectGolden("estimate_table.txt",
               TableOf(NandCell(2, 2, 2)) + "\n" +
                   TableOf(MajorityRepeatedCell(2)) + "\n" +
                   TableOf(XorSymmetricCell(2, 2)));
}

TEST(EstimateTableTest, FitsTheTerminal) {
  for (const Cell& cell : {NandCell(2, 2, 2),
                           NandCell(12, 12, 2),
                           MajorityRepeatedCell(2),
                           MajorityDualCell(2),
                           Mux4Cell(2)}) {
    ExpectFits(TableOf(cell));
  }
}

TEST(EstimateTableTest, NamesOfAnyLengthAreWrittenOut) {
  Cell cell = NandCell(12, 12, 2);
  for (std::string& net : cell.nets) {
    net = "interrupt_request_" + net;
  }
  cell.nets[0] = std::string(120, 'a');
  cell.name = std::string(120, 'n');
  const std::string table = TableOf(cell);
  ExpectFits(table);
  EXPECT_GE(std::count(table.begin(), table.end(), 'n'), 120);
}

TEST(EstimateTableTest, ColourOnlyEmphasizes) {
  const CellEstimate estimate = MustEstimate(MajorityRepeatedCell(2));
  EXPECT_EQ(Plain(EstimateTable(estimate, Style(true))),
            EstimateTable(estimate, kNoColour));
}

}  // namespace
}  // namespace gatedyno
