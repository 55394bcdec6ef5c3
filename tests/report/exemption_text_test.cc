#include "harness/report/exemption_text.h"

#include <string>
#include <vector>

#include <gtest/gtest.h>

#include "tests/compare/exempt_rows.h"
#include "tests/report/exempt_run.h"

namespace gatedyno {
namespace {

TEST(ExemptionTextTest, ScopeAndStanding) {
  struct Case {
    const char* scope;
    const char* standing;
  };
  const Case cases[] = {
      {"nand2, pin b, fall, only g",
       "in force until 2027-03-31, needed by 1 of 1 arc"},
      {"nand2, rise", "expired: held until 2026-01-31, needed by 3 of 3 arcs"},
      {"inv, only p",
       "not needed: holds until 2026-12-02, needed by none of 2 arcs"},
      {"nadn2", "covers no arc: holds until 2027-03-31"},
  };
  const RunResult result = ExemptRun();
  const std::vector<ExemptionUse> uses = UseOfExemptions(result, kToday);
  ASSERT_EQ(uses.size(), std::size(cases));
  for (size_t i = 0; i < uses.size(); ++i) {
    const Exemption& exemption = result.facts.exemptions[i];
    EXPECT_EQ(ExemptionScope(exemption), cases[i].scope);
    EXPECT_EQ(ExemptionStanding(exemption, uses[i]), cases[i].standing);
  }
}

TEST(ExemptionTextTest, NotesSayForWhatAndUntilWhen) {
  constexpr auto kG = Quantity::kEffort;
  constexpr auto kP = Quantity::kParasitic;
  constexpr const char* kPast = "2026-01-31";
  struct Case {
    Comparison row;
    std::vector<Exemption> exemptions;
    std::string note;
  };
  const Case cases[] = {
      {WithinRow(), {ExemptionFor({})}, ""},
      {BothBeyondRow(), {}, ""},
      {EffortBeyondRow(), {ExemptionFor(kP)}, ""},
      {EffortBeyondRow(),
       {ExemptionFor({})},
       "g exempt until 2027-03-31: known (M. Ober)"},
      {BothBeyondRow(),
       {ExemptionFor({})},
       "g, p exempt until 2027-03-31: known (M. Ober)"},
      {BothBeyondRow(),
       {ExemptionFor(kG), ExemptionFor(kP, "2028-01-01")},
       "g exempt until 2027-03-31: known (M. Ober); p exempt until 2028-01-01: "
       "known (M. Ober)"},
      {BothBeyondRow(),
       {ExemptionFor(kG), ExemptionFor(kP, kPast)},
       "g exempt until 2027-03-31: known (M. Ober); p was exempt until "
       "2026-01-31: known (M. Ober)"},
      {WithoutLineRow(),
       {ExemptionFor({})},
       "exempt until 2027-03-31: known (M. Ober)"},
      {WithoutLineRow(),
       {ExemptionFor({}, kPast)},
       "was exempt until 2026-01-31: known (M. Ober)"},
  };
  for (const Case& test : cases) {
    EXPECT_EQ(ExemptionNote(test.row, test.exemptions, kToday), test.note);
  }
}

}  // namespace
}  // namespace gatedyno
