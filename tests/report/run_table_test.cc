#include "harness/report/run_table.h"

#include <string>

#include <gtest/gtest.h>

#include "tests/report/exempt_run.h"
#include "tests/report/sample_run.h"
#include "tests/report/terminal_text.h"
#include "tests/support/golden.h"

namespace gatedyno {
namespace {

const Style kNoColour(false);
const Style kColour(true);

TEST(RunTableTest, Golden) {
  ExpectGolden("run_table.txt", RunTable(SampleRun(), kNoColour, kToday));
}

TEST(RunTableTest, FitsTheTerminal) {
  ExpectFits(RunTable(SampleRun(), kNoColour, kToday));
}

TEST(RunTableTest, NamesOfAnyLengthAreWrittenOut) {
  RunResult result = SampleRun();
  constexpr size_t kLong = 150;
  const std::string pin(kLong, 'p');
  const std::string cell(kLong, 'c');
  for (Comparison& row : result.comparisons) {
    row.arc.pin = pin;
    row.arc.cell = cell;
    row.corner = std::string(kLong, 'k');
  }
  result.cells = {{cell, {std::string(kLong, 'f')}, 1, 1, 1}};
  result.calibrations[0].corner.name = result.comparisons[0].corner;
  result.warnings = {std::string(2 * kLong, 'w')};
  result.facts.title = std::string(kLong, 't');
  result.facts.node_title = result.facts.title;
  result.facts.fanouts.assign(100, 2.5);
  const std::string table = RunTable(result, kNoColour, kToday);
  ExpectFits(table);
  for (const char letter : {'p', 'c', 'k', 'f', 't'}) {
    EXPECT_GE(std::count(table.begin(), table.end(), letter),
              static_cast<long>(kLong));
  }
}

TEST(RunTableTest, FiguresOfAnySizeFit) {
  RunResult result = SampleRun();
  for (Comparison& row : result.comparisons) {
    row.effort = {-123456.789, 98765.4321};
    row.parasitic = {-98765.4, 12345.6};
    row.effort_difference = 12345.6;
    row.parasitic_difference = -12345.6;
  }
  ExpectFits(RunTable(result, kNoColour, kToday));
}

TEST(RunTableTest, ColourOnlyRepeatsWhatWordsSay) {
  const std::string coloured = RunTable(SampleRun(), kColour, kToday);
  const std::string plain = RunTable(SampleRun(), kNoColour, kToday);
  EXPECT_EQ(plain.find('\x1b'), std::string::npos);
  EXPECT_NE(coloured.find('\x1b'), std::string::npos);
  EXPECT_EQ(Plain(coloured), plain);
  EXPECT_NE(coloured.find(kColour.OfVerdict(Verdict::kBeyond, "beyond")),
            std::string::npos);
  EXPECT_NE(
      coloured.find(kColour.OfVerdict(Verdict::kNotMeasured, "not measured")),
      std::string::npos);
}

TEST(RunTableTest, SaysTheCaution) {
  EXPECT_NE(RunTable(RunResult(), kNoColour, kToday).find(kCaution),
            std::string::npos);
}

TEST(RunTableTest, ExemptionsStandAtTheirArcsAndBelow) {
  const std::string table = RunTable(ExemptRun(), kNoColour, kToday);
  ExpectFits(table);
  for (const std::string& part :
       {std::string("of the hand number, but for 2 rules of the\n  plan\n"),
        std::string("\n    ") + kExemptNote + '\n',
        std::string("\n    ") + kExpiredNote + '\n',
        std::string("\nexemptions on 2026-12-02:\n  nand2, pin b, fall, only "
                    "g: in force until 2027-03-31, needed by 1 of 1 arc\n    "
                    "skewed on purpose (M. Ober)\n  nand2, rise: expired: held "
                    "until 2026-01-31, needed by 3 of 3 arcs\n")}) {
    EXPECT_NE(table.find(part), std::string::npos) << part << "\n" << table;
  }
}

}  // namespace
}  // namespace gatedyno
