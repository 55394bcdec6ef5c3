#include "harness/compare/trouble.h"

#include <string>
#include <vector>

#include <gtest/gtest.h>

#include "tests/compare/exempt_rows.h"

namespace gatedyno {
namespace {

constexpr auto kBeyond = TroubleKind::kBeyond;
constexpr auto kTooUncertain = TroubleKind::kTooUncertain;
constexpr auto kNotMeasured = TroubleKind::kNotMeasured;

const char* const kGBeyond =
    "g 1.50 against 1.00 by hand: +50.0 % (allowed 25 %)";
const char* const kPBeyond =
    "p 1.00 against 2.00 by hand: -50.0 % (allowed 35 %)";

TEST(TroubleTest, OneForEachFigure) {
  // A verdict of a store that did not keep U.
  Comparison old = EffortBeyondRow();
  old.effort_difference_expanded.reset();
  old.parasitic_difference_expanded.reset();
  // Beyond by the verdict, though neither figure is.
  const Comparison odd = RowOf({.g = 0.1}, Verdict::kBeyond);
  struct Case {
    const char* name;
    Comparison row;
    std::vector<Trouble> troubles;
  };
  const Case cases[] = {
      {"within", WithinRow(), {}},
      {"g", EffortBeyondRow(), {{kBeyond, Quantity::kEffort, kGBeyond}}},
      {"p", ParasiticBeyondRow(), {{kBeyond, Quantity::kParasitic, kPBeyond}}},
      {"both",
       BothBeyondRow(),
       {{kBeyond, Quantity::kEffort, kGBeyond},
        {kBeyond, Quantity::kParasitic, kPBeyond}}},
      {"beyond and uncertain",
       BeyondAndUncertainRow(),
       {{kBeyond, Quantity::kEffort, kGBeyond},
        {kTooUncertain,
         Quantity::kParasitic,
         "p is too uncertain to tell: +10.0 % with an uncertainty of 60.0 % "
         "(allowed 35 %)"}}},
      {"uncertain",
       DoubtfulRow(),
       {{kTooUncertain,
         Quantity::kEffort,
         "g is too uncertain to tell: +10.0 % with an uncertainty of 30.0 % "
         "(allowed 25 %)"}}},
      {"no line",
       WithoutLineRow(),
       {{kNotMeasured, std::nullopt, "h=3: timed out: after 60 s"}}},
      {"g beyond, p unknown",
       WithoutUncertaintyRow(),
       {{kNotMeasured, std::nullopt, "the row's own reason"}}},
      {"old", old, {{kBeyond, std::nullopt, "the row's own reason"}}},
      {"odd", odd, {{kBeyond, std::nullopt, "the row's own reason"}}},
  };
  for (const Case& test : cases) {
    const std::vector<Trouble> troubles = TroublesOf(test.row);
    ASSERT_EQ(troubles.size(), test.troubles.size()) << test.name;
    for (size_t i = 0; i < troubles.size(); ++i) {
      EXPECT_EQ(troubles[i].kind, test.troubles[i].kind) << test.name;
      EXPECT_EQ(troubles[i].quantity, test.troubles[i].quantity) << test.name;
      EXPECT_EQ(troubles[i].text, test.troubles[i].text) << test.name;
    }
  }
}

TEST(TroubleTest, Names) {
  EXPECT_EQ(TroubleKindName(kBeyond), "beyond");
  EXPECT_EQ(TroubleKindName(kTooUncertain), "too uncertain");
  EXPECT_EQ(TroubleKindName(kNotMeasured), "not measured");
}

}  // namespace
}  // namespace gatedyno
